import { LinkKey } from "@/components/ui/LinkKey";

const ENTRANCES = [
  {
    title: "Employers",
    lines: [
      "Write modules for your own equipment and sites",
      "See who holds what, and what lapses next",
      "One fee a sitting, whatever the outcome",
    ],
    href: "/employers",
    key: "See what an employer gets",
    filled: true,
  },
  {
    title: "Technicians",
    lines: [
      "Use every calculator, free, without an account",
      "See what was computed, and why",
      "Your certificates stay yours when you move on",
    ],
    href: "/bench",
    key: "Go to the bench",
  },
  {
    title: "Assessors and deciders",
    lines: [
      "Evidence, computation and tolerance on one page",
      "Decide with reasons, signed in afresh",
      "Suspend or withdraw with a dated record",
    ],
    href: "/impartiality",
    key: "Read the rules of deciding",
  },
];

/** Three doors, one for each sort of reader. */
export function EntrancesFor() {
  return (
    <section className="bg-sheet" aria-label="Entrances">
      <div className="page grid desk:grid-cols-3">
        {ENTRANCES.map((entrance) => (
          <div
            key={entrance.title}
            className="flex flex-col border-rule py-8 max-desk:border-b-hair desk:border-r-hair desk:px-10 desk:first:pl-0 desk:last:border-r-0 desk:last:pr-0"
          >
            <h2 className="text-h2">{entrance.title}</h2>
            <ul className="mt-3 mb-6">
              {entrance.lines.map((line) => (
                <li key={line} className="border-b-hair border-rule py-2 text-dense">
                  {line}
                </li>
              ))}
            </ul>
            <p className="mt-auto">
              <LinkKey href={entrance.href} variant={entrance.filled ? "filled" : "plain"}>
                {entrance.key}
              </LinkKey>
            </p>
          </div>
        ))}
      </div>
    </section>
  );
}

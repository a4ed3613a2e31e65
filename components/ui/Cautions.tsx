import { Glyph } from "./Glyph";

/** Cautions that apply here, each with its title and one or two sentences. Never folded away. */
export function Cautions({
  items,
  title = "Cautions",
}: {
  items: readonly { title: string; text: string }[];
  title?: string;
}) {
  if (items.length === 0) return null;
  return (
    <section aria-label={title} className="border-line border-l-8 border-caution-deep bg-sheet">
      <ul>
        {items.map((item) => (
          <li
            key={item.title}
            className="flex gap-3.5 border-t-hair border-rule px-3.5 py-2.5 text-dense first:border-t-0"
          >
            <Glyph name="suspended" className="mt-0.5 flex-none" />
            <p>
              <strong className="font-bold">{item.title}</strong> {item.text}
            </p>
          </li>
        ))}
      </ul>
    </section>
  );
}

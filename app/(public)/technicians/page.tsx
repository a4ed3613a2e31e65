import type { Metadata } from "next";
import { LinkKey } from "@/components/ui/LinkKey";
import { AboutPage, type AboutStep } from "@/components/site/AboutPage";

export const metadata: Metadata = {
  title: "Technicians",
  description: "Sit practical checks on data drawn for you, see how every line was marked, keep your certificates.",
};

const STEPS: AboutStep[] = [
  {
    title: "Work on the bench first",
    text: "The calculators are free and need no account. They run on the same code that marks the checks, so what you see on the bench is what the server computes.",
  },
  {
    title: "Sit on data that are yours alone",
    text: "Satellites, code phases, Doppler, levels and noise are drawn for you. Nobody can pass you the numbers, and yours are of no use to anybody else. Tolerances are public before you begin.",
  },
  {
    title: "Answer in the units you use",
    text: "Nanosecond, chip or metre; hertz or kilohertz; a comma or a point. The server says what it understood before you hand in, and asks where a figure could be read in two ways.",
  },
  {
    title: "See the whole marking record",
    text: "After the hand-in you see each quantity: yours, the computed one, the difference, the tolerance, the reason and the workings. A later line is judged against your own earlier value, so one slip counts once.",
  },
  {
    title: "Question it",
    text: "You can question a line before the decision, and appeal after it. The case can be drawn again bit for bit, years later.",
  },
];

export default function TechniciansPage() {
  return (
    <AboutPage
      title="Show what you can do, and see how it was judged"
      lead="Practical checks at correlation level: find the true lock and not a ghost, plan a search, read a capture, account for the antenna chain. The result is competent or not yet competent, never a percentage."
      steps={STEPS}
      facts={[
        { label: "Certificates", value: "Yours for life", detail: "also when you move to another employer" },
        {
          label: "Who sees values",
          value: "You, your assessor and your decider",
          detail: "the public page shows no values and no reasons",
        },
        { label: "Your name", value: "Not searchable", detail: "a certificate is found by its full number only" },
        { label: "Not yet competent", value: "A new sitting can be assigned", detail: "with new data" },
      ]}
      keys={
        <>
          <LinkKey href="/bench" variant="filled">
            Go to the bench
          </LinkKey>
          <LinkKey href="/sign-in">Sign in</LinkKey>
        </>
      }
    />
  );
}

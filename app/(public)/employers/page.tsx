import type { Metadata } from "next";
import { LinkKey } from "@/components/ui/LinkKey";
import { AboutPage, type AboutStep } from "@/components/site/AboutPage";

export const metadata: Metadata = {
  title: "Employers",
  description: "Write the competence you need as modules, see who holds what, and let anyone verify it.",
};

const STEPS: AboutStep[] = [
  {
    title: "Write what your work demands",
    text: "A module is plain text: your equipment, your procedures, calculators inside the text and practical checks at the end. The page is read as you write, and every problem comes with its line, its reason and a repair.",
  },
  {
    title: "Try it before it binds anybody",
    text: "Before a release, the server simulates a thousand cases of each check with a careful candidate, with each wrong method you name, and with blind guessing. A check that guessing passes, or that careful people fail, is seen before it harms anyone.",
  },
  {
    title: "Assign, and keep the roles apart",
    text: "Leads write and assign, assessors confirm and witness, a decider decides. The server refuses as decider whoever wrote the release, assigned it, trained the candidate or witnessed a line: it looks at what each person did, not at a job title.",
  },
  {
    title: "See who holds what",
    text: "The matrix shows people by modules, with the time left of each certificate, and what lapses within 90 days. Each cell leads to the record behind it.",
  },
  {
    title: "Answer a customer or an auditor",
    text: "The chain from module to decision stays: what was asked, what was handed in, what was computed, who decided and why. Nothing in it is edited, only followed by a later record, and a case can be drawn again bit for bit.",
  },
];

export default function EmployersPage() {
  return (
    <AboutPage
      title="Know that the person who signed the sheet can do the work"
      lead="For firms that install, commission, maintain and trouble-shoot satellite-navigation receivers. You set the competence; the server computes the truth; somebody who did not train the candidate decides."
      steps={STEPS}
      facts={[
        { label: "Fee", value: "One a sitting", detail: "whatever the outcome, certificate included" },
        {
          label: "Issuer",
          value: "You",
          detail: "the certificate says so: an employer’s statement of competence, not a licence",
        },
        {
          label: "Outsiders",
          value: "An outside decider can be invited",
          detail: "and the certificate says whether the decider was inside your line",
        },
        { label: "Verifying", value: "Free for anyone", detail: "by number, QR code or the PDF itself" },
      ]}
      keys={
        <>
          <LinkKey href="/sign-in" variant="filled">
            Sign in
          </LinkKey>
          <LinkKey href="/prices">Prices</LinkKey>
        </>
      }
    />
  );
}

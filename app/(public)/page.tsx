import Link from "next/link";
import { CodePeak } from "@/components/calculators/CodePeak";
import { Field } from "@/components/ui/Field";
import { Key } from "@/components/ui/Key";
import { EntrancesFor } from "./_components/EntrancesFor";
import { StepsOfTheRecord } from "./_components/StepsOfTheRecord";

/** The satellite and the delay of the drawing: any would do, the numbers on the page are computed from them. */
const PRN = 7;
const DELAY_CHIPS = 412;

export default function LandingPage() {
  return (
    <>
      <section className="hero">
        <div className="page relative z-10 pt-7 tablet:pt-16">
          <div className="max-w-[600px] tablet:max-w-[62%] desk:max-w-[600px]">
            <h1 className="text-display">A certificate that shows its working</h1>
            <p className="mt-5 max-w-[560px] text-body tablet:text-lead">
              Practical checks for people who install, commission and maintain satellite-navigation receivers. Every
              answer is computed again, a decider decides, and anyone can verify the result.
            </p>
            <VerifyForm />
          </div>
        </div>
        <CodePeak prn={PRN} delayChips={DELAY_CHIPS} height={446} className="hero-desk max-tablet:hidden" />
        <CodePeak prn={PRN} delayChips={DELAY_CHIPS} height={220} className="mt-14 tablet:hidden" />
      </section>
      <StepsOfTheRecord prn={PRN} delayChips={DELAY_CHIPS} />
      <EntrancesFor />
    </>
  );
}

function VerifyForm() {
  return (
    <form action="/verify" method="get" className="mt-7">
      <div className="flex flex-wrap items-end gap-3">
        <Field
          name="number"
          label="Certificate number"
          look="code"
          placeholder="LM-·····-·····-·"
          autoComplete="off"
          autoCapitalize="characters"
          spellCheck={false}
          maxLength={64}
          required
          className="hero-field"
        />
        <Key type="submit" variant="filled" size="large" className="max-tablet:w-full">
          Verify
        </Key>
      </div>
      <p className="mt-2 text-label font-normal text-ink-2">
        It stands on the paper, under the mark. No account needed. You can also{" "}
        <Link href="/verify" className="link">
          verify a PDF file
        </Link>
        .
      </p>
    </form>
  );
}

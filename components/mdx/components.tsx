import type { ComponentType } from "react";
import { SearchPlan } from "@/components/calculators/SearchPlan";
import { TwoCodes } from "@/components/calculators/TwoCodes";
import { Caution } from "./Caution";
import { CheckCard } from "./CheckCard";

type TwoCodesAttributes = { a?: number; b?: number; doppler?: number; lag?: number; coherent?: number };

type SearchPlanAttributes = {
  cn0?: number;
  coherent?: number;
  sums?: number;
  bin?: number;
  step?: number;
  window?: number;
  falseAlarm?: number;
  correlators?: number;
};

/** One component for each tag of the module language. The tree holds numbers in the unit of their attribute. */
export const components = {
  TwoCodes: ({ a, b, doppler, lag, coherent }: TwoCodesAttributes) => (
    <TwoCodes a={a} b={b} dopplerHz={doppler} lagChips={lag} coherentMs={coherent} />
  ),
  SearchPlan: ({ cn0, coherent, sums, bin, step, window, falseAlarm, correlators }: SearchPlanAttributes) => (
    <SearchPlan
      cn0DbHz={cn0}
      coherentMs={coherent}
      sums={sums}
      dopplerBinHz={bin}
      codeStepChips={step}
      windowHz={window}
      falseAlarmPerSearch={falseAlarm}
      correlators={correlators}
    />
  ),
  Check: CheckCard,
  // Quantities are shown on the card of their check.
  Quantity: () => null,
  Caution,
} as const satisfies Record<string, ComponentType<never>>;

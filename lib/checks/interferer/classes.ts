import type { Choice } from "../kind";

/** What a capture may hold besides the receiver's own noise. */
export type InterfererClass = "carrier" | "narrow-fm" | "sweep" | "pulse" | "noise" | "code" | "nothing";

export const CLASS_CHOICES: readonly (Choice & { value: InterfererClass })[] = [
  { value: "carrier", label: "Single carrier" },
  { value: "narrow-fm", label: "Carrier with narrow frequency modulation" },
  { value: "sweep", label: "Sweeping carrier" },
  { value: "pulse", label: "Pulses" },
  { value: "noise", label: "Broadband noise" },
  { value: "code", label: "Matched code" },
  { value: "nothing", label: "Nothing but the receiver itself" },
];

export const PRESENT_CLASSES: readonly InterfererClass[] = CLASS_CHOICES.map(({ value }) => value).filter(
  (value) => value !== "nothing",
);

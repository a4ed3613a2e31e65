import type { CautionTopic, QuantityDefinition } from "../kind";

export const chainCautions: readonly CautionTopic[] = ["height", "lightning", "mains", "rf", "life"];

type Given = Omit<QuantityDefinition, "toleranceRange" | "critical"> & { range?: readonly [number, number] };

const defined = ({ range, ...one }: Given, critical = false): QuantityDefinition => ({
  ...one,
  toleranceRange: one.tolerance && range ? { from: range[0], to: range[1], unit: one.tolerance.unit } : null,
  critical,
});

const ROUNDING = { tolerance: { value: 0.1, unit: "dB" }, range: [0.05, 0.5] } as const;

export const chainQuantities: readonly QuantityDefinition[] = [
  defined({
    id: "order",
    label: "Parts and their order",
    unit: null,
    tolerance: null,
    reason: "Run, arrester at the entry, splitter behind it: what protects stands before what is protected.",
  }),
  defined(
    {
      id: "feed",
      label: "Feed through your chain",
      unit: null,
      tolerance: null,
      reason: "An amplifier without its feed is an attenuator, and two feeds on one line damage receivers.",
    },
    true,
  ),
  defined({
    id: "supply",
    label: "Volts and current of your chain",
    unit: null,
    tolerance: null,
    reason: "Ohm's law along the line; a limit is a limit.",
  }),
  defined({
    id: "gain",
    label: "Net gain of your chain",
    unit: "dB",
    ...ROUNDING,
    reason: "1 dB is to be left at both ends of the receiver's window; a tenth is for rounding.",
  }),
  defined({
    id: "noise",
    label: "Noise figure of your chain",
    unit: "dB",
    ...ROUNDING,
    reason: "1 dB is to be left under the limit; a tenth is for rounding.",
  }),
  defined({
    id: "overload",
    label: "Headroom of your amplifiers",
    unit: "dB",
    ...ROUNDING,
    reason: "1 dB is to be left under every 1 dB point; an overdriven amplifier looks like weak satellites.",
  }),
  defined({
    id: "ownGain",
    label: "Your figure of the net gain",
    unit: "dB",
    tolerance: { value: 0.3, unit: "dB" },
    range: [0.1, 0.3],
    reason: "A sum of figures from data sheets, judged for your own chain.",
  }),
  defined({
    id: "ownNoise",
    label: "Your figure of the noise figure",
    unit: "dB",
    tolerance: { value: 0.2, unit: "dB" },
    range: [0.1, 0.5],
    reason: "Friis's formula with figures rounded to a tenth, judged for your own chain.",
  }),
  defined({
    id: "ownHeadroom",
    label: "Your figure of the headroom",
    unit: "dB",
    tolerance: { value: 0.3, unit: "dB" },
    range: [0.1, 0.5],
    reason: "Of the amplifier nearest the antenna: a sum, judged for your own chain.",
  }),
  defined({
    id: "ownDelay",
    label: "Your figure of the delay",
    unit: "ns",
    tolerance: { value: 1, unit: "%" },
    range: [0.5, 3],
    reason: "Length over velocity and the delays of the parts, judged for your own chain.",
  }),
  defined({
    id: "ownVolts",
    label: "Your figure of the volts",
    unit: "V",
    tolerance: { value: 0.05, unit: "V" },
    range: [0.02, 0.05],
    reason: "At the amplifier nearest the antenna: Ohm's law, judged for your own chain.",
  }),
];

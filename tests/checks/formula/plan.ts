import { formula } from "@/lib/checks/formula/formula";
import type { FormulaParameters } from "@/lib/checks/formula/parameters";
import type { CheckPlan } from "@/lib/checks/kind";

/** A plan as the reading of a module makes it. */
export const planFrom = (parameters: FormulaParameters): CheckPlan<FormulaParameters> => ({
  id: "delay",
  kind: formula.id,
  version: formula.version,
  title: "Cable delay",
  minutes: 25,
  needs: null,
  parameters,
  quantities: parameters.quantities.map(({ id, tolerance, critical }) => ({ of: id, tolerance, critical })),
});

/** The example of the module language. */
export const DELAY: FormulaParameters = {
  givens: [
    { id: "L", label: "cable length", unit: "m", from: 8, to: 120, step: 0.5 },
    { id: "vf", label: "velocity factor", unit: "1", from: 0.66, to: 0.88, step: 0.01 },
  ],
  quantities: [
    {
      id: "delay",
      label: "cable delay",
      unit: "ns",
      answer: "L / (vf * c)",
      tolerance: { value: 1, unit: "ns" },
      critical: true,
    },
  ],
  wrongs: [{ id: "air", label: "speed of light in air", of: "delay", answer: "L / c" }],
};

/** The same with a second quantity that follows from the first, and a loss in dB. */
export const CHAIN: FormulaParameters = {
  givens: [
    ...DELAY.givens,
    { id: "a", label: "cable loss", unit: "dB/100m", from: 12, to: 30, step: 0.1 },
    { id: "P", label: "level at the antenna", unit: "dBm", from: -130, to: -120, step: 0.5 },
  ],
  quantities: [
    ...DELAY.quantities,
    {
      id: "error",
      label: "range left uncorrected",
      unit: "m",
      answer: "delay * c",
      tolerance: { value: 0.5, unit: "%" },
      critical: false,
    },
    {
      id: "out",
      label: "level at the receiver",
      unit: "dBm",
      answer: "P - a * L",
      tolerance: { value: 0.2, unit: "dB" },
      critical: false,
    },
  ],
  wrongs: [
    ...DELAY.wrongs,
    { id: "metre", label: "loss taken per metre", of: "out", answer: "P - 100 * a * L" },
    { id: "gain", label: "loss added", of: "out", answer: "P + a * L" },
  ],
};

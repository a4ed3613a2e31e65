import type { CalculatorTag } from "@/lib/calculators/calculators";
import { caCode } from "@/lib/gnss/caCode";
import { circularCorrelation } from "@/lib/gnss/correlation";
import { holdoverErrorNs } from "@/lib/gnss/timing/holdover";
import { bpsk } from "@/lib/gnss/spectra/modulation";
import { correlationShape } from "@/lib/gnss/tracking/correlationShape";
import { earlyMinusLate } from "@/lib/gnss/tracking/multipathEnvelope";
import { exp } from "@/lib/numeric/elementary";
import { erfc } from "@/lib/numeric/erfc";

export type Small = { x: number[]; y: number[]; bars?: boolean };

const range = (from: number, to: number, steps: number) =>
  Array.from({ length: steps + 1 }, (_, at) => from + ((to - from) * at) / steps);
const over = (x: number[], of: (value: number) => number): Small => ({ x, y: x.map(of) });

const DRAWN: Record<CalculatorTag, () => Small> = {
  TwoCodes: () => {
    const values = circularCorrelation(caCode(7), caCode(19));
    return over(range(0, 44, 44), (lag) => values[lag]);
  },
  // Equal false peaks, one Doppler beside the other.
  FalseLock: () => ({ x: range(0, 12, 12), y: [2, 1, 9, 2, 1, 8, 1, 2, 9, 1, 2, 8, 1], bars: true }),
  SearchPlan: () => over(range(-3, 3, 32), (sigmas) => erfc(-sigmas) / 2),
  LoopJitter: () => {
    const shape = correlationShape(bpsk(1), null);
    const loop = { shape, spacingChips: 0.5, ratio: 0, delayChips: 0 };
    return over(range(-1.6, 1.6, 64), (error) => earlyMinusLate(loop, error));
  },
  // How often each value of the samples occurs.
  CaptureView: () => ({ ...over(range(-6, 6, 12), (count) => exp((-count * count) / 8)), bars: true }),
  // Gains above the line, losses below.
  ChainLevels: () => ({ x: range(0, 4, 4), y: [7, -3, 4, -5, -2], bars: true }),
  // The loss of a run, and the echo that stands up from it.
  CableEcho: () => over(range(0, 40, 40), (metres) => metres / 4 + 9 * exp(-((metres - 26) * (metres - 26)) / 2)),
  // Parts of the way to the pulse; the last one leads.
  DelayBudget: () => ({ x: range(0, 5, 5), y: [4, 12, 6, 1, 2, -3], bars: true }),
  // A clock in holdover: ageing, and the daily wave of temperature.
  PulseError: () =>
    over(range(0, 3, 60), (days) =>
      holdoverErrorNs(
        {
          startNs: 0,
          frequencyOffset: 0,
          driftPerDay: 1e-12,
          temperatureCoefficientPerK: 1e-13,
          temperatureChangeK: 0,
          dailySwingK: 20,
        },
        days * 86_400,
      ),
    ),
};

const kept = new Map<CalculatorTag, Small>();

/** Points of a calculator's small drawing, computed once. */
export function smallCurve(tag: CalculatorTag): Small {
  const known = kept.get(tag);
  if (known) return known;
  const drawn = DRAWN[tag]();
  kept.set(tag, drawn);
  return drawn;
}

import type { HeatRamp } from "./heat";

const STEPS = [0, 1, 2, 3, 4, 5];

/** The ramp and what its ends mean. */
export function HeatScale({ ramp }: { ramp: HeatRamp }) {
  return (
    <p className="flex items-center gap-2 text-label font-normal text-ink-2 figures">
      {ramp.from}
      <svg width="96" height="10" className="border-hair border-control" aria-hidden>
        {STEPS.map((step) => (
          <rect key={step} x={step * 16} width="16" height="10" fill={`var(--heat-${step})`} />
        ))}
      </svg>
      +{ramp.topDb} dB
    </p>
  );
}

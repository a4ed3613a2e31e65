"use client";
import { useState } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { Key } from "@/components/ui/Key";
import { TwoWay } from "@/components/ui/TwoWay";
import type { SelfLikeness } from "@/lib/gnss/interference/selfLikeness";
import type { Look } from "./lookAt";
import type { Reading } from "./reading";

const SPANS = [
  { value: "50", label: "50 µs" },
  { value: "300", label: "300 µs" },
  { value: "1200", label: "1 200 µs" },
];

/** How like itself the capture is some time later: what repeats comes back, noise does not. */
export function RepetitionReader({
  likeness,
  onTake,
}: {
  likeness: SelfLikeness;
  onTake?: (reading: Reading) => void;
}) {
  const [span, setSpan] = useState("300");
  const [lag, setLag] = useState(0);
  const { stepS, magnitude } = likeness;
  const count = Math.min(magnitude.length, Math.round((Number(span) * 1e-6) / stepS) + 1);
  const x = Float64Array.from({ length: count }, (_, n) => n * stepS * 1e6);
  const y = Float64Array.from({ length: count }, (_, n) => magnitude[n]! / magnitude[0]!);
  const index = Math.min(lag, count - 1);
  return (
    <div className="grid gap-4">
      <TwoWay name="lag-span" label="Shown" showLabel choices={SPANS} value={span} onChange={setSpan} />
      <LinePlot
        x={{ name: "time between, µs", from: 0, to: Number(span), decimals: 2 }}
        y={{ name: "likeness to itself", from: 0, to: 1.05, decimals: 2 }}
        curves={[{ name: "likeness", role: "subject", x, y }]}
        summary="Likeness of the capture to itself some time later, 1 at once."
        cursor={{
          index,
          onMove: setLag,
          lines: (at) => [`${formatNumber(x[at]!, 2)} µs`, formatNumber(y[at]!, 2)],
        }}
        height={240}
      />
      {onTake && (
        <p>
          <Key reason={index === 0 ? "Move the cursor first." : null} onClick={() => onTake({ periodUs: x[index]! })}>
            Take {formatNumber(x[index]!, 2)} µs
          </Key>
        </p>
      )}
    </div>
  );
}

const PARTS = [
  { value: "400", label: "400 µs" },
  { value: "2000", label: "2 ms" },
  { value: "10000", label: "10 ms" },
];

/** Power of each microsecond, or nearly: pulses stand out of it. */
export function PowerInTime({ power: { stepS, values }, fullScale }: { power: Look["power"]; fullScale: number }) {
  const [part, setPart] = useState("2000");
  const count = Math.min(values.length, Math.round((Number(part) * 1e-6) / stepS));
  const x = Float64Array.from({ length: count }, (_, n) => n * stepS * 1e6);
  const y = Float64Array.from({ length: count }, (_, n) => 10 * Math.log10(Math.max(1e-9, values[n]! / fullScale)));
  const [low, high] = [Math.min(...y), Math.max(...y)];
  return (
    <div className="grid gap-4">
      <TwoWay name="power-part" label="Shown" showLabel choices={PARTS} value={part} onChange={setPart} />
      <LinePlot
        x={{ name: "time, µs", from: 0, to: Number(part), decimals: 1 }}
        y={{
          name: "power, dB of full scale",
          from: 10 * Math.floor(low / 10),
          to: 10 * Math.ceil((high + 1) / 10),
          decimals: 1,
        }}
        curves={[{ name: "power", role: "subject", x, y }]}
        summary="Power of the capture against time, from its start."
        cursor={{ lines: (at) => [`${formatNumber(x[at]!, 1)} µs`, `${formatNumber(y[at]!, 1, true)} dB`] }}
        height={220}
      />
    </div>
  );
}

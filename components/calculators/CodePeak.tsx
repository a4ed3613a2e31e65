"use client";
import { useMemo } from "react";
import { formatNumber } from "@/components/ui/formatNumber";
import { Glyph } from "@/components/ui/Glyph";
import { caCode } from "@/lib/gnss/caCode";
import { delayedCorrelation } from "./delayedCode";

const PITCH = 6; // px a chip
const BEFORE = 480; // lags drawn at the left of the peak and at its right: enough for the widest screen
const AFTER = 200;
const CHIP = 12;

type CodePeakProps = {
  prn: number;
  delayChips: number;
  /** Height of the peak, px. */ height: number;
  className?: string;
};

/**
 * One satellite's code against itself, delayed: the floor of three levels and the one peak, both to one scale, over the
 * chips of the code itself. Stands at the foot of its box; the peak is at 73 % of the width.
 */
export function CodePeak({ prn, delayChips, height, className }: CodePeakProps) {
  const values = useMemo(() => delayedCorrelation(prn, delayChips), [prn, delayChips]);
  const code = caCode(prn);
  const length = values.length;
  const lags = Array.from({ length: BEFORE + AFTER + 1 }, (_, at) => at - BEFORE);
  const at = (offset: number) => (((delayChips + offset) % length) + length) % length;
  const peak = values[delayChips];
  const perChip = height / peak;
  const levels = [...new Set(values)].filter((value) => value !== peak).sort((a, b) => b - a);
  const floor = lags.filter((lag) => lag !== 0).map((lag) => `${lag * PITCH} ${round(-values[at(lag)] * perChip)}`);
  const dotted = levels
    .filter((level) => level !== -1)
    .map((level) => `M${-BEFORE * PITCH} ${round(-level * perChip)}H${AFTER * PITCH}`);
  // One path for each of the two states: a rectangle a chip would make the page several times as heavy.
  const chips = (above: boolean) =>
    lags
      .filter((lag) => code[at(lag)] > 0 === above)
      .map(
        (lag) => `M${round(lag * PITCH - PITCH / 2 + 0.4)} ${above ? -CHIP : 0}h${PITCH - 0.8}v${CHIP}h${0.8 - PITCH}z`,
      )
      .join("");
  const foot = round(65 * perChip) + 20;
  return (
    <figure className={`code-peak ${className ?? ""}`} style={{ height: height + foot + CHIP + 2 }}>
      <svg className="code-peak-drawing" style={{ bottom: foot + CHIP + 2 }} width="1" height="1" aria-hidden>
        <path d={dotted.join("")} stroke="var(--control)" strokeWidth="1" strokeDasharray="1 5" />
        <path d={`M${floor.join("L")}`} fill="none" stroke="var(--plus)" strokeWidth="2" strokeLinejoin="bevel" />
        <path d={`M${-PITCH} 0L0 ${-height}L${PITCH} 0z`} fill="var(--plus)" />
        <path d={`M0 ${foot - CHIP - 20}v11`} stroke="var(--ink)" strokeWidth="1.5" />
        <path d={`M-6 ${foot - CHIP - 10}h12l-6 8z`} fill="var(--ink)" />
        <g transform={`translate(0 ${foot})`}>
          <path d={chips(true)} fill="var(--plus)" />
          <path d={chips(false)} fill="var(--minus)" />
          <path d={`M${-BEFORE * PITCH} 0H${AFTER * PITCH}`} stroke="var(--ink)" strokeWidth="1.5" />
        </g>
      </svg>
      <figcaption>
        <p className="code-peak-top figures">
          <span className="block text-readout">{formatNumber(peak)}</span>
          <span className="block text-[0.875rem] leading-5">{`at lag ${delayChips}: all chips agree`}</span>
        </p>
        <p className="code-peak-left">
          GPS L1 C/A, satellite {prn}
          <span className="mt-0.5 flex gap-6 max-tablet:hidden">
            <span className="inline-flex items-center gap-1.5">
              <Glyph name="within" size={16} /> +1 above the line
            </span>
            <span className="inline-flex items-center gap-1.5">
              <Glyph name="outside" size={16} /> −1 below it
            </span>
          </span>
        </p>
        <p className="code-peak-right figures max-tablet:hidden">
          floor{" "}
          {levels
            .map((level) => formatNumber(level))
            .join(", ")
            .replace(/, ([^,]*)$/, " and $1")}
          <br />
          at every other lag
        </p>
      </figcaption>
    </figure>
  );
}

const round = (px: number) => Math.round(px * 10) / 10;

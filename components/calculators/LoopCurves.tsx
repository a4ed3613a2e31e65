"use client";
import { useMemo, useState } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { chipsToMetres } from "@/lib/gnss/constants";
import { bpsk } from "@/lib/gnss/spectra/modulation";
import { correlationShape } from "@/lib/gnss/tracking/correlationShape";
import { PHASE_LIMIT_DEG } from "@/lib/gnss/tracking/loopStress";
import { earlyMinusLate } from "@/lib/gnss/tracking/multipathEnvelope";
import type { Loops } from "./loopsOf";

const FROM_DB_HZ = 20;
const TO_DB_HZ = 55;
const PER_DB = 4;
const CN0 = Array.from({ length: (TO_DB_HZ - FROM_DB_HZ) * PER_DB + 1 }, (_, at) => FROM_DB_HZ + at / PER_DB);
const AXIS = { name: "C/N0, dB-Hz", from: FROM_DB_HZ, to: TO_DB_HZ };
const placeOf = (cn0DbHz: number) => Math.round((cn0DbHz - FROM_DB_HZ) * PER_DB);

/** Three sigma and stress of the carrier's phase against C/N0: above 45 degrees the loop does not hold. */
export function PhaseCurve({ loops, cn0DbHz }: { loops: Loops; cn0DbHz: number }) {
  const [index, setIndex] = useState<number | null>(null);
  const y = useMemo(() => CN0.map(loops.phaseAt), [loops]);
  return (
    <LinePlot
      x={AXIS}
      y={{ name: "phase error, three sigma and stress, °", from: 0, to: 2 * PHASE_LIMIT_DEG }}
      curves={[{ name: "carrier loop", role: "subject", x: CN0, y }]}
      bands={[{ y: [0, PHASE_LIMIT_DEG] }]}
      limits={[
        { y: PHASE_LIMIT_DEG, name: "holds up to 45°", tone: "minus" },
        { x: cn0DbHz, name: `${formatNumber(cn0DbHz, 1)} dB-Hz`, tone: "plus" },
      ]}
      summary={`Phase error against C/N0; at ${formatNumber(cn0DbHz, 1)} dB-Hz a margin of ${formatNumber(loops.phaseMarginDeg, 1, true)}° to 45°.`}
      cursor={{
        index: index ?? placeOf(cn0DbHz),
        onMove: setIndex,
        lines: (at) => [
          `${formatNumber(CN0[at], 2)} dB-Hz`,
          `${formatNumber(y[at], 1)}°`,
          `margin ${formatNumber(PHASE_LIMIT_DEG - y[at], 1, true)}°`,
        ],
      }}
      height={300}
    />
  );
}

type CodeCurveProps = { loops: Loops; cn0DbHz: number; spacingChips: number };

/** The code's jitter against C/N0; three of it may reach half of the spacing. */
export function CodeCurve({ loops, cn0DbHz, spacingChips }: CodeCurveProps) {
  const [index, setIndex] = useState<number | null>(null);
  const y = useMemo(() => CN0.map((cn0) => chipsToMetres(loops.codeAt(cn0))), [loops]);
  const limitM = chipsToMetres(spacingChips / 6);
  const here = chipsToMetres(loops.codeChips);
  const limitNear = limitM < 6 * here;
  return (
    <LinePlot
      x={AXIS}
      y={{ name: "code jitter, 1 sigma, m", from: 0, to: limitNear ? Math.max(1.3 * limitM, 1.6 * here) : 3 * here }}
      curves={[{ name: "code loop", role: "subject", x: CN0, y }]}
      limits={[{ y: limitM, name: `limit ${formatNumber(limitM, 1)} m`, tone: "minus" }]}
      summary={`Code jitter against C/N0: ${formatNumber(here, 2)} m at ${formatNumber(cn0DbHz, 1)} dB-Hz.`}
      cursor={{
        index: index ?? placeOf(cn0DbHz),
        onMove: setIndex,
        lines: (at) => [`${formatNumber(CN0[at], 2)} dB-Hz`, `${formatNumber(y[at], 2)} m`],
      }}
      height={250}
    />
  );
}

const SPAN_CHIPS = 1.6;
const ERRORS = Array.from({ length: 321 }, (_, at) => (at / 160 - 1) * SPAN_CHIPS);

type ErrorCurveProps = { loops: Loops; spacingChips: number; frontEndMHz: number | null };

/** Early minus late against the code error, and three sigma of the jitter round the crossing. */
export function ErrorCurve({ loops, spacingChips, frontEndMHz }: ErrorCurveProps) {
  const [index, setIndex] = useState(160);
  const y = useMemo(() => {
    const shape = correlationShape(bpsk(1), frontEndMHz === null ? null : frontEndMHz * 1e6);
    return ERRORS.map((error) => earlyMinusLate({ shape, spacingChips, ratio: 0, delayChips: 0 }, error));
  }, [spacingChips, frontEndMHz]);
  const reach = Math.max(0.1, ...y) * 1.15;
  const three = Math.min(SPAN_CHIPS, 3 * loops.codeChips);
  return (
    <LinePlot
      x={{ name: "code error, chip", from: -SPAN_CHIPS, to: SPAN_CHIPS, signed: true, decimals: 1 }}
      y={{ name: "early minus late, normalised", from: -reach, to: reach }}
      curves={[{ name: "early minus late", role: "subject", x: ERRORS, y }]}
      bands={[{ x: [-three, three] }]}
      summary={`Early minus late against code error: crosses zero at 0 chip; three sigma of the jitter are ${formatNumber(three, 3)} chip, ${formatNumber(chipsToMetres(three), 1)} m.`}
      cursor={{
        index,
        onMove: setIndex,
        lines: (at) => [
          `${formatNumber(ERRORS[at], 2, true)} chip, ${formatNumber(chipsToMetres(ERRORS[at]), 1, true)} m`,
          formatNumber(y[at], 3, true),
          `3 sigma ±${formatNumber(three, 3)} chip`,
        ],
      }}
      columns={[
        { name: "code error, chip", values: ERRORS, decimals: 2, signed: true },
        { name: "early minus late", values: y, decimals: 4, signed: true },
      ]}
      height={250}
    />
  );
}

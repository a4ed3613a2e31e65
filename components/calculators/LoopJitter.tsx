"use client";
import { useMemo } from "react";
import { LOOP_JITTER } from "@/lib/calculators/loopJitter";
import { chipsToMetres, L1_HZ } from "@/lib/gnss/constants";
import { phaseToMetres } from "@/lib/gnss/tracking/carrierJitter";
import { CalculatorFields } from "./CalculatorFields";
import { CalculatorFrame } from "./CalculatorFrame";
import type { CalculatorProps } from "./calculatorProps";
import { Formula } from "./Formula";
import { CodeCurve, ErrorCurve, PhaseCurve } from "./LoopCurves";
import { loopsOf, STANDARD_GRAVITY_M_S2, type Loops, type LoopValues } from "./loopsOf";
import { formatNumber } from "@/components/ui/formatNumber";
import { Reading, Verdict } from "./Reading";
import { texNumber, texQuantity } from "./texNumber";

/** Jitter of code and carrier loop, and how much is left until they lose lock. */
export function LoopJitter({ values, onChange }: CalculatorProps<typeof LOOP_JITTER>) {
  const loops = useMemo(() => loopsOf(values), [values]);
  const carrierHolds = loops.phaseMarginDeg >= 0;
  const codeHolds = loops.codeMarginChips >= 0;
  return (
    <CalculatorFrame
      reading={
        <>
          <Verdict glyph={carrierHolds && codeHolds ? "within" : "outside"}>
            {carrierHolds && codeHolds
              ? "Both loops hold"
              : carrierHolds
                ? "The code loop is expected to lose lock"
                : "The carrier loop is expected to lose lock"}
          </Verdict>
          <Reading
            label="Margin of the carrier loop"
            value={loops.phaseMarginDeg}
            decimals={1}
            unit="°"
            signed
            deciding
          >
            {loops.phaseThresholdDbHz === null
              ? "gone at any C/N0: the stress or the oscillator alone is too much"
              : `gone below ${formatNumber(loops.phaseThresholdDbHz, 1)} dB-Hz`}
          </Reading>
        </>
      }
      fields={<CalculatorFields of={LOOP_JITTER} values={values} onChange={onChange} />}
      more={
        <>
          <Reading label="Code jitter, 1 sigma" value={chipsToMetres(loops.codeChips)} decimals={2} unit="m">
            {`${formatNumber(loops.codeChips, 4)} chip; margin ${formatNumber(loops.codeMarginChips, 3, true)} chip`}
          </Reading>
          <Reading label="Carrier jitter by noise, 1 sigma" value={loops.thermalDeg} decimals={2} unit="°">
            {`${formatNumber(1000 * phaseToMetres(loops.thermalDeg, L1_HZ), 2)} mm at L1`}
          </Reading>
          <Reading label="Steady error by jerk" value={loops.stressDeg} decimals={2} unit="°" />
        </>
      }
      working={
        <Formula
          tex={[
            String.raw`\sigma_\varphi=\frac{180^\circ}{\pi}\sqrt{\frac{B_\varphi}{C/N_0}\left(1+\frac{1}{2\,T\,C/N_0}\right)}`,
            String.raw`m=45^\circ-3\sqrt{\sigma_\varphi^2+\sigma_v^2+\sigma_A^2}-\theta_e,\qquad \theta_e=\frac{360^\circ f}{c}\cdot\frac{\dddot R}{(B_\varphi/0.7845)^3}`,
            String.raw`\sigma_\tau=\sqrt{\frac{B_\tau D}{2\,C/N_0}\left(1+\frac{2}{(2-D)\,T\,C/N_0}\right)}`,
          ]}
          worked={worked(values, loops)}
          source="Kaplan and Hegarty, Understanding GPS, 2nd edition, 5.6 (equation numbers from memory); the code's jitter behind a front end by its (5.23). 45° for three sigma and stress: rule of thumb of the same place. Third order, early minus late power, GPS L1 C/A."
        />
      }
    >
      <PhaseCurve loops={loops} cn0DbHz={values.cn0DbHz} />
      <div className="grid gap-x-8 gap-y-5 @2xl:grid-cols-2">
        <CodeCurve loops={loops} cn0DbHz={values.cn0DbHz} spacingChips={values.spacingChips} />
        <ErrorCurve loops={loops} spacingChips={values.spacingChips} frontEndMHz={values.frontEndMHz} />
      </div>
    </CalculatorFrame>
  );
}

function worked(values: LoopValues, loops: Loops) {
  const ratio = 10 ** (values.cn0DbHz / 10);
  const c = texNumber(ratio, 0);
  const coherentS = texNumber(values.coherentMs / 1000, 3);
  const lines = [
    String.raw`\sigma_\varphi=57.296^\circ\sqrt{\frac{${texNumber(values.carrierLoopHz, 1)}}{${c}}\left(1+\frac{1}{2\cdot ${coherentS}\cdot ${c}}\right)}=${texNumber(loops.thermalDeg, 2)}^\circ`,
    String.raw`m=45^\circ-3\sqrt{${texNumber(loops.thermalDeg, 2)}^2+${texNumber(values.vibrationDeg, 1)}^2+${texNumber(values.oscillatorDeg, 1)}^2}-${texNumber(loops.stressDeg, 2)}^\circ=${texNumber(loops.phaseMarginDeg, 1)}^\circ`,
    String.raw`\dddot R=${texNumber(values.jerkGPerS, 2)}\cdot ${STANDARD_GRAVITY_M_S2}\,\mathrm{m/s^3}=${texQuantity(values.jerkGPerS * STANDARD_GRAVITY_M_S2, "m/s^3", 2)}`,
  ];
  if (values.frontEndMHz !== null) return lines; // its three cases are told in the source
  const spacing = texNumber(values.spacingChips, 2);
  return [
    ...lines,
    String.raw`\sigma_\tau=\sqrt{\frac{${texNumber(values.codeLoopHz, 2)}\cdot ${spacing}}{2\cdot ${c}}\left(1+\frac{2}{(2-${spacing})\cdot ${coherentS}\cdot ${c}}\right)}=${texQuantity(loops.codeChips, "chip", 4)}`,
  ];
}

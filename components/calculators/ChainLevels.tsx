"use client";
import { useMemo } from "react";
import { formatNumber } from "@/components/ui/formatNumber";
import { CHAIN_LEVELS } from "@/lib/calculators/chainLevels";
import { CalculatorFields } from "./CalculatorFields";
import { CalculatorFrame } from "./CalculatorFrame";
import type { CalculatorProps } from "./calculatorProps";
import { chainOf, type Chain } from "./chainOf";
import { Formula } from "./Formula";
import { LevelDiagram } from "./LevelDiagram";
import { Reading, Verdict } from "./Reading";
import { RowsEditor } from "./RowsEditor";
import { texNumber, texQuantity } from "./texNumber";

const [PARTS] = CHAIN_LEVELS.inputs;

/** Levels, noise and feed from the antenna to the receiver, and what is wrong with them. */
export function ChainLevels({ values, onChange }: CalculatorProps<typeof CHAIN_LEVELS>) {
  const chain = useMemo(() => chainOf(values), [values]);
  const { last, faults, feed } = chain;
  return (
    <CalculatorFrame
      reading={
        <>
          {faults.length === 0 ? (
            <Verdict glyph="within">Gain, levels and feed hold</Verdict>
          ) : (
            faults.map((fault) => (
              <Verdict key={fault} glyph="outside">
                {fault}
              </Verdict>
            ))
          )}
          <Reading label="Net gain" value={last.gainDb} decimals={1} unit="dB" signed deciding>
            {`the receiver asks for ${formatNumber(values.leastGainDb, 1)} to ${formatNumber(values.mostGainDb, 1)} dB`}
          </Reading>
        </>
      }
      fields={<CalculatorFields of={CHAIN_LEVELS} values={values} onChange={onChange} />}
      more={
        <>
          <Reading label="C/N0 of the satellite" value={chain.cn0DbHz} decimals={1} unit="dB-Hz">
            {`noise figure of chain and receiver ${formatNumber(chain.noiseFigureDb, 2)} dB`}
          </Reading>
          <Reading label="Least headroom" value={chain.headroomDb} decimals={1} unit="dB" signed>
            {chain.headroomDb === null ? "no neighbour, or nothing that compresses" : `in ${chain.tightest}`}
          </Reading>
          <Reading label="Current of the feed" value={feed.totalMa} decimals={0} unit="mA">
            {`of ${formatNumber(values.limitMa, 0)} mA`}
          </Reading>
          <Reading label="Least voltage at a part" value={chain.leastVolts} decimals={2} unit="V">
            {chain.leastVolts === null ? "no part draws current" : `at ${chain.hungriest}`}
          </Reading>
        </>
      }
      below={<RowsEditor input={PARTS} rows={values.parts} onChange={(parts) => onChange({ ...values, parts })} />}
      working={
        <Formula
          tex={[
            String.raw`F=F_1+\frac{F_2-1}{G_1}+\frac{F_3-1}{G_1G_2}+\dots`,
            String.raw`C/N_0=P-10\log_{10}\!\left(k\,(T_A+290\,\mathrm{K}\,(F-1))\right)`,
          ]}
          worked={worked(chain, values.antennaK, values.signalDbm)}
          source="Friis, Noise figures of radio receivers, 1944; k = 1.380649e−23 J/K (SI). 1 dB compression: definition of the point, the curve around it common practice, no source. Feed: Ohm's law."
        />
      }
    >
      <LevelDiagram values={values} chain={chain} />
    </CalculatorFrame>
  );
}

function worked({ factors, noiseFigureDb, cn0DbHz }: Chain, antennaK: number, signalDbm: number) {
  const terms = factors
    .slice(0, 4)
    .map(({ noise, gain }, at) =>
      at === 0
        ? texNumber(noise, 3)
        : String.raw`\frac{${texNumber(noise - 1, 3)}}{${texNumber(gain, gain < 10 ? 3 : 0)}}`,
    );
  const more = factors.length > 4 ? String.raw`+\dots` : "";
  const whole = 10 ** (noiseFigureDb / 10);
  return [
    String.raw`F=${terms.join("+")}${more}=${texNumber(whole, 4)}\;(${texQuantity(noiseFigureDb, "dB", 2)})`,
    String.raw`T=${texQuantity(antennaK, "K", 0)}+290\,\mathrm{K}\cdot ${texNumber(whole - 1, 4)}=${texQuantity(antennaK + 290 * (whole - 1), "K", 1)}`,
    String.raw`C/N_0=${texQuantity(signalDbm, "dBm", 1)}-(${texQuantity(signalDbm - cn0DbHz, "dBm/Hz", 2)})=${texQuantity(cn0DbHz, "dB\\text{-}Hz", 2)}`,
  ];
}

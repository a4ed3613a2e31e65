"use client";
import { useMemo, useState } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { CABLE_ECHO } from "@/lib/calculators/cableEcho";
import type { ValuesOf } from "@/lib/calculators/calculator";
import { cableDelayNs, delayNsPerM, faultDistance } from "@/lib/gnss/chain/cableDelay";
import { cableLossDb, fitCableLoss } from "@/lib/gnss/chain/cableLoss";
import { loopResistanceOhm } from "@/lib/gnss/chain/dcFeed";
import { CalculatorFields } from "./CalculatorFields";
import { CalculatorFrame } from "./CalculatorFrame";
import type { CalculatorProps } from "./calculatorProps";
import { Formula } from "./Formula";
import { Reading, Verdict } from "./Reading";
import { texNumber, texQuantity } from "./texNumber";

type Inputs = ValuesOf<typeof CABLE_ECHO>;
const POINTS = 240;

/** Loss, delay and feed of a run of cable, and the place that an echo comes from. */
export function CableEcho({ values, onChange }: CalculatorProps<typeof CABLE_ECHO>) {
  const run = useMemo(() => runOf(values), [values]);
  const { lengthM, velocityFactor } = values;
  return (
    <CalculatorFrame
      reading={
        <>
          <Verdict glyph={run.place === "beyond" ? "suspended" : run.place === "end" ? "within" : "outside"}>
            {VERDICTS[run.place]}
          </Verdict>
          <Reading label="The echo comes from" value={run.distanceM} decimals={2} unit="m" deciding>
            {`0.01 in the velocity factor moves it by ${formatNumber(run.perHundredthM, 2)} m`}
          </Reading>
        </>
      }
      fields={<CalculatorFields of={CABLE_ECHO} values={values} onChange={onChange} />}
      more={
        <>
          <Reading label={`Loss of ${formatNumber(lengthM, 1)} m`} value={run.lossDb} decimals={2} unit="dB">
            {`at ${formatNumber(values.frequencyMHz, 2)} MHz, 20 °C`}
          </Reading>
          <Reading label="Delay of the run" value={run.delayNs} decimals={2} unit="ns">
            {`${formatNumber(delayNsPerM(velocityFactor), 3)} ns for each metre`}
          </Reading>
          <Reading label="Voltage lost on the run" value={run.dropV} decimals={3} unit="V">
            {`${formatNumber(values.currentMa, 0)} mA through ${formatNumber(run.loopOhm, 2)} Ω`}
          </Reading>
        </>
      }
      working={
        <Formula
          tex={[
            String.raw`d=\frac{v_F\,c\,t}{2},\quad \tau=\frac{L}{v_F\,c}`,
            String.raw`A=\frac{a L}{100\,\mathrm{m}}\sqrt{\frac{f}{f_0}},\quad U=I\,R' L`,
          ]}
          worked={worked(values, run)}
          source="Distance and delay: definition of the velocity factor, c = 299 792 458 m/s (SI). Loss at another frequency: skin effect, which grows with its root (textbook). Voltage: Ohm's law."
        />
      }
    >
      <LossPlot inputs={values} run={run} />
    </CalculatorFrame>
  );
}

type Place = "inside" | "end" | "beyond";
const VERDICTS: Record<Place, string> = {
  inside: "Something reflects inside the run",
  end: "The echo is the end of the run",
  beyond: "The echo is farther than the run is long: length or velocity factor is wrong",
};

function runOf(inputs: Inputs) {
  const { lengthM, velocityFactor, echoNs, currentMa, loopOhmPerKm } = inputs;
  const cable = fitCableLoss([{ frequencyHz: inputs.sheetMHz * 1e6, dbPer100M: inputs.lossDbPer100M }]);
  const lossAt = (metres: number) => cableLossDb(cable, metres, inputs.frequencyMHz * 1e6);
  const { distanceM, uncertaintyM } = faultDistance(echoNs, velocityFactor, { echoNs: 0, velocityFactor: 0.01 });
  const loopOhm = loopResistanceOhm(lengthM, loopOhmPerKm, 0);
  return {
    lossAt,
    lossDb: lossAt(lengthM),
    delayNs: cableDelayNs(lengthM, velocityFactor),
    distanceM,
    perHundredthM: uncertaintyM,
    loopOhm,
    dropV: (currentMa / 1000) * loopOhm,
    place: placeOf(distanceM, lengthM),
  };
}
type Run = ReturnType<typeof runOf>;

/** The end may stand 0.5 m or 2 % of the run off: the tolerance for a fault's distance, common practice, no source. */
function placeOf(distanceM: number, lengthM: number): Place {
  if (Math.abs(distanceM - lengthM) <= Math.max(0.5, 0.02 * lengthM)) return "end";
  return distanceM < lengthM ? "inside" : "beyond";
}

function LossPlot({ inputs, run }: { inputs: Inputs; run: Run }) {
  const [index, setIndex] = useState<number | null>(null);
  const reach = Math.max(10, 1.12 * Math.max(inputs.lengthM, run.distanceM));
  const x = useMemo(() => Array.from({ length: POINTS + 1 }, (_, at) => (reach * at) / POINTS), [reach]);
  const y = x.map(run.lossAt);
  const delays = x.map((metres) => cableDelayNs(metres, inputs.velocityFactor));
  const apart = Math.abs(run.distanceM - inputs.lengthM) > 0.25 * reach; // else the names would touch
  const at = Math.min(POINTS, index ?? Math.round((POINTS * run.distanceM) / reach));
  return (
    <LinePlot
      x={{ name: "length, m", from: 0, to: reach }}
      y={{ name: `loss at ${formatNumber(inputs.frequencyMHz, 2)} MHz, dB`, from: 0, to: 1.1 * run.lossAt(reach) }}
      curves={[{ name: "loss", role: "subject", x, y }]}
      bands={[{ x: [0, inputs.lengthM] }]}
      limits={[
        { x: run.distanceM, name: `echo, ${formatNumber(run.distanceM, 1)} m`, tone: "minus" },
        ...(apart ? [{ x: inputs.lengthM, name: "end of the run" }] : []),
      ]}
      summary={`Loss against length: ${formatNumber(run.lossDb, 2)} dB over ${formatNumber(inputs.lengthM, 1)} m; the echo comes from ${formatNumber(run.distanceM, 2)} m.`}
      cursor={{
        index: at,
        onMove: setIndex,
        lines: (point) => [
          `${formatNumber(x[point], 1)} m`,
          `${formatNumber(y[point], 2)} dB`,
          `${formatNumber(delays[point], 1)} ns one way`,
        ],
      }}
      columns={[
        { name: "length, m", values: x, decimals: 1 },
        { name: "loss, dB", values: y, decimals: 2 },
        { name: "delay, ns", values: delays, decimals: 1 },
        { name: "echo, ns", values: delays.map((delay) => 2 * delay), decimals: 1 },
      ]}
      height={340}
    />
  );
}

function worked(
  { velocityFactor, echoNs, lengthM, lossDbPer100M, sheetMHz, frequencyMHz, currentMa }: Inputs,
  run: Run,
) {
  const factor = texNumber(velocityFactor, 3);
  return [
    String.raw`d=\tfrac12\cdot ${factor}\cdot 0.299792\,\tfrac{\mathrm m}{\mathrm{ns}}\cdot ${texQuantity(echoNs, "ns", 1)}=${texQuantity(run.distanceM, "m", 2)}`,
    String.raw`\tau=\frac{${texQuantity(lengthM, "m", 1)}}{${factor}\cdot 0.299792\,\mathrm{m/ns}}=${texQuantity(run.delayNs, "ns", 2)}`,
    String.raw`A=\frac{${texNumber(lossDbPer100M, 2)}\cdot ${texNumber(lengthM, 1)}}{100}\sqrt{\frac{${texNumber(frequencyMHz, 2)}}{${texNumber(sheetMHz, 0)}}}\,\mathrm{dB}=${texQuantity(run.lossDb, "dB", 2)}`,
    String.raw`U=${texQuantity(currentMa / 1000, "A", 3)}\cdot ${texQuantity(run.loopOhm, "\\Omega", 2)}=${texQuantity(run.dropV, "V", 3)}`,
  ];
}

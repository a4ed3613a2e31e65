"use client";
import { useMemo, useState } from "react";
import { BarPlot } from "@/components/plots/BarPlot";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { Notice } from "@/components/ui/Notice";
import { Ledger } from "@/components/ui/Ledger";
import type { SampleFacts } from "@/lib/formats/describeSamples";
import type { Spectrum } from "@/lib/gnss/interference/spectrum";
import type { CaptureDescription } from "./readCapture";

/** What a recording is: its facts, its spectrum, and how often each value occurs. */
export function CaptureFacts({ description }: { description: CaptureDescription }) {
  const { format, rateHz, carrierHz, facts, spectrum } = description;
  const percent = facts.clippedShare === null ? null : formatNumber(100 * facts.clippedShare, 3);
  return (
    <>
      <Ledger
        rows={[
          { label: "Samples", value: format, detail: facts.offset.length === 2 ? "I and Q" : "real" },
          { label: "Rate", value: `${formatNumber(rateHz / 1e6, 3)} MHz` },
          {
            label: "Length",
            value: `${formatNumber((1000 * facts.samples) / rateHz, 1)} ms`,
            detail: `${formatNumber(facts.samples)} samples`,
          },
          { label: "L1 stands at", value: `${formatNumber(carrierHz / 1e6, 3, true)} MHz` },
          {
            label: "Clipped",
            value: percent === null ? "cannot be told" : `${percent} %`,
            detail: percent === null ? "floating point has no ends" : "of the values stand at an end of the format",
          },
          {
            label: "DC offset",
            value: facts.offset.map((part) => formatNumber(part, 3, true)).join(" and "),
            detail: `counts; one sigma is ${formatNumber(facts.rms, 2)}`,
          },
          {
            label: "Level",
            value: Number.isFinite(facts.levelDb) ? `${formatNumber(facts.levelDb, 1, true)} dB` : "silence",
            detail: percent === null ? "against 1" : "against the largest value of the format",
          },
          ...(description.hash ? [hashRow(description.hash)] : []),
        ]}
      />
      {description.hash === "differs" && (
        <Notice tone="minus" fact="These are not the samples that the metadata were written for." live>
          Their SHA-512 differs from core:sha512. The file is shown as it is; as evidence it does not serve.
        </Notice>
      )}
      {facts.rms > 0 && <SpectrumPlot spectrum={spectrum} />}
      <ValuesPlot facts={facts} />
    </>
  );
}

const hashRow = (hash: "fits" | "differs" | "cannot be checked") => ({
  label: "SHA-512",
  value: hash,
  detail: hash === "cannot be checked" ? "browsers do so on pages that come by HTTPS" : "core:sha512 of the metadata",
});

function SpectrumPlot({ spectrum }: { spectrum: Spectrum }) {
  const [index, setIndex] = useState<number | null>(null);
  const { x, y, top, low } = useMemo(() => curveOf(spectrum), [spectrum]);
  const resolution = `${formatNumber(spectrum.resolutionHz / 1000, 2)} kHz`;
  return (
    <section>
      <h3 className="text-h3">Spectrum</h3>
      <LinePlot
        x={{ name: "from L1, MHz", from: x[0], to: x[x.length - 1], decimals: 3, signed: true }}
        y={{ name: "density over its median, dB", from: low, to: 5 * Math.ceil((y[top] + 1) / 5), decimals: 1 }}
        curves={[{ name: "density", role: "subject", x, y }]}
        summary={`Spectrum of the recording, resolution ${resolution}: highest ${formatNumber(y[top], 1)} dB over the median at ${formatNumber(x[top], 3, true)} MHz from L1.`}
        cursor={{
          index: index ?? top,
          onMove: setIndex,
          lines: (at) => [`${formatNumber(x[at], 3, true)} MHz`, `${formatNumber(y[at], 1, true)} dB`],
        }}
        height={260}
      />
      <p className="mt-1 text-label font-normal text-ink-2 figures">
        Resolution {resolution}; {formatNumber(spectrum.averaged)} transforms averaged.
      </p>
    </section>
  );
}

const DEEPEST_DB = -40; // an empty bin has no depth

function curveOf({ offsetsHz, densityPerHz }: Spectrum) {
  const median = Float64Array.from(densityPerHz).sort()[densityPerHz.length >> 1];
  const floor = 10 ** (DEEPEST_DB / 10);
  const y = densityPerHz.map((density) => 10 * Math.log10(Math.max(floor, density / Math.max(median, 1e-300))));
  const low = Math.min(-5, 5 * Math.floor(Math.min(...y) / 5));
  return { x: offsetsHz.map((hz) => hz / 1e6), y, top: y.indexOf(Math.max(...y)), low };
}

function ValuesPlot({ facts }: { facts: SampleFacts }) {
  const [index, setIndex] = useState<number | null>(null);
  const { histogram, lowest, highest, clippedShare } = facts;
  const shares = useMemo(() => percentOf(histogram.counts), [histogram]);
  const { centres } = histogram;
  const half = centres.length > 1 ? (centres[1] - centres[0]) / 2 : 0.5;
  const clipped = clippedShare ? `${formatNumber(100 * clippedShare, 2)} % clipped` : null;
  return (
    <section>
      <h3 className="text-h3">Values of the samples</h3>
      <BarPlot
        x={{
          name: "counts",
          from: centres[0] - half,
          to: centres[centres.length - 1] + half,
          decimals: 1,
          signed: true,
        }}
        y={{ name: "of the values, %", from: 0, to: 1.1 * Math.max(...shares), decimals: 2 }}
        bars={{ x: centres, y: shares }}
        limits={
          clipped
            ? [
                { x: highest, name: clipped, tone: "minus" },
                { x: lowest, name: "", tone: "minus" },
              ]
            : []
        }
        summary={`How often each value occurs, from ${formatNumber(lowest, 1, true)} to ${formatNumber(highest, 1, true)}; ${clipped ?? "none clipped"}.`}
        cursor={{
          index: index ?? centres.length >> 1,
          onMove: setIndex,
          lines: (at) => [`${formatNumber(centres[at], 1, true)}`, `${formatNumber(shares[at], 2)} %`],
        }}
        height={220}
      />
    </section>
  );
}

function percentOf(counts: Float64Array): Float64Array {
  const total = counts.reduce((sum, count) => sum + count, 0);
  return counts.map((count) => (100 * count) / total);
}

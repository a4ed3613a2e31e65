"use client";
import { useState } from "react";
import { SectionHead } from "@/components/ui/SectionHead";
import { Select } from "@/components/ui/Select";
import { Working } from "@/components/ui/Working";
import { CaptureFailed } from "./CaptureFailed";
import { CaptureSpectrogram } from "./CaptureSpectrogram";
import type { Reading } from "./reading";
import { PowerInTime, RepetitionReader } from "./RepetitionReader";
import { SpectrumReader } from "./SpectrumReader";
import { useCapture } from "./useCapture";
import { useLook } from "./useLook";

type CaptureLookProps = {
  /** Address of the samples, 8-bit I and Q alternating. */
  address: string;
  rateHz: number;
  onTake?: (reading: Reading) => void;
};

const FULL_SCALE = 127 * 127; // |x|^2 at 0 dB
/** Noise bandwidth of the window: two bins. */
const POINTS = [512, 2048, 8192, 65_536].map((points) => ({ value: String(points), bins: 2 / points }));
const STRETCHES = [
  { value: "50", label: "50 µs" },
  { value: "200", label: "200 µs" },
  { value: "1000", label: "1 ms" },
  { value: "10000", label: "10 ms" },
];

/** A capture seen for what disturbs it: spectrum, spectra in time, repetition, power in time. */
export function CaptureLook({ address, rateHz, onTake }: CaptureLookProps) {
  const [again, setAgain] = useState(0);
  const load = useCapture(address, again);
  const [points, setPoints] = useState("2048");
  const [stretchUs, setStretchUs] = useState("1000");
  const samples = load.state === "ready" ? load.samples : null;
  const look = useLook(samples, rateHz, { points: Number(points), stretchS: Number(stretchUs) * 1e-6 });
  if (load.state === "failed") {
    return <CaptureFailed onAgain={() => setAgain(again + 1)} />;
  }
  if (!look) return <Working label={load.state === "loading" ? "Loading the capture" : "Computing the spectra"} />;
  const choices = (list: typeof POINTS) =>
    list.map(({ value, bins }) => ({ value, label: `${Number(((rateHz * bins) / 1000).toPrecision(2))} kHz` }));
  return (
    <div className="grid gap-10">
      <section className="grid gap-4">
        <SectionHead title="Averaged spectrum" level={3} />
        <Select
          label="Resolution"
          value={points}
          choices={choices(POINTS)}
          onChange={(event) => setPoints(event.target.value)}
        />
        <SpectrumReader spectrum={look.spectrum} fullScale={FULL_SCALE} onTake={onTake} />
      </section>
      <CaptureSpectrogram
        shown={look.spectrogram}
        refused={null}
        fromMiddle
        fields={
          <Select
            label="Stretch from the start"
            help="The shorter it is, the finer the time."
            value={stretchUs}
            choices={STRETCHES}
            onChange={(event) => setStretchUs(event.target.value)}
          />
        }
      />
      <section className="grid gap-4">
        <SectionHead title="Repetition" level={3} />
        <RepetitionReader likeness={look.likeness} onTake={onTake} />
      </section>
      <section className="grid gap-4">
        <SectionHead title="Power in time" level={3} />
        <PowerInTime power={look.power} fullScale={FULL_SCALE} />
      </section>
    </div>
  );
}

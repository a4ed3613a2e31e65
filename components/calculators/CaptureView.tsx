"use client";
import { Key } from "@/components/ui/Key";
import { Notice } from "@/components/ui/Notice";
import { Select } from "@/components/ui/Select";
import type { ValuesOf } from "@/lib/calculators/calculator";
import { CAPTURE_VIEW } from "@/lib/calculators/captureView";
import { CalculatorFields } from "./CalculatorFields";
import { CalculatorFrame } from "./CalculatorFrame";
import type { CalculatorProps } from "./calculatorProps";
import { CaptureBusyLine } from "./CaptureBusyLine";
import { CaptureChooser } from "./CaptureChooser";
import { CaptureFacts } from "./CaptureFacts";
import type { TypedFormat } from "./readCapture";
import { FoundGrid, FoundReading, PlaceReadings, type FoundOne } from "./CaptureReadings";
import { CaptureSpectrogram } from "./CaptureSpectrogram";
import { Formula } from "./Formula";
import { refusalSentence } from "./refusalSentence";
import { SkyFindings } from "./SkyFindings";
import { texNumber, texQuantity } from "./texNumber";
import { useCaptureFile } from "./useCaptureFile";

type Inputs = ValuesOf<typeof CAPTURE_VIEW>;
const FALSE_ALARM_PER_SEARCH = 1e-3;
const FORMATS = CAPTURE_VIEW.inputs[4].choices;

/** A recording read where it lies: what it is, its spectrum and values, and the satellites in it. */
export function CaptureView({ values, onChange }: CalculatorProps<typeof CAPTURE_VIEW>) {
  const typed = { format: values.format, rateHz: hzOf(values.rateMHz), carrierHz: hzOf(values.carrierMHz) };
  const { reader, busy, description, one, all, refused, ...drawn } = useCaptureFile(typed, values);
  const request = requestOf(values);
  const missing = description ? null : "Choose a file first.";
  return (
    <CalculatorFrame
      busy={busy !== null}
      reading={<FoundReading one={one} hasFile={description !== null} />}
      fields={
        <>
          <CalculatorFields
            of={CAPTURE_VIEW}
            keys={["prn", "coherentMs", "sums", "windowHz"]}
            values={values}
            onChange={onChange}
          />
          <div className="col-span-full grid justify-items-start gap-3 no-print">
            <Key
              reason={missing}
              busy={busy !== null}
              onClick={() => reader.search({ kind: "one", prn: values.prn, request })}
            >
              Search PRN {values.prn}
            </Key>
            <Key reason={missing} busy={busy !== null} onClick={() => reader.search({ kind: "all", request })}>
              Search all 1 to 32
            </Key>
          </div>
        </>
      }
      below={
        description && (
          <div className="grid grid-cols-1 gap-5">
            <CaptureFacts description={description} />
            {description.facts.rms > 0 && (
              <CaptureSpectrogram
                shown={drawn.spectrogram}
                refused={drawn.spectrogramRefused}
                fields={
                  <CalculatorFields
                    of={CAPTURE_VIEW}
                    keys={["fromMs", "lengthMs"]}
                    values={values}
                    onChange={onChange}
                  />
                }
              />
            )}
          </div>
        )
      }
      more={one && <PlaceReadings one={one} />}
      working={
        <Formula
          tex={[
            String.raw`P[f,k]=\sum_{m=1}^{K}\Bigl|\sum_{n}x_n\,c_{n-k}\,e^{-j2\pi f n/f_s}\Bigr|^2,\quad \overline{P}_{noise}=1`,
            String.raw`\tfrac{C}{N_0}\approx 10\log_{10}\frac{P-1}{T}`,
          ]}
          worked={one ? [worked(one)] : []}
          source="Search by transforms, chi-square threshold for one false alarm in 1 000 searches: Kaplan and Hegarty, Understanding GPS, 2nd edition, 5.8. C/A codes: IS-GPS-200, Table 3-Ia. Spectrum: Welch, 1967, with the window of Harris, 1978."
        />
      }
    >
      <CaptureChooser name={description?.name ?? null} onChoose={(files) => reader.open(files)}>
        <FormatFields values={values} onChange={onChange} asked={description?.readAsTyped ?? ALL_TYPED} />
      </CaptureChooser>
      {busy && <CaptureBusyLine busy={busy} onCancel={() => reader.cancel()} />}
      {refused && (
        <Notice tone="minus" fact={description ? "This cannot be searched." : "The file cannot be read."} live>
          {refusalSentence(refused)}
        </Notice>
      )}
      {one && <FoundGrid one={one} busy={busy !== null} />}
      {all && <SkyFindings sky={all.sky} />}
    </CalculatorFrame>
  );
}

const ALL_TYPED: readonly (keyof TypedFormat)[] = ["format", "rateHz", "carrierHz"];

/** What the recording does not say itself; a change is read at once. */
function FormatFields({ asked, values, onChange }: CalculatorProps<typeof CAPTURE_VIEW> & { asked: typeof ALL_TYPED }) {
  const keys = [asked.includes("rateHz") && "rateMHz", asked.includes("carrierHz") && "carrierMHz"] as const;
  if (asked.length === 0) return <p className="col-span-full text-dense text-ink-2">Read as its metadata say.</p>;
  return (
    <>
      {asked.includes("format") && (
        <Select
          label="Samples"
          help="of a raw file"
          value={values.format}
          choices={FORMATS}
          onChange={(event) => onChange({ ...values, format: event.target.value as Inputs["format"] })}
        />
      )}
      <CalculatorFields
        of={CAPTURE_VIEW}
        keys={keys.filter((key) => key !== false)}
        values={values}
        onChange={onChange}
      />
    </>
  );
}

/** Whole millihertz: 4.092 MHz are not 4 091 999.999 Hz. */
const hzOf = (mhz: number) => Math.round(mhz * 1e9) / 1e3;

const requestOf = ({ coherentMs, sums, windowHz }: Inputs) => ({
  coherentMs,
  sums,
  dopplerHalfWidthHz: windowHz,
  falseAlarmPerSearch: FALSE_ALARM_PER_SEARCH,
});

function worked({ map: { finding }, request }: FoundOne): string {
  const { peak, threshold, found, cn0DbHz } = finding;
  const ratio = String.raw`K=${texNumber(request.sums)},\ T=${texQuantity(request.coherentMs, "ms")}:\quad 10\log_{10}\frac{${texNumber(peak, 2)}}{${texNumber(threshold, 2)}}=${texQuantity(10 * Math.log10(peak / threshold), "dB", 1)}`;
  return found ? String.raw`${ratio},\quad \tfrac{C}{N_0}=${texQuantity(cn0DbHz, "dB\\text{-}Hz", 1)}` : ratio;
}

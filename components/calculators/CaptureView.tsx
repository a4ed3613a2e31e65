"use client";
import { useMemo } from "react";
import { formatNumber } from "@/components/ui/formatNumber";
import { Key } from "@/components/ui/Key";
import { Notice } from "@/components/ui/Notice";
import { Select } from "@/components/ui/Select";
import { Working } from "@/components/ui/Working";
import type { ValuesOf } from "@/lib/calculators/calculator";
import { CAPTURE_VIEW } from "@/lib/calculators/captureView";
import { CalculatorFields } from "./CalculatorFields";
import { CalculatorFrame } from "./CalculatorFrame";
import type { CalculatorProps } from "./calculatorProps";
import { CaptureChooser } from "./CaptureChooser";
import { CaptureFacts } from "./CaptureFacts";
import { Formula } from "./Formula";
import { GridReading } from "./GridReading";
import { Reading, Verdict } from "./Reading";
import { SkyFindings } from "./SkyFindings";
import { texNumber, texQuantity } from "./texNumber";
import { useCaptureFile, type CaptureBusy, type CaptureFileState } from "./useCaptureFile";

type Inputs = ValuesOf<typeof CAPTURE_VIEW>;
const FALSE_ALARM_PER_SEARCH = 1e-3;
const FORMATS = CAPTURE_VIEW.inputs[4].choices;

/** A recording read where it lies: what it is, its spectrum and values, and the satellites in it. */
export function CaptureView({ values, onChange }: CalculatorProps<typeof CAPTURE_VIEW>) {
  const file = useCaptureFile();
  const { busy, description, one, all, refused } = file;
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
              onClick={() => file.search({ kind: "one", prn: values.prn, request })}
            >
              Search PRN {values.prn}
            </Key>
            <Key reason={missing} busy={busy !== null} onClick={() => file.search({ kind: "all", request })}>
              Search all 1 to 32
            </Key>
          </div>
        </>
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
      <CaptureChooser
        name={description?.name ?? null}
        onChoose={(files) =>
          file.open({
            ...files,
            typed: { format: values.format, rateHz: hzOf(values.rateMHz), carrierHz: hzOf(values.carrierMHz) },
          })
        }
      >
        <Select
          label="Samples"
          help="of a raw file"
          value={values.format}
          choices={FORMATS}
          onChange={(event) => onChange({ ...values, format: event.target.value as Inputs["format"] })}
        />
        <CalculatorFields of={CAPTURE_VIEW} keys={["rateMHz", "carrierMHz"]} values={values} onChange={onChange} />
      </CaptureChooser>
      {busy && <BusyLine busy={busy} onCancel={file.cancel} />}
      {refused && (
        <Notice tone="minus" fact={description ? "This cannot be searched." : "The file cannot be read."} live>
          {sentence(refused)}
        </Notice>
      )}
      {one && <FoundGrid one={one} busy={busy !== null} />}
      {all && <SkyFindings sky={all.sky} />}
      {description && <CaptureFacts description={description} />}
    </CalculatorFrame>
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

type One = NonNullable<CaptureFileState["one"]>;

function FoundReading({ one, hasFile }: { one: One | null; hasFile: boolean }) {
  const finding = one?.map.finding;
  return (
    <>
      {finding && (
        <Verdict glyph={finding.found ? "within" : "outside"}>
          {finding.found ? `PRN ${finding.prn} passes the threshold` : `PRN ${finding.prn} does not pass the threshold`}
        </Verdict>
      )}
      <Reading
        label="Peak to threshold"
        value={finding ? 10 * Math.log10(finding.peak / finding.threshold) : null}
        decimals={1}
        signed
        unit="dB"
        deciding
      >
        {finding
          ? `peak ${formatNumber(finding.peak, 2)}, threshold ${formatNumber(finding.threshold, 2)}, mean noise 1`
          : hasFile
            ? "Search a satellite."
            : "Choose a file."}
      </Reading>
    </>
  );
}

function PlaceReadings({ one: { map } }: { one: One }) {
  const { found, cn0DbHz, dopplerHz, codePhaseChips } = map.finding;
  return (
    <>
      <Reading label="C/N0" value={found ? cn0DbHz : null} decimals={1} unit="dB-Hz">
        {!found && "only of what passes the threshold"}
      </Reading>
      <Reading label="Doppler" value={dopplerHz} decimals={0} signed unit="Hz" />
      <Reading label="Code phase at the first sample" value={codePhaseChips} decimals={2} unit="chip" />
    </>
  );
}

function FoundGrid({ one: { map, overview, request }, busy }: { one: One; busy: boolean }) {
  const { finding, dopplersHz, lagsChips, power } = map;
  const result = useMemo(() => {
    const settings = { ...request, dopplerStepHz: 500 / request.coherentMs };
    return {
      prn: finding.prn,
      settings,
      grid: { dopplersHz, lagsChips, power, overview, threshold: finding.threshold },
    };
  }, [finding, request, dopplersHz, lagsChips, power, overview]);
  const top = overview.peaks[0];
  const columns = lagsChips.length;
  const start = useMemo(() => ({ row: Math.floor(top / columns), column: top % columns }), [top, columns]);
  return <GridReading result={result} busy={busy} start={start} />;
}

function BusyLine({ busy, onCancel }: { busy: CaptureBusy; onCancel: () => void }) {
  const reading = busy.step === "read";
  const unit = reading ? 1e6 : 1;
  const shown = (value?: number) => (value === undefined ? undefined : Math.round((10 * value) / unit) / 10);
  return (
    <div className="grid gap-3">
      <Working
        label={reading ? "Reading the file" : "Searching"}
        done={shown(busy.done)}
        total={shown(busy.total)}
        unit={reading ? "MB" : "steps"}
      />
      <p className="no-print">
        <Key size="small" onClick={onCancel}>
          {reading ? "Stop reading" : "Stop the search"}
        </Key>
      </p>
    </div>
  );
}

/** "search: 4 ms x 40 is longer than ..." without the name of the function; places of faults stay. */
const sentence = (message: string) => {
  const rule = message.replace(/^search\w*: /, "");
  const whole = `${rule[0].toUpperCase()}${rule.slice(1)}`;
  return whole.endsWith(".") ? whole : `${whole}.`;
};

function worked({ map: { finding }, request }: One): string {
  const { peak, threshold, found, cn0DbHz } = finding;
  const ratio = String.raw`K=${texNumber(request.sums)},\ T=${texQuantity(request.coherentMs, "ms")}:\quad 10\log_{10}\frac{${texNumber(peak, 2)}}{${texNumber(threshold, 2)}}=${texQuantity(10 * Math.log10(peak / threshold), "dB", 1)}`;
  return found ? String.raw`${ratio},\quad \tfrac{C}{N_0}=${texQuantity(cn0DbHz, "dB\\text{-}Hz", 1)}` : ratio;
}

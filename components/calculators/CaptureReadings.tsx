"use client";
import { useMemo } from "react";
import { formatNumber } from "@/components/ui/formatNumber";
import type { CaptureFileState } from "./CaptureReader";
import { GridReading } from "./GridReading";
import { Reading, Verdict } from "./Reading";

export type FoundOne = NonNullable<CaptureFileState["one"]>;

/** Whether the satellite that was searched passes the threshold. */
export function FoundReading({ one, hasFile }: { one: FoundOne | null; hasFile: boolean }) {
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

/** Where it stands in the recording. */
export function PlaceReadings({ one: { map } }: { one: FoundOne }) {
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

/** Its search grid, the crosshair on the highest cell. */
export function FoundGrid({ one: { map, overview, request }, busy }: { one: FoundOne; busy: boolean }) {
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

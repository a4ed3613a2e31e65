"use client";
import { useMemo, useState } from "react";
import { formatNumber } from "@/components/ui/formatNumber";
import { Key } from "@/components/ui/Key";
import { SectionHead } from "@/components/ui/SectionHead";
import { directionAt, utcOf, type ReceiverLog as Log } from "@/lib/gnss/sky/receiverLog";
import { ElevationMeans } from "./ElevationMeans";
import { LogSeries } from "./LogSeries";
import type { Reading } from "./reading";
import { SatelliteStrips } from "./SatelliteStrips";
import { satellitesOf } from "./satellitesOf";
import { SkyTracks } from "./SkyTracks";

type ReceiverLogProps = {
  log: Log;
  gainDb: readonly number[];
  currentMa: readonly number[];
  onTake?: (reading: Reading) => void;
};

/** A log of hours: every satellite's C/N0, the sky, gain control and antenna current under one cursor. */
export function ReceiverLog({ log, gainDb, currentMa, onTake }: ReceiverLogProps) {
  const satellites = useMemo(() => satellitesOf(log), [log]);
  const [reading, setReading] = useState(log.readings >> 1);
  const [prn, setPrn] = useState(() => satellites[0].prn);
  const chosen = satellites.find((satellite) => satellite.prn === prn)!;
  const directionOf = (at: number) => {
    const pass = log.passes.find((one) => one.prn === prn && at >= one.first && at < one.first + one.cn0DbHz.length);
    return pass ? directionAt(pass, log.trackEvery, at) : null;
  };
  const here = directionOf(reading);
  const take = onTake && (() => onTake({ utc: utcOf(log, reading), azimuthDeg: here?.azimuthDeg }));
  const cursor = { reading, onMove: setReading, onTake: take };
  const directionLines = (at: number) => {
    const direction = directionOf(at);
    return direction
      ? [`azimuth ${formatNumber(direction.azimuthDeg)}°`, `elevation ${formatNumber(direction.elevationDeg)}°`]
      : [];
  };
  return (
    <div className="grid gap-8">
      <section>
        <SectionHead
          title="C/N0 of every satellite"
          note="20 to 56 dB-Hz in each strip; press one to choose it"
          level={3}
        />
        <SatelliteStrips log={log} satellites={satellites} chosen={prn} onChoose={setPrn} cursor={cursor} />
      </section>
      <section>
        <SectionHead title={`PRN ${prn}`} level={3} />
        <LogSeries
          log={log}
          name="C/N0, dB-Hz"
          unit="dB-Hz"
          decimals={0}
          columns={[{ name: `PRN ${prn}`, values: chosen.cn0DbHz }]}
          cursor={cursor}
          leastSpan={20}
          more={directionLines}
        />
      </section>
      <section>
        <SectionHead title="Gain control" note="up when less power comes in" level={3} />
        <LogSeries
          log={log}
          name="gain, dB"
          unit="dB"
          decimals={1}
          columns={[{ name: "gain", values: gainDb }]}
          cursor={cursor}
          leastSpan={6}
          height={200}
        />
      </section>
      <section>
        <SectionHead title="Antenna current" level={3} />
        <LogSeries
          log={log}
          name="current, mA"
          unit="mA"
          decimals={1}
          columns={[{ name: "current", values: currentMa }]}
          cursor={cursor}
          leastSpan={10}
          height={200}
        />
      </section>
      {take && (
        <Key variant="filled" wide onClick={take}>
          {here
            ? `Take ${utcOf(log, reading)} or azimuth ${formatNumber(here.azimuthDeg)}°`
            : `Take ${utcOf(log, reading)}`}
        </Key>
      )}
      <div className="grid gap-8 tablet:grid-cols-[300px_1fr]">
        <section>
          <SectionHead title="Sky plot" note={`at ${utcOf(log, reading)} UTC`} level={3} />
          <SkyTracks log={log} chosen={prn} reading={reading} />
        </section>
        <section>
          <SectionHead title="Mean C/N0 by elevation" level={3} className="mb-3" />
          <ElevationMeans log={log} reading={reading} />
        </section>
      </div>
    </div>
  );
}

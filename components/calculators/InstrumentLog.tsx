"use client";
import { useMemo, useState } from "react";
import { Key } from "@/components/ui/Key";
import { SectionHead } from "@/components/ui/SectionHead";
import { utcOf, type ReceiverLog } from "@/lib/gnss/sky/receiverLog";
import { ChangeTable } from "./ChangeTable";
import { LogSeries } from "./LogSeries";
import type { Reading } from "./reading";
import { SatelliteStrips } from "./SatelliteStrips";
import { satellitesOf } from "./satellitesOf";
import { SkyTracks } from "./SkyTracks";

export type InstrumentData = {
  log: ReceiverLog;
  gainDb: readonly number[];
  clockNs: readonly number[];
  eastM: readonly number[];
  northM: readonly number[];
  upM: readonly number[];
  dopplerMeanHz: readonly number[];
  dopplerSpreadHz: readonly number[];
};

/** A receiver's own instruments under one cursor: C/N0, gain control, clock, position, Doppler. */
export function InstrumentLog({ data, onTake }: { data: InstrumentData; onTake?: (reading: Reading) => void }) {
  const { log } = data;
  const satellites = useMemo(() => satellitesOf(log), [log]);
  const [reading, setReading] = useState(log.readings >> 1);
  const [prn, setPrn] = useState(() => satellites[0].prn);
  const utc = utcOf(log, reading);
  const take = onTake && (() => onTake({ utc }));
  const series = { log, cursor: { reading, onMove: setReading, onTake: take }, height: 200 };
  return (
    <div className="grid gap-8">
      <section>
        <SectionHead title="C/N0 of every satellite" note="20 to 56 dB-Hz in each strip" level={3} />
        <SatelliteStrips log={log} satellites={satellites} chosen={prn} onChoose={setPrn} cursor={series.cursor} />
      </section>
      <section>
        <SectionHead title="Gain control" note="up when less power comes in" level={3} />
        <LogSeries
          {...series}
          name="gain, dB"
          unit="dB"
          decimals={1}
          columns={[{ name: "gain", values: data.gainDb }]}
          leastSpan={6}
        />
      </section>
      <section>
        <SectionHead title="Clock" note="against the station's own oscillator" level={3} />
        <LogSeries
          {...series}
          name="clock, ns"
          unit="ns"
          decimals={1}
          columns={[{ name: "clock", values: data.clockNs }]}
          leastSpan={100}
          signed
        />
      </section>
      <section>
        <SectionHead title="Position" note="against the survey" level={3} />
        <LogSeries
          {...series}
          name="position, m"
          unit="m"
          decimals={1}
          columns={[
            { name: "east", values: data.eastM },
            { name: "north", values: data.northM },
            { name: "up", values: data.upM },
          ]}
          leastSpan={20}
          signed
        />
      </section>
      <section>
        <SectionHead title="Doppler" note="measured less predicted, over all satellites" level={3} />
        <LogSeries
          {...series}
          name="Doppler, Hz"
          unit="Hz"
          decimals={2}
          columns={[
            { name: "mean", values: data.dopplerMeanHz },
            { name: "deviation", values: data.dopplerSpreadHz },
          ]}
          leastSpan={6}
          signed
        />
      </section>
      {take && (
        <Key variant="filled" wide onClick={take}>
          {`Take ${utc}`}
        </Key>
      )}
      <div className="grid gap-8 tablet:grid-cols-[300px_1fr]">
        <section>
          <SectionHead title="Sky plot" note={`at ${utc} UTC`} level={3} />
          <SkyTracks log={log} chosen={prn} reading={reading} />
        </section>
        <section>
          <SectionHead title="Before and after the cursor" level={3} className="mb-3" />
          <ChangeTable log={log} reading={reading} />
        </section>
      </div>
    </div>
  );
}

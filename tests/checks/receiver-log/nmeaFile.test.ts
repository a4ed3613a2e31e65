import { expect, test } from "vitest";
import { csvFile } from "@/lib/checks/receiver-log/csvFile";
import { drawSky, lengthOf } from "@/lib/checks/receiver-log/drawSky";
import { drawPattern, drawReadings } from "@/lib/checks/receiver-log/levels";
import { nmeaFile } from "@/lib/checks/receiver-log/nmeaFile";
import { nmeaReader } from "@/lib/formats/nmea/nmeaReader";
import { readSatellitesInView } from "@/lib/formats/nmea/satellitesInView";
import { readTimeAndDate } from "@/lib/formats/nmea/timeAndDate";
import { directionAt } from "@/lib/gnss/sky/receiverLog";
import { seededRandom } from "@/lib/numeric/random";
import { seedOf } from "../planOf";

const times = { startUnixMs: Date.UTC(2026, 4, 1, 23, 30), intervalS: 30, readings: 240, trackEvery: 10 };
const random = seededRandom(seedOf(1), "test");
const sky = drawSky(random, times);
const log = {
  ...times,
  passes: drawReadings(random, sky, times, drawPattern(random), (reading) => (reading > 200 ? 14 : 0)),
};

test("the file holds every reading of the log, by the reader of sentences", () => {
  const [epochs, faults]: [number[], unknown[]] = [[], []];
  const found = new Map<string, number | null>();
  const reader = nmeaReader();
  for (const line of [...reader.push(nmeaFile("log.nmea", log).bytes), ...reader.end()]) {
    if ("fault" in line) faults.push(line.fault);
    else if (line.sentence.type === "ZDA") epochs.push(readTimeAndDate(line.sentence));
    else
      for (const { prn, elevationDeg, azimuthDeg, cn0DbHz } of readSatellitesInView(line.sentence).satellites)
        found.set(`${epochs.length - 1} ${prn} ${elevationDeg} ${azimuthDeg}`, cn0DbHz);
  }
  expect(faults).toEqual([]);
  expect(epochs).toEqual(Array.from({ length: 240 }, (_, n) => times.startUnixMs + n * 30_000));
  const expected = log.passes.flatMap((pass) =>
    pass.cn0DbHz.map((cn0, at) => {
      const { azimuthDeg, elevationDeg } = directionAt(pass, 10, pass.first + at);
      return [
        `${pass.first + at} ${pass.prn} ${Math.round(elevationDeg)} ${Math.round(azimuthDeg) % 360}`,
        cn0,
      ] as const;
    }),
  );
  expect(found).toEqual(new Map(expected));
  expect(log.passes.some(({ cn0DbHz }) => cn0DbHz.includes(null))).toBe(true);
});

test("passes begin at a given direction and never run past the log", () => {
  expect(sky.length).toBeGreaterThan(8);
  for (const pass of sky) {
    expect(pass.first % times.trackEvery).toBe(0);
    expect(pass.first + lengthOf(pass, times)).toBeLessThanOrEqual(times.readings);
    expect(Math.min(...pass.elevationDeg)).toBeGreaterThanOrEqual(5);
  }
});

test("columns go out with their times; what is not there is empty", () => {
  const { bytes } = csvFile("a.csv", { ...times, readings: 2 }, [
    { name: "gain_db", values: [30.04, null], decimals: 1 },
  ]);
  expect(new TextDecoder().decode(bytes)).toBe("utc,gain_db\r\n23:30:00,30.0\r\n23:30:30,\r\n");
});

import { writeSatellitesInView, type InView } from "@/lib/formats/nmea/satellitesInView";
import { writeTimeAndDate } from "@/lib/formats/nmea/timeAndDate";
import { directionAt, type ReceiverLog } from "@/lib/gnss/sky/receiverLog";
import type { CaseFile } from "../kind";

/** The log as a receiver sends it: time and date, then its satellites in view, reading after reading. */
export function nmeaFile(name: string, log: ReceiverLog): CaseFile {
  const sentences = Array.from(
    { length: log.readings },
    (_, reading) =>
      writeTimeAndDate("GP", log.startUnixMs + reading * log.intervalS * 1000) +
      writeSatellitesInView("GP", inViewAt(log, reading)),
  );
  return { name, mediaType: "text/plain", bytes: new TextEncoder().encode(sentences.join("")) };
}

function inViewAt({ passes, trackEvery }: ReceiverLog, reading: number): InView[] {
  const found: InView[] = [];
  for (const pass of passes) {
    const at = reading - pass.first;
    if (at < 0 || at >= pass.cn0DbHz.length) continue;
    const { azimuthDeg, elevationDeg } = directionAt(pass, trackEvery, reading);
    found.push({
      prn: pass.prn,
      elevationDeg: Math.round(elevationDeg),
      azimuthDeg: Math.round(azimuthDeg) % 360,
      cn0DbHz: pass.cn0DbHz[at],
    });
  }
  return found.sort((a, b) => a.prn - b.prn);
}

import { readCapture } from "../captureFiles";
import type { Answers, CaseFile } from "../kind";
import { analyse, type CaptureReading } from "./analyse";

/** The right method, from the capture alone. */
export const solve = ({ files }: { files: readonly CaseFile[] }): Answers => answersFor(readingOf(files));

const read = new WeakMap<Uint8Array, CaptureReading>();

/** What careful analysis reads; the same samples are not analysed twice, since each wrong method begins with the right one. */
export function readingOf(files: readonly CaseFile[]): CaptureReading {
  const capture = readCapture(files);
  const bytes = files.find(({ bytes: own }) => own.buffer === capture.samples.buffer)!.bytes;
  const known = read.get(bytes) ?? analyse(capture);
  read.set(bytes, known);
  return known;
}

/** As a careful person writes it down. */
export const answersFor = (reading: CaptureReading): Answers => ({
  "interference.class": reading.class,
  "interference.centre": (reading.centreHz / 1000).toFixed(0),
  "interference.bandwidth": String(Number((reading.bandwidthHz / 1000).toPrecision(3))),
  "interference.period": String(Number((reading.periodS * 1e6).toPrecision(3))),
  "interference.level": reading.levelDb.toFixed(1),
  "receiver.floor": reading.floorDb.toFixed(1),
  "receiver.ownLine": reading.ownLineDb.toFixed(1),
});

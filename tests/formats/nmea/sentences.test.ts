import { describe, expect, test } from "vitest";
import { nmeaChecksum } from "@/lib/formats/nmea/checksum";
import { nmeaReader, type NmeaLine } from "@/lib/formats/nmea/nmeaReader";
import { readSentence } from "@/lib/formats/nmea/readSentence";
import { readSatellitesInView, writeSatellitesInView, type InView } from "@/lib/formats/nmea/satellitesInView";
import { readTimeAndDate, writeTimeAndDate } from "@/lib/formats/nmea/timeAndDate";
import { writeSentence } from "@/lib/formats/nmea/writeSentence";

// Sentences published with NMEA 0183 / IEC 61162-1; the third is a receiver manufacturer's own.
const PUBLISHED = [
  ["GPGGA,123519,4807.038,N,01131.000,E,1,08,0.9,545.4,M,46.9,M,,", "47"],
  ["GPGLL,4916.45,N,12311.12,W,225444,A,", "1D"],
  ["PSRF103,00,01,00,01", "25"],
  ["GPRMC,225446,A,4916.45,N,12311.12,W,000.5,054.7,191194,020.3,E", "68"],
] as const;
const bytes = (text: string) => new TextEncoder().encode(text);
const faultOf = (text: string) => {
  try {
    return readSentence(text, 7);
  } catch (error) {
    return (error as Error).message;
  }
};

test.each(PUBLISHED)("checksum of %s", (body, sum) => {
  expect(nmeaChecksum(body)).toBe(sum);
  const [address, ...fields] = body.split(",");
  expect(writeSentence(address, fields)).toBe(`$${body}*${sum}\r\n`);
  expect(readSentence(`$${body}*${sum}`, 1)).toMatchObject({ line: 1, fields });
});

test("talker and type", () => {
  expect(readSentence("$GPGLL,4916.45,N,12311.12,W,225444,A,*1D", 3)).toMatchObject({ talker: "GP", type: "GLL" });
  expect(readSentence("$PSRF103,00,01,00,01*25", 3)).toMatchObject({ talker: "P", type: "SRF103" });
});

describe("a broken line says where and why", () => {
  test.each([
    ["GPGLL,1*00", "7:1: A sentence begins with $."],
    ["$GPGLL,4916.45,N,12311.12,W,225444,A,", "7:38: The checksum is missing: * and two hexadecimal digits."],
    ["$GPGLL,4916.45,N,12311.12,W,225444,A,*1E", "7:39: The checksum is 1E, and the characters give 1D."],
    ["$GPGLL,1*G0", "7:10: “G0” is not two hexadecimal digits."],
    ["$GPGLL,1*4", "7:10: “4” is not two hexadecimal digits."],
    ["$*00", "7:2: “” does not name a talker and a sentence."],
    ["$GP\u00b5*00", "7:4: A sentence holds printable ASCII characters only."],
  ])("%s", (text, message) => expect(faultOf(text)).toBe(message));
});

test.each([
  ["GPGSV", ["a,b"]],
  ["GPGSV", ["*"]],
  ["GPGSV", ["é"]],
  ["gpgsv", []],
  ["GPGSV", ["1".repeat(80)]],
])("%s %j is not written", (address, fields) => expect(() => writeSentence(address, fields)).toThrow(RangeError));

describe("a log comes in pieces", () => {
  const log = [
    ...PUBLISHED.map(([body, sum]) => `$${body}*${sum}\r\n`),
    "\r\n",
    "$GPGLL,1*00\n",
    "$PSRF103,00,01,00,01*25",
  ];
  const told = (lines: NmeaLine[]) =>
    lines.map((line) => ("sentence" in line ? `${line.sentence.line} ${line.sentence.type}` : line.fault.message));
  const expected = [
    "1 GGA",
    "2 GLL",
    "3 SRF103",
    "4 RMC",
    "6:10: The checksum is 00, and the characters give 4D.",
    "7 SRF103",
  ];

  test.each([1, 2, 7, 1000])("of %i bytes", (size) => {
    const whole = bytes(log.join(""));
    const reader = nmeaReader();
    const lines: NmeaLine[] = [];
    for (let from = 0; from < whole.length; from += size) lines.push(...reader.push(whole.subarray(from, from + size)));
    expect(told([...lines, ...reader.end()])).toEqual(expected);
  });

  test("a line without end is one fault and is not kept", () => {
    const reader = nmeaReader();
    const piece = new Uint8Array(1_000_000).fill(0x41);
    expect(reader.push(piece)).toEqual([]);
    expect(reader.push(piece)).toEqual([]);
    expect(told(reader.push(bytes("\n$PSRF103,00,01,00,01*25\n")))).toEqual([
      "1:1: A line has at most 256 characters.",
      "2 SRF103",
    ]);
    expect(reader.end()).toEqual([]);
  });

  test("bytes that are no text are faults", () =>
    expect(told(nmeaReader().push(Uint8Array.of(0x24, 0, 255, 10)))[0]).toMatch(/^1:2: .* printable/));
});

describe("satellites in view", () => {
  const SKY: InView[] = Array.from({ length: 11 }, (_, n) => ({
    prn: n + 3,
    elevationDeg: 8 * n,
    azimuthDeg: 33 * n,
    cn0DbHz: n === 5 ? null : 30 + n,
  }));
  const read = (text: string) =>
    text.split("\r\n").flatMap((line, n) => (line ? [readSatellitesInView(readSentence(line, n + 1))] : []));

  // Published sentence of NMEA 0183 with satellites that are not tracked.
  test("a published sentence", () => {
    const [part] = read("$GPGSV,3,1,11,03,03,111,00,04,15,270,00,06,01,010,00,13,06,292,00*74");
    expect(part).toMatchObject({ sentences: 3, number: 1, inView: 11 });
    expect(part.satellites[1]).toEqual({ prn: 4, elevationDeg: 15, azimuthDeg: 270, cn0DbHz: 0 });
  });

  test("are read as they were written, four in a sentence", () => {
    const parts = read(writeSatellitesInView("GP", SKY));
    expect(parts.map(({ number, satellites }) => [number, satellites.length])).toEqual([
      [1, 4],
      [2, 4],
      [3, 3],
    ]);
    expect(parts.flatMap(({ satellites }) => satellites)).toEqual(SKY);
  });

  test("none in view is a sentence as well", () =>
    expect(read(writeSatellitesInView("GP", []))).toEqual([{ sentences: 1, number: 1, inView: 0, satellites: [] }]));

  test("a signal number at the end is passed over", () => {
    const body = "GPGSV,1,1,01,07,45,180,44,1";
    expect(read(`$${body}*${nmeaChecksum(body)}`)[0].satellites).toHaveLength(1);
  });

  test.each([
    ["GPGSV,1,1,01,07,95,180,44", "1:18: Elevation is from 0 to 90, not “95”."],
    ["GPGSV,1,1,01,07,45,361,44", "1:21: Azimuth is from 0 to 360, not “361”."],
    ["GPGSV,1,2,01", "1:10: The number of this sentence is from 1 to 1, not “2”."],
    ["GPGSV,1,1,01,07,45,180,4.4", "1:25: C/N0 is from 0 to 99, not “4.4”."],
  ])("%s", (body, message) => expect(() => read(`$${body}*${nmeaChecksum(body)}`)).toThrow(message));

  test("more than nine sentences are not written", () =>
    expect(() =>
      writeSatellitesInView(
        "GP",
        Array.from({ length: 37 }, () => SKY[0]),
      ),
    ).toThrow(RangeError));
});

describe("time and date", () => {
  const at = Date.UTC(2026, 1, 28, 23, 59, 50);
  test("are read as they were written", () => {
    const text = writeTimeAndDate("GP", at);
    expect(text).toMatch(/^\$GPZDA,235950\.00,28,02,2026,00,00\*/);
    expect(readTimeAndDate(readSentence(text.trim(), 1))).toBe(at);
  });
  test.each(["GPZDA,235950,31,02,2026,00,00", "GPZDA,246000,01,02,2026,00,00", "GPZDA,,,,,,", "GPZDA,1e5,01,02,2026"])(
    "%s is no time",
    (body) => expect(() => readTimeAndDate(readSentence(`$${body}*${nmeaChecksum(body)}`, 4))).toThrow(/^4:8: /),
  );
});

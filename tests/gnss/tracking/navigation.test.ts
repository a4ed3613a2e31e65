import { describe, expect, test } from "vitest";
import { seededRandom } from "@/lib/numeric/random";
import {
  decodeSubframe,
  decodeWord,
  encodeWord,
  preambleAt,
  type BitsBefore,
} from "@/lib/gnss/tracking/navigationWords";
import { bitsOfPrompts, readNavigation, wholeWeek } from "@/lib/gnss/tracking/readNavigation";
import { sentBits, GPS_SUBFRAMES } from "@/tests/reference/gps-subframes";

const random = seededRandom("3".repeat(64), "navigation");
const randomBits = (count: number) => Array.from({ length: count }, () => random.integer(0, 1));

describe("subframes that satellites sent", () => {
  test.each(GPS_SUBFRAMES)("subframe $subframe before $handOverS s", ({ hex, handOverS, subframe, week }) => {
    const bits = sentBits(hex);
    expect(decodeSubframe(bits).every((word) => word !== null)).toBe(true);
    const [time] = readNavigation(bits);
    expect(time).toEqual({ firstBit: 0, subframe, timeOfWeekS: handOverS - 6, week, goodWords: 10 });
  });

  test("are found inside other bits, upright or turned over", () => {
    const stream = [...randomBits(77), ...sentBits(GPS_SUBFRAMES[0].hex), ...sentBits(GPS_SUBFRAMES[1].hex), 1, 0];
    const upright = readNavigation(stream).filter(({ goodWords }) => goodWords === 10);
    expect(upright.map(({ firstBit, timeOfWeekS }) => [firstBit, timeOfWeekS])).toEqual([
      [77, 5010],
      [377, 10116],
    ]);
    expect(readNavigation(stream.map((bit) => 1 - bit)).filter(({ goodWords }) => goodWords === 10)).toEqual(upright);
  });

  test("keep their good words when one is damaged", () => {
    const bits = sentBits(GPS_SUBFRAMES[0].hex);
    bits[65] ^= 1; // in the third word, where the week stands
    const [time] = readNavigation(bits);
    expect(time).toMatchObject({ subframe: 1, timeOfWeekS: 5010, week: null, goodWords: 9 });
    bits[40] ^= 1; // in the hand-over word
    expect(readNavigation(bits)).toEqual([]);
  });
});

describe("parity", () => {
  const states: BitsBefore[] = [
    [0, 0],
    [0, 1],
    [1, 0],
    [1, 1],
  ];

  test.each(states)("a word sent after bits %s and %s comes back", (d29, d30) => {
    const data = randomBits(24);
    expect(decodeWord(encodeWord(data, [d29, d30]), [d29, d30])).toEqual(data);
  });

  // IS-GPS-200, 20.3.5.1: an extended Hamming code (32, 26), so that one, two and three wrong bits are always seen.
  test("one, two or three wrong bits never pass", () => {
    const word = encodeWord(randomBits(24), [0, 0]);
    let passed = 0;
    for (let a = 0; a < 30; a++)
      for (let b = a; b < 30; b++)
        for (let c = b; c < 30; c++) {
          const damaged = [...word];
          for (const at of new Set([a, b, c])) damaged[at] ^= 1;
          if (decodeWord(damaged, [0, 0])) passed += 1;
        }
    expect(passed).toBe(0);
  });

  test("one word in 64 of chance passes", () => {
    let passed = 0;
    for (let n = 0; n < 6400; n++) if (decodeWord(randomBits(30), [0, 0])) passed += 1;
    expect(Math.abs(passed - 100)).toBeLessThan(40); // four standard deviations
  });
});

test("the preamble is seen in both senses and nowhere else", () => {
  // 1000 1011: IS-GPS-200, 20.3.3.1
  expect(preambleAt([1, 0, 0, 0, 1, 0, 1, 1], 0)).toBe(0);
  expect(preambleAt([0, 1, 1, 1, 0, 1, 0, 0], 0)).toBe(1);
  expect(preambleAt([1, 0, 0, 0, 1, 0, 1, 0], 0)).toBeNull();
  expect(decodeSubframe(new Uint8Array(300))).toEqual(Array.from({ length: 10 }, () => null));
  expect(() => decodeSubframe([1, 0])).toThrow(RangeError);
});

// The ten bits began again on 22 August 1999 (week 1024) and 7 April 2019 (week 2048): GPS notices, weeks from memory.
test("ten bits of a week are completed by a week that has surely begun", () => {
  expect(wholeWeek(0, 1023)).toBe(1024);
  expect(wholeWeek(0, 1500)).toBe(2048);
  expect(wholeWeek(194, 2048)).toBe(2242);
  expect(wholeWeek(500, 2548)).toBe(2548);
  expect(wholeWeek(499, 2548)).toBe(3571);
});

test("bits follow the sign of the sum over each of them", () => {
  const prompts = Float64Array.from({ length: 2 * 47 }, (_, n) => (n % 2 ? 0 : n / 2 < 7 ? -1 : n / 2 < 27 ? 1 : -1));
  expect([...bitsOfPrompts(prompts, 7)]).toEqual([0, 1]);
});

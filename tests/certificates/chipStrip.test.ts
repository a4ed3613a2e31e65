import { describe, expect, test } from "vitest";
import { chipBand, chipsOf, chipStrip } from "@/lib/certificates/chipStrip";
import { expectNear } from "../support/expectNear";

// SHA-256 of "abc", FIPS 180-4 example.
const ABC = "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad";

test("a fingerprint is 256 chips, most significant bit first", () => {
  const bits = chipsOf(ABC).map((chip) => chip.bit);
  expect(bits).toHaveLength(256);
  // BA 78 in binary.
  expect(bits.slice(0, 16).join("")).toBe("1011101001111000");
  expect(BigInt(`0b${bits.join("")}`).toString(16)).toBe(ABC);
  expect(chipsOf(ABC.toUpperCase())).toEqual(chipsOf(ABC));
});

test.each(["", "ba78", `${ABC}00`, `g${ABC.slice(1)}`])("refuses %j as a fingerprint", (text) =>
  expect(() => chipsOf(text)).toThrow(RangeError),
);

describe("the strip", () => {
  const strip = chipStrip(ABC);

  test("is two lanes of four groups of eight, named by two hexadecimal figures each", () => {
    expect(strip.lanes.map((lane) => lane.groups.map((group) => group.hex))).toEqual([
      ["BA", "78", "16", "BF"],
      ["8F", "01", "CF", "EA"],
    ]);
    expect(strip.lanes.map((lane) => lane.number)).toEqual([1, 2]);
    for (const { groups } of strip.lanes) for (const { chips } of groups) expect(chips).toHaveLength(8);
  });

  test("stands 0 above the line and 1 below it", () => {
    for (const { groups } of strip.lanes) {
      for (const chip of groups.flatMap((group) => group.chips)) {
        expect(chip.bit === 0 ? chip.y + chip.height : chip.y).toBe(strip.line);
        expect(chip.height).toBe(strip.line);
      }
    }
  });

  test("has the places of the design drawing 480 px wide, whose u is 13.2 px after 18 px for the lane number", () => {
    const at = (group: number, chip: number) => 18 + 13.2 * strip.lanes[0].groups[group].chips[chip].x;
    expectNear(at(0, 0), 18.92, 0.01, "first chip, px");
    expectNear(at(0, 7), 111.32, 0.01, "eighth chip, px");
    expectNear(at(1, 0), 137.72, 0.01, "first chip of the second group, px");
    expectNear(at(3, 0), 375.32, 0.01, "first chip of the fourth group, px");
    expectNear(13.2 * strip.lanes[0].groups[0].chips[0].width, 11.35, 0.01, "width of a chip, px");
    expectNear(13.2 * strip.lanes[0].groups[1].centre + 18, 189.6, 0.01, "centre of the second group, px");
    expectNear(13.2 * strip.width + 18, 480, 1e-9, "width of the strip, px");
    expectNear(13.2 * strip.laneHeight, 35.64, 1e-9, "height of a lane, px");
  });

  test("takes another inset where a chip is so wide that the air would exceed a pixel", () => {
    const [first] = chipStrip(ABC, 0.05).lanes[0].groups[0].chips;
    expectNear(first.x, 0.05, 1e-12, "inset, u");
    expectNear(first.width, 0.9, 1e-12, "width, u");
  });
});

test("the band is all 256 chips side by side", () => {
  const band = chipBand(ABC);
  expect(band.chips.map((chip) => chip.bit)).toEqual(chipsOf(ABC).map((chip) => chip.bit));
  band.chips.forEach((chip, index) => expectNear(chip.x, index + 0.07, 1e-9, `chip ${index}, u`));
  expect(band.chips.every((chip) => (chip.bit === 0 ? chip.y === 0 : chip.y === band.line))).toBe(true);
});

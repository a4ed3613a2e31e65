// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { ChipStrip, stripLanes } from "@/components/ui/ChipStrip";
import { expectNear } from "../../support/expectNear";

afterEach(cleanup);

// SHA-256 of "abc": FIPS 180-4, example of the Secure Hash Standard.
const ABC = "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad";

test("the first 64 bits, most significant first, in two lanes of 32", () => {
  const [first, second] = stripLanes(ABC);
  expect(first.join("")).toBe("10111010" + "01111000" + "00010110" + "10111111"); // ba 78 16 bf
  expect(second.join("")).toBe("10001111" + "00000001" + "11001111" + "11101010"); // 8f 01 cf ea
});

test("only a whole fingerprint is drawn", () => {
  expect(() => stripLanes(ABC.slice(0, 16))).toThrow(RangeError);
  expect(() => stripLanes(`${ABC.slice(1)}g`)).toThrow(RangeError);
});

test("bit 0 stands above the line, bit 1 hangs below it", () => {
  const { container } = render(<ChipStrip fingerprint={ABC} width={480} />);
  const chips = [...container.querySelector("svg")!.querySelectorAll("[data-bit]")];
  const bits = stripLanes(ABC).flat();
  expect(chips.map((chip) => Number(chip.getAttribute("data-bit")))).toEqual(bits);
  const tops = chips.slice(0, 32).map((chip) => Number(chip.getAttribute("y")));
  tops.forEach((top, at) => expectNear(top, bits[at] ? 18.57 : 0, 1e-9, `top of chip ${at}`));
});

test("the geometry is that of the drawing of 480 px", () => {
  const { container } = render(<ChipStrip fingerprint={ABC} width={480} />);
  const chips = [...container.querySelector("svg")!.querySelectorAll("[data-bit]")];
  const x = (at: number) => Number(chips[at].getAttribute("x"));
  // Left edges of chips 0, 8, 24 and 31 in the drawing, rounded there to hundredths.
  [18.92, 137.72, 375.32, 467.72].forEach((left, order) =>
    expectNear(x([0, 8, 24, 31][order]), left, 0.005, "left edge"),
  );
  expectNear(Number(chips[0].getAttribute("width")), 11.35, 0.005, "width of a chip");
  expectNear(Number(chips[0].getAttribute("height")), 17.07, 0.005, "height of a chip");
  expectNear(Number(container.querySelector("svg")!.getAttribute("height")), 113.9, 0.05, "height of the strip");
});

test("its name is the 16 figures, and they can be read beneath the groups", () => {
  render(<ChipStrip fingerprint={ABC.toUpperCase()} width={228} />);
  expect(screen.getByRole("img").getAttribute("aria-label")).toBe("Chip strip ba7816bf8f01cfea");
  for (const group of ["BA", "78", "16", "BF", "8F", "01", "CF", "EA"]) expect(screen.getByText(group)).toBeTruthy();
});

test("on a phone a wide strip is drawn anew with figures of the same size", () => {
  const { container } = render(<ChipStrip fingerprint={ABC} width={480} />);
  const [wide, narrow] = [...container.querySelectorAll("svg")];
  expect([wide.getAttribute("width"), narrow.getAttribute("width")]).toEqual(["480", "286"]);
  expect(narrow.querySelectorAll("[data-bit]")).toHaveLength(64);
  expect(narrow.querySelector("text")!.getAttribute("font-size")).toBe("12");
});

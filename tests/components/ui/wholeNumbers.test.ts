import { expect, test } from "vitest";
import { wholeNumbers } from "@/components/ui/wholeNumbers";
import { parseQuantity } from "@/lib/checks/parseQuantity";

const THIN = "\u2009";

test("a line cannot break inside a grouped number", () =>
  expect(wholeNumbers(`0 to 1${THIN}575${THIN}420 Hz`)).toBe(`0 to 1${THIN}\u2060575${THIN}\u2060420 Hz`));

test("a thin space elsewhere stays as it is", () => expect(wholeNumbers(`±${THIN}3 dB`)).toBe(`±${THIN}3 dB`));

test("a number copied from such a text can be handed in", () =>
  expect(parseQuantity(wholeNumbers(`1${THIN}022.5 chip`), "chip")).toMatchObject({ value: 1022.5 }));

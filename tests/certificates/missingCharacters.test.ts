import { expect, test } from "vitest";
import { missingCharacters } from "@/lib/certificates/missingCharacters";

test.each([
  "Łukasz Żółć-Δimitrov",
  "Ђорђе Ўладзімір Їжак",
  "Nguyễn Thị Ánh, Őri Şahin, Ħal Ġorġ, Þóra Ægis",
  "±0.50 chip, −1\u2009750 Hz, 12 µs, ≤ 3 τ → C/N\u2080",
  "דוד محمد",
])("every character of %j can be drawn", async (text) => expect(await missingCharacters(text)).toEqual([]));

test("names what no face has, each once", async () => {
  expect(await missingCharacters("山 Daud 山田 \u{1f4e1}")).toEqual(["山", "田", "\u{1f4e1}"]);
});

test("looks at the composed form that is drawn", async () => {
  expect(await missingCharacters("Z\u0307o\u0301")).toEqual([]);
});

// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { Glyph } from "@/components/ui/Glyph";
import { StatusHead, type Standing } from "@/components/ui/StatusHead";

afterEach(cleanup);

test.each([
  ["valid", "Valid"],
  ["not-yet-valid", "Not yet valid"],
  ["suspended", "Suspended"],
  ["withdrawn", "Withdrawn"],
  ["expired", "Expired"],
  ["superseded", "Superseded"],
  ["cannot-be-told", "Cannot be told"],
] as [Standing, string][])("%s is the page's heading, in words", (standing, word) => {
  render(<StatusHead standing={standing} />);
  expect(screen.getByRole("heading", { level: 1, name: word })).toBeTruthy();
});

// Upper edge of the line and base line of the word in the drawings, in units of a word 104 high.
test.each([
  ["valid", 84.24, 79],
  ["suspended", 84.24, 79],
  ["withdrawn", 39, 133.8],
  ["expired", 0, 94.8],
] as [Standing, number, number][])("%s: line and word stand as drawn", (standing, line, base) => {
  const { container } = render(<StatusHead standing={standing} />);
  expect(container.querySelector<HTMLElement>(".status-rule")!.style.top).toBe(`${line / 104}em`);
  expect(container.querySelector("svg text")!.getAttribute("y")).toBe(String(base));
});

test("the words that hold stand above the line, those that do not hang below it", () => {
  const below = (standing: Standing) => {
    const { container } = render(<StatusHead standing={standing} />);
    const line = parseFloat(container.querySelector<HTMLElement>(".status-rule")!.style.top) * 104;
    return Number(container.querySelector("svg text")!.getAttribute("y")) > line + 9;
  };
  expect((["withdrawn", "expired", "superseded"] as const).map(below)).toEqual([true, true, true]);
  expect((["valid", "not-yet-valid", "suspended", "cannot-be-told"] as const).map(below)).toEqual([
    false,
    false,
    false,
    false,
  ]);
});

test("a glyph is silent beside its word, and named where the word is elsewhere", () => {
  const { container } = render(<Glyph name="within" />);
  expect(container.querySelector("svg")!.getAttribute("aria-hidden")).toBe("true");
  render(<Glyph name="outside" label="Outside tolerance" />);
  expect(screen.getByRole("img", { name: "Outside tolerance" })).toBeTruthy();
});

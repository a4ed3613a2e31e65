import { beforeAll, describe, expect, test } from "vitest";
import { InvalidError } from "@/lib/errors";
import { fitName } from "@/lib/certificates/fitName";
import { loadPdfFonts } from "@/lib/certificates/pdfFonts";
import { textWidth } from "@/lib/certificates/textWidth";
import { expectNear } from "../support/expectNear";

const WIDTH_PT = 498.9; // 176 mm
beforeAll(loadPdfFonts, 30_000);

describe("the holder's name", () => {
  test("stands at 44 pt on one line when it is short", () => {
    expect(fitName("Daud Fenwick", WIDTH_PT, 44)).toEqual({ sizePt: 44, lines: ["Daud Fenwick"] });
  });

  test.each([
    "Maximiliane Hoogstraten-Fenwick",
    "Łukasz Żółć-Δimitrov van der Hoogstraten-Öğünç",
    "Ana ".repeat(25).trim(),
  ])("%j is as large as the width allows and no larger", (name) => {
    const { sizePt, lines } = fitName(name, WIDTH_PT, 44);
    expect(lines.join(" ")).toBe(name);
    expect(lines.length).toBeLessThanOrEqual(2);
    const widest = Math.max(...lines.map((line) => textWidth(line, 700, sizePt)));
    expect(widest).toBeLessThanOrEqual(WIDTH_PT);
    // Sizes go in half points; two lines stop growing at 0.61 of 44 pt.
    if (sizePt < 26) expect((widest * (sizePt + 0.5)) / sizePt).toBeGreaterThan(WIDTH_PT);
    expect(sizePt).toBeGreaterThanOrEqual(8);
  });

  test("takes no more than the page gives it", () => {
    expect(fitName("Daud Fenwick", WIDTH_PT, 28).sizePt).toBe(28);
  });

  test("breaks where the two lines come out most alike", () => {
    const { lines } = fitName("Anna Maria Magdalena Theodora Wilhelmina Bergenstrom-Hollander", WIDTH_PT, 44);
    expect(lines).toEqual(["Anna Maria Magdalena Theodora", "Wilhelmina Bergenstrom-Hollander"]);
  });

  test("is refused when a single word cannot be set legibly", () => {
    expect(() => fitName("W".repeat(120), WIDTH_PT, 44)).toThrow(InvalidError);
  });
});

test("width is proportional to size and adds up over faces", () => {
  expectNear(textWidth("Daud", 700, 44), 2 * textWidth("Daud", 700, 22), 1e-9, "width, pt");
  expectNear(
    textWidth("Łπ", 700, 10),
    textWidth("Ł", 700, 10) + textWidth("π", 700, 10),
    1e-9,
    "width over two faces, pt",
  );
});

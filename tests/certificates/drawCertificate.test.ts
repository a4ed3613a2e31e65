import { create } from "qrcode";
import { afterAll, beforeAll, describe, expect, test, vi } from "vitest";
import { canonicalJson, fingerprintOf } from "@/lib/certificates/canonicalJson";
import { chipsOf } from "@/lib/certificates/chipStrip";
import { drawCertificate } from "@/lib/certificates/drawCertificate";
import { certificateRecord } from "@/lib/certificates/record";
import { InvalidError } from "@/lib/errors";
import { certificateFacts } from "./certificateFacts";
import { drawn, verifyAddress } from "./issued";
import { longFacts, SCOPE_OF_400_CHARACTERS } from "./longFacts";
import { PdfTools } from "./pdfTools";

vi.setConfig({ testTimeout: 60_000, hookTimeout: 60_000 });

const MM = 72 / 25.4;
const LEFT_PT = 17 * MM;
const RIGHT_PT = (210 - 17) * MM;

const tools = new PdfTools();
let plain: Awaited<ReturnType<typeof drawn>> & { file: string };
let long: typeof plain;
beforeAll(async () => {
  const [a, b] = [await drawn(), await drawn(longFacts())];
  plain = { ...a, file: tools.file("plain.pdf", a.pdf) };
  long = { ...b, file: tools.file("long.pdf", b.pdf) };
});
afterAll(() => tools.remove());

/** Text with its line breaks made spaces: where a line breaks is the layout's business. */
const flowing = (file: string) => tools.text(file).replace(/\s+/g, " ");

describe("what the page says", () => {
  test("everything that a certificate is", () => {
    const text = flowing(plain.file);
    for (const said of [
      "Certificate of competence",
      "LM-7K4Q0-2M9XB-0",
      "Daud Fenwick",
      "Prove which satellites you really have",
      "Scheme SBW-R2, written to ISO/IEC 17024:2012",
      "14 March 2026",
      "13 March 2029",
      "Days in Europe/London",
      "Saltmarsh Beacon Works",
      "Employer attestation",
      "SBW-R2, 3.1",
      "Code-tracking receivers on machines and stations, GPS L1 C/A",
      "Receive only. Not for safety-of-life use.",
      "Open book, not supervised",
      "Not confirmed by a person",
      "Orla Quist, outside the candidate's line",
      "14 March 2026, 10:22:51 UTC",
      "14 March 2026, 10:22:04 UTC",
      "lagmark.example/verify",
      ...plain.record.cautions,
    ]) {
      expect(text).toContain(said);
    }
  });

  test("every quantity with its tolerance, and which are critical", () => {
    const lines = tools.text(plain.file, "-layout").replace(/ +/g, " ");
    for (const { label, tolerance, critical } of plain.record.quantities) {
      const printed = label.replace("C/N0", "C/N\u2080");
      expect(lines).toContain(`${printed}${critical ? ", critical" : ""} ${tolerance}`);
    }
  });

  test("never that it is valid, and nothing of results", () => {
    for (const { file } of [plain, long]) {
      const text = flowing(file).replace("Page 1 of 1", "");
      expect(text).not.toMatch(/\bvalid|\b(within|outside) tolerance|\d+ of \d+/i);
    }
  });

  test("who confirmed the identity, and how the checks were supervised", () => {
    const text = flowing(long.file);
    expect(text).toContain("Confirmed by the assessor, 3 March 2026");
    expect(text).toContain("Supervised on site");
  });

  test("Demonstration, plainly, when it is one and only then", () => {
    expect(flowing(long.file)).toContain("Demonstration");
    expect(tools.info(long.file)).toMatch(/^Title: +Demonstration: /m);
    expect(flowing(plain.file)).not.toContain("Demonstration");
  });

  test("a name in letters of three scripts, whole, on paper and in the title", () => {
    expect(flowing(long.file)).toContain("Łukasz Maximilian Żółć-Δimitrov van der Hoogstraten-Öğünç");
    expect(tools.info(long.file)).toContain("Łukasz Maximilian Żółć-Δimitrov");
  });

  test("all 64 figures of the fingerprint and the sixteen of the strip", () => {
    const figures = plain.fingerprint.toUpperCase();
    const text = flowing(plain.file);
    expect(text).toContain(figures.match(/.{8}/g)?.join(" "));
    expect(text.replaceAll(" ", "")).toContain(figures.slice(0, 8));
  });
});

describe("the page", () => {
  test("is one, A4, even with a scope of 400 characters and fourteen quantities", () => {
    expect(SCOPE_OF_400_CHARACTERS).toHaveLength(400);
    for (const { file } of [plain, long]) {
      expect(tools.info(file)).toMatch(/^Pages: +1$/m);
      expect(tools.info(file)).toMatch(/^Page size: .*A4/m);
    }
    expect(flowing(long.file)).toContain(SCOPE_OF_400_CHARACTERS);
  });

  test.each(["plain", "long"])("keeps every word of the %s one inside the margins and clear of the others", (which) => {
    const words = wordsOf(tools.text(which === "plain" ? plain.file : long.file, "-bbox"));
    expect(words.length).toBeGreaterThan(150);
    for (const word of words) {
      expect(word.xMin, word.text).toBeGreaterThanOrEqual(LEFT_PT - 1);
      expect(word.xMax, word.text).toBeLessThanOrEqual(RIGHT_PT + 1);
      expect(word.yMax, word.text).toBeLessThanOrEqual((297 - 8) * MM);
    }
    const touching = words.flatMap((a, index) =>
      words
        .slice(index + 1)
        .filter((b) => overlap(a, b) > 0.25)
        .map((b) => [a.text, b.text]),
    );
    expect(touching).toEqual([]);
  });

  test("embeds every face, so that no reader puts in another", () => {
    const rows = tools.fonts(long.file).trim().split("\n").slice(2);
    expect(rows.length).toBeGreaterThanOrEqual(5);
    // Columns emb, sub, uni.
    for (const row of rows) expect(row).toMatch(/ yes yes yes /);
    expect(rows.join("\n")).not.toMatch(/Helvetica|Times|Courier/);
  });

  test("shows the fingerprint's chips on strip and band, and the address in the code", () => {
    const page = tools.raster(plain.file, 288);
    const code = create(verifyAddress(plain.record.number), { errorCorrectionLevel: "M" }).modules;
    const pitch = (36 * MM) / code.size;
    const codeLeft = RIGHT_PT - 36 * MM;
    const isInk = (x: number, y: number) => page.at(x, y).every((part) => part < 60);
    const top = firstFrom(200, 750, (y) =>
      [0.1, 1, 3, 5, 6.9].every((row) => isInk(codeLeft + pitch / 2, y + row * pitch)),
    );
    for (let row = 0; row < code.size; row += 1) {
      for (let column = 0; column < code.size; column += 1) {
        const dark = isInk(codeLeft + (column + 0.5) * pitch, top + (row + 0.5) * pitch);
        expect(dark, `module ${row}, ${column}`).toBe(code.data[row * code.size + column] === 1);
      }
    }

    const readBit = (x: number, line: number, away: number) => {
      const above = isInked(page.at(x, line - away), "blue");
      const below = isInked(page.at(x, line + away), "red");
      expect(above !== below, `one chip at ${x}, ${line}`).toBe(true);
      return below ? 1 : 0;
    };
    const bits = chipsOf(plain.fingerprint).map((chip) => chip.bit);

    const u = (131 * MM - 14) / 35;
    const laneXs = Array.from({ length: 32 }, (_, chip) => LEFT_PT + 14 + (chip + Math.floor(chip / 8) + 0.5) * u);
    const lane1 = firstFrom(top, 750, (y) => laneXs.every((x) => isInk(x, y)));
    const lane2 = firstFrom(lane1 + 20, 750, (y) => laneXs.every((x) => isInk(x, y)));
    const strip = [lane1, lane2].flatMap((line) => laneXs.map((x) => readBit(x, line + 0.5, 0.7 * u)));
    expect(strip).toEqual(bits.slice(0, 64));

    const chip = (176 * MM) / 256;
    const bandXs = bits.map((_, index) => LEFT_PT + (index + 0.5) * chip);
    const band = firstFrom(788, 835, (y) => bandXs.every((x) => isInk(x, y)));
    expect(bandXs.map((x) => readBit(x, band + 0.35, 1.4 * chip))).toEqual(bits);
  });
});

describe("the file", () => {
  test("has language, title and no damage that a strict reader finds", () => {
    expect(tools.check(plain.file)).toMatchObject({ status: 0 });
    expect(Buffer.from(plain.pdf).toString("latin1")).toMatch(/\/Lang \(en\)/);
    expect(Buffer.from(plain.pdf).toString("latin1")).toMatch(/\/DisplayDocTitle true/);
    expect(tools.info(plain.file)).toMatch(/^Title: +Certificate of competence LM-7K4Q0-2M9XB-0, Daud Fenwick$/m);
    expect(tools.info(plain.file)).toMatch(/^PDF version: +1.7$/m);
  });

  test("names number and fingerprint in its description", () => {
    expect(tools.info(plain.file)).toContain(`certificate LM-7K4Q0-2M9XB-0 sha256 ${plain.fingerprint}`);
  });

  test("holds the canonical record, whose SHA-256 is the fingerprint", () => {
    const attached = tools.attachment(plain.file, "record.json").toString("utf8");
    expect(attached).toBe(canonicalJson(plain.record));
    expect(fingerprintOf(JSON.parse(attached))).toBe(plain.fingerprint);
  });

  test("takes the credential along when there is one", async () => {
    const { record, fingerprint } = plain;
    const options = {
      fingerprint,
      verifyAddress: verifyAddress(record.number),
      demonstration: false,
      credential: "aaa.bbb.ccc",
    };
    const file = tools.file("credential.pdf", await drawCertificate(record, options));
    expect(tools.attachment(file, "credential.jwt").toString()).toBe("aaa.bbb.ccc");
    expect(tools.check(file)).toMatchObject({ status: 0 });
  });

  test("is the same, byte for byte, for the same record", async () => {
    expect(Buffer.from((await drawn()).pdf).equals(plain.pdf)).toBe(true);
  });
});

describe("refuses", () => {
  test("a character that no face has, and names it", async () => {
    const refusal = drawn({ holder: { name: "Daud 山田" } });
    await expect(refusal).rejects.toThrow(InvalidError);
    await expect(refusal).rejects.toMatchObject({
      publicMessage: expect.stringMatching(/"山" \(U\+5C71\), "田" \(U\+7530\)/),
    });
  });

  test("more than fits one page", async () => {
    const [quantity] = certificateFacts().quantities;
    const quantities = Array.from({ length: 70 }, (_, index) => ({ ...quantity, check: `check ${index}` }));
    await expect(drawn({ quantities })).rejects.toThrow(InvalidError);
  });

  test.each([
    ["another fingerprint", { fingerprint: "0".repeat(64) }],
    ["an address of another number", { verifyAddress: verifyAddress("LM-00000-00000-1") }],
    ["a demonstration that is none", { demonstration: true }],
  ])("%s", async (_what, wrong) => {
    const record = certificateRecord(certificateFacts());
    const options = {
      fingerprint: fingerprintOf(record),
      verifyAddress: verifyAddress(record.number),
      demonstration: false,
    };
    await expect(drawCertificate(record, { ...options, ...wrong })).rejects.toThrow(RangeError);
  });
});

type Word = { text: string; xMin: number; yMin: number; xMax: number; yMax: number };

const wordsOf = (boxes: string): Word[] =>
  [...boxes.matchAll(/<word xMin="(\S+)" yMin="(\S+)" xMax="(\S+)" yMax="(\S+)">([^<]*)</g)].map(
    ([, a, b, c, d, text]) => ({
      text,
      xMin: Number(a),
      yMin: Number(b),
      xMax: Number(c),
      yMax: Number(d),
    }),
  );

/** Share of the smaller box that the other covers. */
function overlap(a: Word, b: Word): number {
  const width = Math.min(a.xMax, b.xMax) - Math.max(a.xMin, b.xMin);
  const height = Math.min(a.yMax, b.yMax) - Math.max(a.yMin, b.yMin);
  const area = (word: Word) => (word.xMax - word.xMin) * (word.yMax - word.yMin);
  return width <= 0 || height <= 0 ? 0 : (width * height) / Math.min(area(a), area(b));
}

function firstFrom(from: number, to: number, holds: (y: number) => boolean): number {
  for (let y = from; y < to; y += 0.25) if (holds(y)) return y;
  throw new Error(`nothing between ${from} and ${to} pt`);
}

const isInked = ([red, , blue]: [number, number, number], colour: "blue" | "red") =>
  colour === "blue" ? blue - red > 60 : red - blue > 60;

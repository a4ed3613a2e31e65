import { createHash } from "node:crypto";
import { describe, expect, test } from "vitest";
import { checkCharacter } from "@/lib/certificates/checkCharacter";
import { drawCertificateNumber, readCertificateNumber } from "@/lib/certificates/number";

const NUMBER = "LM-7K4Q0-2M9XB-0";
const ALPHABET = "0123456789ABCDEFGHJKMNPQRSTVWXYZ";

/** Bytes that look random and are the same each time. */
function bytesFrom(seed: string) {
  let count = 0;
  return (length: number) =>
    new Uint8Array(createHash("sha256").update(`${seed} ${count++}`).digest().subarray(0, length));
}

describe("drawing", () => {
  test("gives the written form, and every number drawn can be read", () => {
    const random = bytesFrom("numbers");
    for (let index = 0; index < 500; index += 1) {
      const number = drawCertificateNumber(random);
      expect(number).toMatch(/^LM-[0-9A-HJKMNP-TV-Z]{5}-[0-9A-HJKMNP-TV-Z]{5}-[0-9A-HJKMNP-TV-Z]$/);
      expect(readCertificateNumber(number)).toEqual({ number });
    }
  });

  test.each(["I", "L", "O", "U"])("draws again when the check character would be %s", (letter) => {
    const first = bodyCheckedBy(letter);
    const random = bytesFrom("again");
    let draws = 0;
    const number = drawCertificateNumber((length) => (draws++ === 0 ? bodyBytes(first) : random(length)));
    expect(draws).toBeGreaterThan(1);
    expect(number.replace(/^LM-|-/g, "").slice(0, 10)).not.toBe(first);
  });

  test("stops when the generator only repeats such a body", () => {
    const body = bodyBytes(bodyCheckedBy("U"));
    expect(() => drawCertificateNumber(() => body)).toThrow(/repeats itself/);
  });

  test("uses each of the 32 characters", () => {
    const random = bytesFrom("characters");
    const seen = new Set(
      Array.from({ length: 200 }, () => drawCertificateNumber(random).replace(/^LM-|-/g, "")).join(""),
    );
    expect([...seen].sort().join("")).toBe([...ALPHABET].sort().join(""));
  });
});

describe("reading", () => {
  test.each([
    ["as written", NUMBER],
    ["in small letters", "lm-7k4q0-2m9xb-0"],
    ["without dashes", "LM7K4Q02M9XB0"],
    ["with spaces for dashes", " LM 7K4Q0 2M9XB 0 "],
    ["with no-break hyphens and a long dash", "LM\u20117K4Q0\u20132M9XB\u20140"],
    ["with a minus sign", "LM\u22127K4Q0\u22122M9XB\u22120"],
    ["with a soft hyphen and a no-break space", "LM-7K4\u00adQ0\u00a02M9XB-0"],
    ["with letter O for zero", "LM-7K4QO-2M9XB-o"],
    ["without the prefix", "7K4Q0-2M9XB-0"],
    ["in full-width characters", "ＬＭ－７Ｋ４Ｑ０－２Ｍ９ＸＢ－０"],
  ])("takes a number %s", (_how, typed) => expect(readCertificateNumber(typed)).toEqual({ number: NUMBER }));

  test("takes I and L for 1", () => {
    const number = drawCertificateNumber(() => bodyBytes("1111100011"));
    for (const letter of ["I", "l", "L", "i"]) {
      expect(readCertificateNumber(number.slice(0, 3) + number.slice(3).replaceAll("1", letter))).toEqual({ number });
    }
  });

  test.each([
    "",
    "LM",
    "LM-7K4Q0-2M9XB",
    "LM-7K4Q0-2M9XB-00",
    "LM-7U4Q0-2M9XB-0",
    "XM-7K4Q0-2M9XB-0",
    "7K4Q0*2M9XB0",
    "9".repeat(65),
  ])("says that %j has not the form of a number", (typed) =>
    expect(readCertificateNumber(typed)).toEqual({ problem: "form" }),
  );

  test("finds every single wrong character", () => {
    const body = NUMBER.replace(/^LM|-/g, "");
    for (let place = 0; place < body.length; place += 1) {
      for (const wrong of ALPHABET) {
        if (wrong === body[place]) continue;
        const typed = body.slice(0, place) + wrong + body.slice(place + 1);
        expect(readCertificateNumber(typed), typed).toEqual({ problem: "check-character" });
      }
    }
  });

  test("finds every swap of two neighbours", () => {
    const body = NUMBER.replace(/^LM|-/g, "");
    for (let place = 0; place + 1 < body.length; place += 1) {
      const typed = body.slice(0, place) + body[place + 1] + body[place] + body.slice(place + 2);
      if (typed !== body) expect(readCertificateNumber(typed), typed).toEqual({ problem: "check-character" });
    }
  });
});

/** Ten characters of the alphabet whose check character is one that a number may not hold. */
function bodyCheckedBy(letter: string): string {
  for (const last of ALPHABET) {
    for (const before of ALPHABET) {
      const body = `7K4Q02M9${before}${last}`;
      if (checkCharacter(body) === letter) return body;
    }
  }
  throw new Error(`no body checks to ${letter}`);
}

const bodyBytes = (body: string) => Uint8Array.from(body, (character) => ALPHABET.indexOf(character));

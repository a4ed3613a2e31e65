import { describe, expect, test } from "vitest";
import { checkCharacter } from "@/lib/certificates/checkCharacter";

describe("ISO/IEC 7064 MOD 37,36", () => {
  test.each([
    // Global Release Identifier Standard, example A1-2425G-ABC1234002-M.
    ["A12425GABC1234002", "M"],
    // International Standard Audiovisual Number (ISO 15706-2), user's example 0000-0000-D07A-0090-Q-0000-0000-X.
    ["00000000D07A0090", "Q"],
    ["00000000D07A009000000000", "X"],
    // Another published ISAN: 0000-0001-8CFA-0000-I-0000-0000-K.
    ["000000018CFA0000", "I"],
    ["000000018CFA000000000000", "K"],
  ])("%s has the published check character %s", (text, check) => expect(checkCharacter(text)).toBe(check));

  test("a text with its check character sums to one, the standard's own rule for checking", () => {
    const values = "0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ";
    for (const text of ["7K4Q02M9XB", "0", "Z", "ZZZZZZZZZZ"]) {
      let sum = 36;
      for (const character of text) sum = (((sum + values.indexOf(character)) % 36 || 36) * 2) % 37;
      expect((sum + values.indexOf(checkCharacter(text))) % 36, text).toBe(1);
    }
  });

  test.each(["", "a", "7K4Q-2M9X", "Ä"])("refuses %j", (text) =>
    expect(() => checkCharacter(text)).toThrow(RangeError),
  );
});

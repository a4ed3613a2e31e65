import { describe, expect, test } from "vitest";
import { canonicalJson, fingerprintOf } from "@/lib/certificates/canonicalJson";

describe("RFC 8785", () => {
  // Appendix B, number serialization samples: IEEE 754 bits and the JSON they give.
  test.each([
    ["0000000000000000", "0"],
    ["8000000000000000", "0"],
    ["0000000000000001", "5e-324"],
    ["8000000000000001", "-5e-324"],
    ["7fefffffffffffff", "1.7976931348623157e+308"],
    ["ffefffffffffffff", "-1.7976931348623157e+308"],
    ["4340000000000000", "9007199254740992"],
    ["c340000000000000", "-9007199254740992"],
    ["4430000000000000", "295147905179352830000"],
    ["44b52d02c7e14af5", "9.999999999999997e+22"],
    ["44b52d02c7e14af6", "1e+23"],
    ["44b52d02c7e14af7", "1.0000000000000001e+23"],
    ["444b1ae4d6e2ef4e", "999999999999999700000"],
    ["444b1ae4d6e2ef4f", "999999999999999900000"],
    ["444b1ae4d6e2ef50", "1e+21"],
    ["3eb0c6f7a0b5ed8c", "9.999999999999997e-7"],
    ["3eb0c6f7a0b5ed8d", "0.000001"],
    ["41b3de4355555553", "333333333.3333332"],
    ["41b3de4355555554", "333333333.33333325"],
    ["41b3de4355555555", "333333333.3333333"],
    ["41b3de4355555556", "333333333.3333334"],
    ["41b3de4355555557", "333333333.33333343"],
    ["becbf647612f3696", "-0.0000033333333333333333"],
    ["43143ff3c1cb0959", "1424953923781206.2"],
  ])("writes the number %s as %s", (bits, json) => expect(canonicalJson(doubleOf(bits))).toBe(json));

  test.each(["7fffffffffffffff", "7ff0000000000000", "fff0000000000000"])(
    "refuses the bits %s, which are no number",
    (bits) => expect(() => canonicalJson(doubleOf(bits))).toThrow(RangeError),
  );

  test("writes the example of section 3.2.2 as the bytes of section 3.2.4", () => {
    const value = {
      numbers: [333333333.33333329, 1e30, 4.5, 2e-3, 0.000000000000000000000000001],
      string: '\u20ac$\u000F\u000aA\u0027\u0042\u0022\u005c\\"/',
      literals: [null, true, false],
    };
    expect(Buffer.from(canonicalJson(value), "utf8").toString("hex")).toBe(
      "7b226c69746572616c73223a5b6e756c6c2c747275652c66616c73655d2c226e756d62657273223a5b3333333333333333332e333333333333332c31652b33302c342e352c302e3030322c31652d32375d2c22737472696e67223a22e282ac245c75303030665c6e4127425c225c5c5c5c5c222f227d",
    );
  });

  test("sorts names by UTF-16 code units, as in section 3.2.3", () => {
    const sorted = canonicalJson({
      "\u20ac": "Euro Sign",
      "\r": "Carriage Return",
      "\ufb33": "Hebrew Letter Dalet With Dagesh",
      "1": "One",
      "\ud83d\ude00": "Emoji: Grinning Face",
      "\u0080": "Control",
      "\u00f6": "Latin Small Letter O With Diaeresis",
    });
    expect(sorted.match(/(?<=:")[^"]*/g)).toEqual([
      "Carriage Return",
      "One",
      "Control",
      "Latin Small Letter O With Diaeresis",
      "Euro Sign",
      "Emoji: Grinning Face",
      "Hebrew Letter Dalet With Dagesh",
    ]);
  });

  test("keeps the order of lists and sorts within them", () => {
    expect(canonicalJson([{ b: 2, a: [3, 1, 2] }, []])).toBe('[{"a":[3,1,2],"b":2},[]]');
  });
});

describe("beyond the standard", () => {
  test("brings text to NFC: a name typed with combining marks gives the same fingerprint", () => {
    expect(canonicalJson("Z\u0307o\u0301l\u0301c\u0301")).toBe(canonicalJson("\u017b\u00f3l\u0301\u0107"));
    expect(fingerprintOf({ name: "Zo\u0308e" })).toBe(fingerprintOf({ name: "Z\u00f6e" }));
  });

  test("gives the same text after a round trip through JSON", () => {
    const value = { b: [1.5, -0, "Łukasz"], a: { z: null, y: "\u2028" } };
    expect(canonicalJson(JSON.parse(canonicalJson(value)))).toBe(canonicalJson(value));
  });

  test.each([
    ["undefined", undefined],
    ["an undefined member", { a: undefined }],
    ["a hole in a list", [1, , 2]],
    ["a date", new Date(0)],
    ["a map", new Map()],
    ["a function", () => 1],
    ["a big integer", 1n],
    ["a symbol", Symbol("a")],
    ["a class instance", new (class Box {})()],
    ["a lone surrogate", "a\ud800"],
    ["a lone surrogate in a name", { "\udc00": 1 }],
    ["minus infinity in a list", [[-Infinity]]],
  ])("refuses %s", (_what, value) => expect(() => canonicalJson(value)).toThrow(RangeError));

  test("refuses what contains itself, and takes the same part twice", () => {
    const part: Record<string, unknown> = {};
    expect(canonicalJson([part, part])).toBe("[{},{}]");
    part.itself = [part];
    expect(() => canonicalJson(part)).toThrow(/contains itself/);
  });

  test("names the place of the fault", () =>
    expect(() => canonicalJson({ a: [0, { b: NaN }] })).toThrow("$.a[1].b is NaN"));
});

test("the fingerprint is SHA-256 over UTF-8", () => {
  // FIPS 180-4 gives no JSON; this is SHA-256 of the five bytes 22 61 62 63 22, computed by another tool.
  expect(fingerprintOf("abc")).toBe("6cc43f858fbb763301637b5af970e2a46b46f461f27e5a0f41e009c59b827b25");
});

function doubleOf(bits: string): number {
  const view = new DataView(new ArrayBuffer(8));
  view.setBigUint64(0, BigInt(`0x${bits}`));
  return view.getFloat64(0);
}

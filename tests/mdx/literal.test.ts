import { expect, test } from "vitest";
import { readLiteral } from "@/lib/mdx/literal";

test.each([
  ["5", 5],
  ["-1.5", -1.5],
  ["1e-3", 0.001],
  [".5", 0.5],
  ["-0", 0],
  ['"a"', "a"],
  ["'a'", "a"],
  ["true", true],
  ["null", null],
  ["[1, 'a', [false]]", [1, "a", [false]]],
  [" 7 ", 7],
])("%s is read as written", (text, value) => expect(readLiteral(text)).toEqual({ value }));

test("a record has the written entries and no prototype", () => {
  const read = readLiteral("{ a: 1, 'b c': { d: [2] } }");
  const value = "value" in read ? (read.value as Record<string, object>) : {};
  expect(Object.getPrototypeOf(value)).toBeNull();
  expect(Object.getPrototypeOf(value["b c"])).toBeNull();
  expect(JSON.stringify(value)).toBe('{"a":1,"b c":{"d":[2]}}');
});

test.each([
  "__proto__",
  "constructor",
  "prototype",
  '"__proto__"',
  '"constructor"',
  '"proto\\u0074ype"',
  "con\\u0073tructor",
])("the key %s is refused in every spelling", (key) => {
  expect(readLiteral(`{ ${key}: 1 }`)).toMatchObject({ problem: expect.stringContaining("cannot be the name") });
  expect({}).not.toHaveProperty("polluted");
});

test("depth and number of parts are bounded", () => {
  expect(readLiteral("[[[[1]]]]")).toEqual({ value: [[[[1]]]] });
  expect(readLiteral("[[[[[1]]]]]")).toMatchObject({ offset: 4 });
  expect(readLiteral(`[${"1,".repeat(199)}]`)).toHaveProperty("value");
  expect(readLiteral(`[${"1,".repeat(200)}]`)).toHaveProperty("problem");
});

test("what would have to be worked out is refused with its place", () => {
  expect(readLiteral("[1, Date.now()]")).toMatchObject({ offset: 4 });
  expect(readLiteral("{ a: x }")).toEqual({
    problem: "A name stands here. Write the value itself, or a text in quotes.",
    offset: 5,
  });
});

test("a text nested beyond all measure is refused and not an error", () => {
  expect(readLiteral("[".repeat(1900))).toHaveProperty("problem");
});

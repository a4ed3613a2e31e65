import { describe, expect, test } from "vitest";
import { cn0 as kind } from "@/lib/checks/cn0/cn0";
import { markAnswers } from "@/lib/checks/cn0/markAnswers";
import { planOf, seedOf } from "../planOf";

const plan = planOf(kind);
const built = kind.build(seedOf(4), plan);
const right = kind.solve(built, plan);
const { channels } = built.truth;
const byLevel = channels.map(({ cn0DbHz }, n) => ({ n, cn0DbHz })).sort((a, b) => a.cn0DbHz - b.cn0DbHz);
const [weakest, , , strongest] = byLevel;

const rowOf = (n: number, typed: string) =>
  markAnswers(built.truth, plan, { ...right, [`channels.ch${n + 1}`]: typed }).rows.find(
    ({ subject }) => subject === `channel ${n + 1}`,
  )!;
const methodRow = (typed: string) =>
  markAnswers(built.truth, plan, { ...right, "channels.method": typed }).rows.find(
    ({ quantity }) => quantity === "method",
  )!;

describe("tolerance", () => {
  // 1 dB from 33 dB-Hz on, 2 dB below: narrow over wide power scatters by 0.3 dB at most, moments by several.
  test.each([
    [strongest, 0.99, true],
    [strongest, 1.01, false],
    [strongest, -1.01, false],
    [weakest, 1.99, true],
    [weakest, -1.99, true],
    [weakest, 2.01, false],
  ])("%j off by %d dB", ({ n, cn0DbHz }, off, within) =>
    expect(rowOf(n, (cn0DbHz + off).toFixed(6)).within).toBe(within),
  );

  test("is published with both parts", () =>
    expect(built.publicCase.tolerances[0]?.tolerance).toBe("±1\u00a0dB from 33\u00a0dB-Hz on, ±2\u00a0dB below"));

  test("a lead's own tolerance holds for both", () => {
    const own = {
      ...plan,
      quantities: [{ of: "cn0", tolerance: { value: 0.6, unit: "dB" as const }, critical: true }],
    };
    const rows = markAnswers(built.truth, own, right).rows;
    expect(rows[strongest.n]).toMatchObject({ tolerance: "±0.6\u00a0dB", critical: true });
    expect(rows[weakest.n]?.tolerance).toBe("±1.2\u00a0dB");
  });
});

describe("a known mistake is named", () => {
  test.each([
    ["snr-in-1-khz", "SNR in 1 kHz for C/N0"],
    ["noise-in-db", "mean of decibels"],
    ["one-branch", "noise of one branch"],
    ["bits-cut", "bits cut in the middle"],
    ["residual-left", "residual left in"],
  ])("%s on the strongest channel", (method, errorClass) => {
    const answers = kind.wrongMethods[method]!.solve(built, plan);
    expect(rowOf(strongest.n, answers[`channels.ch${strongest.n + 1}`]!)).toMatchObject({ within: false, errorClass });
  });

  test("moments on the weakest", () => {
    const answers = kind.wrongMethods.moments!.solve(built, plan);
    expect(rowOf(weakest.n, answers[`channels.ch${weakest.n + 1}`]!)).toMatchObject({
      within: false,
      errorClass: "moments of single prompts",
    });
  });

  test("the value of another channel", () =>
    expect(rowOf(strongest.n, weakest.cn0DbHz.toFixed(1))).toMatchObject({
      errorClass: "channels exchanged",
      reason: `This is the C/N0 of channel ${weakest.n + 1}.`,
    }));
});

describe("what is typed", () => {
  test.each([
    ["", /Nothing was handed in/],
    ["NaN", /is not a number/],
    ["1e400", /too large/],
    ["40 dB", /dB does not fit/],
    ["40 Hz", /Hz does not fit/],
    ["-0", /below the computed one/],
    ["\u221240", /below the computed one/],
  ])("%j is outside, with a sentence", (typed, reason) =>
    expect(rowOf(strongest.n, typed)).toMatchObject({ within: false, reason: expect.stringMatching(reason) }),
  );
  test.each([
    (text: string) => `${text} dBHz`,
    (text: string) => text.replace(".", ","),
    (text: string) => ` ${text} `,
  ])("units, a decimal comma and spaces are understood (%#)", (written) =>
    expect(rowOf(strongest.n, written(strongest.cn0DbHz.toFixed(1))).within).toBe(true),
  );
});

describe("method", () => {
  test.each(["narrow-wide", "bit-sums"])("%s holds for a weak channel", (typed) =>
    expect(methodRow(typed)).toMatchObject({ within: true, reason: null }),
  );
  test.each([
    ["moments", /the method of moments reads .* was put in\.$/],
    ["branches", /both branches hold signal/],
    ["decibel-mean", /Powers are averaged/],
    ["", /Nothing was handed in/],
    ["guess", /not in the list/],
    ["__proto__", /not in the list/],
  ])("%j does not", (typed, reason) =>
    expect(methodRow(typed)).toMatchObject({ within: false, reason: expect.stringMatching(reason) }),
  );
});

test("workings say what was put in and what the right method reads", () => {
  const { workings } = markAnswers(built.truth, plan, right);
  expect(workings).toHaveLength(4);
  expect(workings[0]?.value).toMatch(
    /^[\d.]+\u00a0dB-Hz put in; narrow over wide power reads [\d.]+\u00a0dB-Hz; bits begin at \d+\u00a0ms; residual \u2212?[\d.]+\u00a0Hz$/,
  );
});

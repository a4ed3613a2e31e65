import { describe, expect, test } from "vitest";
import { cn0 as kind } from "@/lib/checks/cn0/cn0";
import { PROMPTS } from "@/lib/checks/cn0/drawPrompts";
import { PROMPT_S } from "@/lib/checks/cn0/estimates";
import { momentsCn0DbHz } from "@/lib/gnss/tracking/cn0Estimators";
import { planOf, seeds } from "../planOf";

const plan = planOf(kind);
const built = seeds(14).map((seed) => ({ seed, built: kind.build(seed, plan) }));
const trial = kind.trial!;

test("levels are in range and at least 4 dB apart, in no fixed order", () => {
  for (const { built: one } of built) {
    for (const { label, value, from, to } of trial.difficulty(one, plan))
      expect(value >= from && value <= to, label).toBe(true);
    for (const { residualHz, edge } of one.truth.channels) {
      expect(Math.abs(residualHz)).toBeLessThanOrEqual(5);
      expect(edge >= 0 && edge < 20 && Number.isInteger(edge)).toBe(true);
    }
  }
  const weakestAt = built.map(({ built: { truth } }) => {
    const levels = truth.channels.map(({ cn0DbHz }) => cn0DbHz);
    return levels.indexOf(Math.min(...levels));
  });
  expect(new Set(weakestAt).size).toBeGreaterThan(2);
});

test("on the weakest channel the method of moments is more than 2 dB off, as prompts are handed out", () => {
  for (const { built: one } of built) {
    const weakest = one.truth.channels.reduce((low, channel) => (channel.cn0DbHz < low.cn0DbHz ? channel : low));
    const off = Math.abs(momentsCn0DbHz(weakest.prompts, PROMPT_S) - weakest.cn0DbHz);
    expect(off).toBeGreaterThan(2.05);
    expect(Math.abs(weakest.estimate.cn0DbHz - weakest.cn0DbHz)).toBeLessThanOrEqual(0.6);
  }
});

describe("the public case", () => {
  const [{ built: one }] = built;
  test("holds prompts and satellites and nothing else", () => {
    expect(Object.keys(one.publicCase.data).sort()).toEqual(["channels", "periodMs", "promptsFile"]);
    for (const channel of one.publicCase.data.channels as object[])
      expect(Object.keys(channel).sort()).toEqual(["i", "prn", "q"]);
    expect(JSON.stringify(one.publicCase)).not.toMatch(/"(edge|residualHz|cn0DbHz|estimate)":/);
  });

  test("is small enough for a bad link", () => {
    for (const { built: one } of built) expect(JSON.stringify(one.publicCase).length).toBeLessThan(90_000);
  });

  test("the file holds the same prompts", () => {
    const lines = new TextDecoder().decode(one.files[0].bytes).split("\r\n");
    expect(lines[0]).toBe("ms,ch1_i,ch1_q,ch2_i,ch2_q,ch3_i,ch3_q,ch4_i,ch4_q");
    expect(lines).toHaveLength(PROMPTS + 2);
    const { channels } = one.truth;
    expect(lines[8]).toBe([7, ...channels.flatMap(({ prompts }) => [prompts[14], prompts[15]])].join(","));
  });

  test("scale of counts tells nothing: it is drawn for each channel", () => {
    const noisy = built.map(({ built: { truth } }) =>
      truth.channels.map(({ prompts, cn0DbHz }) => {
        const power = prompts.reduce((sum, value) => sum + value * value, 0) / PROMPTS;
        return Math.sqrt(power / (2 + 2 * 10 ** (cn0DbHz / 10) * PROMPT_S));
      }),
    );
    for (const sigma of noisy.flat()) expect(sigma > 18 && sigma < 126).toBe(true);
    expect(new Set(noisy.flat().map((sigma) => sigma.toFixed(0))).size).toBeGreaterThan(20);
  });
});

// The reasons beside the tolerances once named the right method.
test("nothing that is shown says which method is sound, but for the list itself", () => {
  const { sections, ...shown } = built[0].built.publicCase;
  expect(sections[0]?.fields.at(-1)?.choices).toHaveLength(5);
  expect(JSON.stringify({ ...shown, data: null })).not.toMatch(/narrow|wide power|whole|moment|sums/i);
});

import { describe, expect, test } from "vitest";
import { delayEntry as kind } from "@/lib/checks/delay-entry/delayEntry";
import { tightest } from "@/lib/checks/delay-entry/drawCase";
import { NOTES } from "@/lib/checks/delay-entry/notes";
import { wayOf, type SitePart } from "@/lib/checks/delay-entry/site";
import { planOf, seedOf, seeds } from "../planOf";

const plan = planOf(kind);
const built = seeds(25).map((seed) => ({ seed, built: kind.build(seed, plan) }));

test("sites stay in their ranges, and both kinds of receiver come up", () => {
  for (const { built: one } of built) {
    const { parts, delaysNs, echoes } = one.truth;
    expect(wayOf(parts).length).toBeGreaterThanOrEqual(5);
    expect(wayOf(parts).length).toBeLessThanOrEqual(9);
    expect(delaysNs.filter((ns) => ns === 0).length).toBeGreaterThanOrEqual(1);
    expect(tightest(one.truth)).toBeGreaterThanOrEqual(2.5);
    for (const { paper } of parts) {
      if (paper.says !== "cable") continue;
      expect(paper.velocityFactor >= 0.66 && paper.velocityFactor <= 0.88).toBe(true);
      if (paper.reelM !== null) expect(paper.installedM >= 8 && paper.installedM <= 120).toBe(true);
    }
    // 8 to 120 m of 0.66 to 0.88: 30 to 606 ns one way (definition of the velocity factor).
    expect((echoes.endNs - echoes.leadNs) / 2).toBeGreaterThan(30);
    expect((echoes.endNs - echoes.leadNs) / 2).toBeLessThan(607);
  }
  const positive = built.filter(({ built: one }) => one.truth.sign === "delay-is-positive").length;
  expect(positive).toBeGreaterThan(2); // 12.5 +- 2.5 expected of 25 (binomial)
  expect(positive).toBeLessThan(23);
});

test("a lead can hold the sign", () => {
  for (const sign of ["delay-is-positive", "delay-is-negative"] as const) {
    const { truth } = kind.build(seedOf(3), planOf(kind, { sign }));
    expect(NOTES[sign]).toContain(truth.note);
    expect(Math.sign(truth.entryNs)).toBe(sign === "delay-is-positive" ? 1 : -1);
  }
});

describe("the public case", () => {
  test("holds papers and traces, and no worked delay", () => {
    for (const { built: one } of built) {
      const { data } = one.publicCase;
      expect(Object.keys(data).sort()).toEqual(["echoFile", "endTrace", "leadTrace", "note", "parts", "stepNs"]);
      for (const part of data.parts as SitePart[])
        expect(Object.keys(part).sort()).toEqual(["from", "id", "name", "paper", "to", "uncertainty"]);
      const text = JSON.stringify({ ...one.publicCase, data: { ...data, leadTrace: null, endTrace: null } });
      for (const secret of [one.truth.totalNs, one.truth.echoes.endNs]) expect(text).not.toContain(secret.toFixed(1));
      expect(text).not.toMatch(/delay-is-|totalNs|entryNs/);
    }
  });

  test("reads the same for either receiver but for its sheet", () => {
    const shapeOf = (sign: "delay-is-positive" | "delay-is-negative") => {
      const { publicCase } = kind.build(seedOf(5), planOf(kind, { sign }));
      return JSON.stringify({
        ...publicCase,
        given: publicCase.given.slice(2),
        data: { ...publicCase.data, note: "" },
      });
    };
    expect(shapeOf("delay-is-negative")).toBe(shapeOf("delay-is-positive"));
  });

  test("is small enough for a bad link", () => {
    for (const { built: one } of built) expect(JSON.stringify(one.publicCase.data).length).toBeLessThan(60_000);
  });

  test("the file holds both traces", () => {
    const [{ built: one }] = built;
    const lines = new TextDecoder().decode(one.files[0].bytes).split("\r\n");
    const { leadTrace, endTrace } = one.truth.echoes;
    expect(lines[0]).toBe("time_ns,test_lead_alone,run_connected");
    expect(lines[3]).toBe(`1.0,${leadTrace[2].toFixed(3)},${endTrace[2].toFixed(3)}`);
    expect(lines).toHaveLength(leadTrace.length + 2);
  });
});

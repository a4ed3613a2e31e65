import { describe, expect, test } from "vitest";
import type { Answers, BuiltCase } from "@/lib/checks/kind";
import { drawScene, type SatellitesTruth } from "@/lib/checks/satellites/drawScene";
import { markAnswers } from "@/lib/checks/satellites/markAnswers";
import { publicCase } from "@/lib/checks/satellites/publicCase";
import { satellites as kind } from "@/lib/checks/satellites/satellites";
import { answersFor, type Listed } from "@/lib/checks/satellites/solve";
import { planOf, seedOf, seeds } from "../planOf";

const plan = planOf(kind);
const withoutFiles = (seed: string): BuiltCase<SatellitesTruth> => {
  const { truth, draws } = drawScene(seed, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [], draws };
};

/** Two strong satellites and a weak one; 2.046 MHz. */
const truth: SatellitesTruth = {
  clockPpm: 1,
  foundFromDbHz: 36,
  windowHz: 9000,
  startedAt: "",
  scene: {
    rateHz: 2_046_000,
    durationMs: 100,
    ifHz: 0,
    satellites: [
      { prn: 7, codePhaseChips: 412.24, dopplerHz: -2194, cn0DbHz: 41.2 },
      { prn: 12, codePhaseChips: 0.1, dopplerHz: 3126, cn0DbHz: 34.6 },
      { prn: 19, codePhaseChips: 88.73, dopplerHz: 1575, cn0DbHz: 38.4 },
    ].map((signal) => ({ ...signal, carrierPhaseCycles: 0, dataBits: null, bitEdgeMs: 0 })),
  },
};
const [prn7, prn12, prn19] = truth.scene.satellites;
const mark = (answers: Answers, over: Partial<typeof plan> = {}) =>
  markAnswers(truth, { ...plan, ...over }, answers, []);
const list = (...listed: Listed[]) => mark(answersFor(listed));
const outside = (marking: ReturnType<typeof mark>) => marking.rows.filter(({ within }) => !within);

describe("the list", () => {
  test("all that must be found: met", () => expect(list(prn7, prn19)).toMatchObject({ met: true, withinCount: 5 }));

  test("a weaker one is extra and changes nothing, right or wrong", () => {
    expect(list(prn7, prn12, prn19).met).toBe(true);
    const wrong = list(prn7, { ...prn12, dopplerHz: -3126 }, prn19);
    expect(wrong.met).toBe(true);
    expect(outside(wrong)).toMatchObject([
      { subject: "PRN 12", label: "Doppler (extra, not counted)", errorClass: "sign" },
    ]);
  });

  test("one missed fails the check", () => {
    const marking = list(prn7);
    expect(marking.met).toBe(false);
    expect(outside(marking)[0]).toMatchObject({
      quantity: "found",
      subject: "PRN 19",
      critical: true,
      errorClass: "missed",
      reason: "PRN 19 is in the capture at 38.4\u00a0dB-Hz and not in your list.",
    });
  });

  test("one invented fails the check", () => {
    const marking = list(prn7, prn19, { prn: 30, codePhaseChips: 5, dopplerHz: 0, cn0DbHz: 36 });
    expect(marking.met).toBe(false);
    expect(outside(marking)).toMatchObject([
      { quantity: "invented", subject: "PRN 30", critical: true, errorClass: "invented" },
    ]);
  });

  test("an empty list is outside everywhere", () => {
    const marking = mark({});
    expect(marking.withinCount).toBe(0);
    expect(outside(marking).find(({ quantity }) => quantity === "invented")?.reason).toBe("Nothing was handed in.");
  });

  test("a satellite listed twice counts not at all", () => {
    const marking = list(prn7, prn19, prn7);
    expect(marking.met).toBe(false);
    expect(outside(marking)[0]).toMatchObject({
      subject: "PRN 7",
      errorClass: "listed twice",
      reason: "PRN 7 is listed in lines 1 and 3, so none of them is taken.",
    });
  });

  test.each([
    ["45", "GPS satellites have PRN 1 to 32; 45 is none of them."],
    ["Vega", "“Vega” is not a PRN."],
    ["", "This line names no satellite."],
  ])("a line named %j is outside", (prn, reason) => {
    const marking = mark({ ...answersFor([prn7, prn19]), "satellites.5.prn": prn, "satellites.5.cn0": "40" });
    expect(marking.met).toBe(false);
    expect(outside(marking)).toMatchObject([{ quantity: "invented", subject: "Line 5", reason }]);
  });

  test("lines in any order, with gaps, with G before the number", () => {
    const answers = answersFor([prn19, prn7]);
    const moved = Object.fromEntries(
      Object.entries(answers).map(([id, text]) => [id.replace("satellites.2", "satellites.9"), text]),
    );
    expect(mark({ ...moved, "satellites.9.prn": "G07" }).met).toBe(true);
  });
});

describe("values", () => {
  const row = (quantity: string, typed: string, more: Answers = {}) => {
    const field = `satellites.1.${quantity}`;
    return mark({ ...answersFor([prn7, prn19]), [field]: typed, ...more }).rows.find(
      (one) => one.quantity === quantity && one.subject === "PRN 7",
    );
  };

  test.each([
    ["412.74", true, null],
    ["412.75", false, null],
    ["402.97 us", true, null],
    ["120.81 km", true, null],
    ["610.76", false, "mirrored delay (1 023 - x)"],
    ["824.5", false, "samples for chips"],
    ["1500", false, null],
    ["", false, null],
  ])("code phase %j", (typed, within, errorClass) =>
    expect(row("codePhase", typed)).toMatchObject({ within, errorClass }),
  );

  test("code phase goes round the end of the code", () => {
    const round = mark(answersFor([prn7, { ...prn12, codePhaseChips: 1022.8 }, prn19]));
    expect(outside(round)).toEqual([]);
  });

  test.each([
    ["-2256", "125 Hz", true, null],
    ["-2257", "125 Hz", false, null],
    ["-2243", "100 Hz", true, null],
    ["-2245", "100 Hz", false, null],
    ["-2.2 kHz", "125 Hz", true, null],
    ["2194", "125 Hz", false, "sign"],
    ["-3769", "125 Hz", false, "clock offset taken out"],
    ["-1944", "1000 Hz", true, null], // half of the bin would be 500 Hz; 250 Hz is the most
    ["-1943", "1000 Hz", false, null],
  ])("Doppler %s with bins of %s", (typed, bin, within, errorClass) =>
    expect(row("doppler", typed, { "search.bin": bin })).toMatchObject({ within, errorClass }),
  );

  test("the sentence on a wrong sign says which way", () =>
    expect(row("doppler", "2194")?.reason).toBe(
      "The size agrees; the sign does not. Received frequency is below 1\u2009575.42\u00a0MHz, so the Doppler is negative.",
    ));

  test.each(["", "wide", "0", "2 kHz", "-125"])(
    "a bin of %j is a row outside, and the Dopplers are judged at 25 Hz",
    (bin) => {
      const marking = mark({ ...answersFor([prn7, prn19]), "search.bin": bin });
      expect(outside(marking)).toMatchObject([{ quantity: "doppler", label: "Your Doppler bin" }]);
      expect(
        marking.rows.find(({ quantity, subject }) => quantity === "doppler" && subject === "PRN 7")?.tolerance,
      ).toBe("±25\u00a0Hz");
    },
  );

  test.each([
    ["39.2", true, null],
    ["43.3", false, null],
    ["11.2", false, "SNR in 1 kHz"],
    ["41.2 dB", false, null],
  ])("C/N0 %s", (typed, within, errorClass) => expect(row("cn0", typed)).toMatchObject({ within, errorClass }));
});

test("a plan may ask for the list alone", () => {
  const quantities = [{ of: "found", tolerance: null, critical: true }];
  const marking = mark(answersFor([prn7, prn19]), { quantities });
  expect(marking.quantities.map(({ of }) => of)).toEqual(["found"]);
  expect(marking.rows.every(({ quantity }) => quantity === "found")).toBe(true);
});

test("a careful reading of the scene is met, with errors of a grid", () => {
  for (const seed of seeds(20)) {
    const built = withoutFiles(seed);
    const read = built.truth.scene.satellites.map((signal, n) => ({
      ...signal,
      codePhaseChips: signal.codePhaseChips + (n % 2 ? 0.25 : -0.25),
      dopplerHz: signal.dopplerHz + (n % 2 ? -60 : 60),
      cn0DbHz: signal.cn0DbHz - 1.5,
    }));
    expect(markAnswers(built.truth, plan, answersFor(read), []).met, seed).toBe(true);
  }
});

test.each(Object.entries(kind.wrongMethods))("a wrong method is not met: %s", (_id, wrong) => {
  for (const seed of seeds(20)) {
    const built = withoutFiles(seed);
    expect(markAnswers(built.truth, plan, wrong.solve(built, plan), []).met, seed).toBe(false);
  }
});

test("a search that disagrees with the scene is told in the workings", () => {
  const built = withoutFiles(seedOf(1));
  const { workings } = markAnswers(built.truth, plan, {}, []);
  expect(workings[workings.length - 1].value).toMatch(/^differ by more than the tolerance for PRN \d/);
});

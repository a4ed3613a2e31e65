import { describe, expect, test } from "vitest";
import { momentsCn0DbHz, narrowWideCn0DbHz } from "@/lib/gnss/tracking/cn0Estimators";
import {
  coherentDiscriminator,
  costasPhaseCycles,
  dotProductDiscriminator,
  envelopeDiscriminator,
  frequencyDiscriminatorHz,
  pilotPhaseCycles,
  powerDiscriminator,
} from "@/lib/gnss/tracking/discriminators";
import { findBitEdge } from "@/lib/gnss/tracking/findBitEdge";
import { lockStates, phaseLockIndicators, USUAL_LOCK_RULE } from "@/lib/gnss/tracking/lockDetectors";
import { createLoopFilter, type LoopOrder } from "@/lib/gnss/tracking/loopFilter";
import { seededRandom } from "@/lib/numeric/random";
import { mean, standardDeviation } from "@/lib/numeric/statistics";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";

const random = seededRandom("b".repeat(64), "prompts");

/** One-millisecond prompts with noise of variance 1 in I and Q: amplitude sqrt(2 C/N0 T). */
function promptsOf(cn0DbHz: number, count: number, edge: number, residualHz = 0): Float64Array {
  const amplitude = Math.sqrt(2 * 10 ** (cn0DbHz / 10) * 1e-3);
  const prompts = new Float64Array(2 * count);
  let bit = 1;
  for (let n = 0; n < count; n++) {
    if ((n - edge + 20) % 20 === 0) bit = random.uniform() < 0.5 ? -1 : 1;
    const angle = 2 * Math.PI * residualHz * n * 1e-3;
    prompts[2 * n] = bit * amplitude * Math.cos(angle) + random.gaussian();
    prompts[2 * n + 1] = bit * amplitude * Math.sin(angle) + random.gaussian();
  }
  return prompts;
}

describe("C/N0 from prompts", () => {
  // Scatter over runs of 1 s: narrow and wide power 0.15 dB at 42 and 0.31 dB at 27 dB-Hz; moments 0.8 dB at 30 and 5
  // dB at 27. Values from a second program, 400 runs each.
  const runs = (cn0DbHz: number, of: (prompts: Float64Array) => number) =>
    Array.from({ length: 400 }, () => of(promptsOf(cn0DbHz, 1000, 0)));
  const narrow = (prompts: Float64Array) => narrowWideCn0DbHz(prompts, 0, 20, 1e-3);

  test.each([
    [42, 0.15],
    [27, 0.31],
  ])("narrow and wide power at %s dB-Hz scatters by %s dB", (cn0DbHz, scatter) => {
    const values = runs(cn0DbHz, narrow);
    expectNear(standardDeviation(values), scatter, 0.05, "scatter");
    expectNear(mean(values), cn0DbHz, 0.15, "mean");
  });

  test("moments scatter by 0.8 dB at 30 dB-Hz, and fail below", () => {
    expectNear(standardDeviation(runs(30, (prompts) => momentsCn0DbHz(prompts, 1e-3))), 0.8, 0.15, "scatter");
    const weak = runs(27, (prompts) => momentsCn0DbHz(prompts, 1e-3));
    expect(weak.filter((value) => Math.abs(value - 27) > 2).length).toBeGreaterThan(40);
  });

  test("cutting through the bits reads low, and no data reads nothing", () => {
    const prompts = promptsOf(40, 4000, 0);
    expect(narrowWideCn0DbHz(prompts, 10, 20, 1e-3)).toBeLessThan(narrow(prompts) - 1);
    expect(narrowWideCn0DbHz([], 0, 20, 1e-3)).toBeNaN();
    expect(momentsCn0DbHz([1, 0], 1e-3)).toBeNaN();
    expect(() => narrowWideCn0DbHz(prompts, 0, 1, 1e-3)).toThrow(RangeError);
  });

  test("a signal without noise has no end of it", () => {
    const steady = Array.from({ length: 80 }, (_, n) => (n % 2 ? 0 : 1));
    expect(momentsCn0DbHz(steady, 1e-3)).toBe(Infinity);
    expect(narrowWideCn0DbHz(steady, 0, 20, 1e-3)).toBe(Infinity);
  });
});

describe("bit edge", () => {
  test.each([0, 1, 7, 19])("%s is found at 32 dB-Hz", (edge) =>
    expect(findBitEdge(promptsOf(32, 2000, edge), 20)!.edge).toBe(edge),
  );

  test("is found although the frequency is 8 Hz off", () =>
    expect(findBitEdge(promptsOf(38, 2000, 4, 8), 20)!.edge).toBe(4));

  test("is not made up where no bit changes, and needs five bits", () => {
    const steady = Float64Array.from({ length: 4000 }, (_, n) => (n % 2 ? 0 : 5) + random.gaussian());
    expect(findBitEdge(steady, 20)).toBeNull();
    expect(findBitEdge(promptsOf(45, 110, 3), 20)).toBeNull();
  });
});

describe("lock", () => {
  test("stands at 40 dB-Hz and goes with the signal", () => {
    const prompts = promptsOf(40, 6000, 0);
    const noise = Float64Array.from({ length: 8000 }, () => random.gaussian());
    const states = lockStates(phaseLockIndicators(Float64Array.from([...prompts, ...noise]), 0, 20));
    expect(states[299]).toBe(true);
    expect(states.at(-1)).toBe(false);
    expect(states.indexOf(true)).toBeGreaterThan(USUAL_LOCK_RULE.toDeclare);
  });

  test("the indicator is the cosine of twice the phase", () => {
    const angle = Math.PI / 6;
    const prompts = Array.from({ length: 40 }, (_, n) => (n % 2 ? Math.sin(angle) : Math.cos(angle)));
    expectNear(phaseLockIndicators(prompts, 0, 20)[0], 0.5, 1e-12, "30 degrees");
    expect(phaseLockIndicators(new Float64Array(40), 0, 20)[0]).toBe(0);
    expect(() => lockStates([1], { ...USUAL_LOCK_RULE, weight: 0 })).toThrow(RangeError);
  });
});

describe("discriminators", () => {
  const sums = (early: number, prompt: number, late: number, phase = 0.8) => ({
    earlyI: early * Math.cos(phase),
    earlyQ: early * Math.sin(phase),
    promptI: prompt * Math.cos(phase),
    promptQ: prompt * Math.sin(phase),
    lateI: late * Math.cos(phase),
    lateQ: late * Math.sin(phase),
  });

  // On the triangle 1 - |tau| all of them read a small error in chips, Kaplan & Hegarty, Table 5.5.
  test.each([0.02, -0.02])("of the code read %s chip", (error) => {
    const [spacing, scale] = [0.5, 0.75];
    const triangle = sums(1 - Math.abs(error - spacing / 2), 1 - Math.abs(error), 1 - Math.abs(error + spacing / 2));
    expectNear(envelopeDiscriminator(triangle, scale), error, 1e-12, "envelope");
    expectNear(powerDiscriminator(triangle, scale), error, 1e-4, "power");
    expectNear(dotProductDiscriminator(triangle), error, 5e-4, "dot product");
    expectNear(
      coherentDiscriminator({ ...triangle, ...sums(triangle.earlyI, triangle.promptI, triangle.lateI, 0) }),
      error,
      5e-4,
      "coherent",
    );
  });

  test("of the phase read it, with a data bit or without", () => {
    const at = (turns: number) => ({ ...sums(0, 1, 0, 2 * Math.PI * turns) });
    expectNear(costasPhaseCycles(at(0.1)), 0.1, 1e-12, "upright");
    expectNear(costasPhaseCycles(at(0.6)), 0.1, 1e-12, "turned over");
    expectNear(pilotPhaseCycles(at(0.4)), 0.4, 1e-12, "pilot");
  });

  test("of the frequency read the turn over time", () => {
    const prompt = (turns: number) => ({
      promptI: Math.cos(2 * Math.PI * turns),
      promptQ: Math.sin(2 * Math.PI * turns),
    });
    expectNear(frequencyDiscriminatorHz(prompt(0.1), prompt(0.3), 1e-3, true), 200, 1e-9, "upright");
    expectNear(frequencyDiscriminatorHz(prompt(0.1), prompt(0.8), 1e-3, true), 200, 1e-9, "turned over");
    expectNear(frequencyDiscriminatorHz(prompt(0.1), prompt(0.5), 1e-3, false), 400, 1e-9, "pilot");
  });

  test("nothing received reads as no error", () => {
    const silence = sums(0, 0, 0);
    for (const of of [dotProductDiscriminator, coherentDiscriminator, costasPhaseCycles, pilotPhaseCycles])
      expect(of(silence)).toBe(0);
    expect(envelopeDiscriminator(silence, 0.5)).toBe(0);
    expect(powerDiscriminator(silence, 0.5)).toBe(0);
  });
});

describe("loop filter", () => {
  /** Follows phase(t) in cycles with an ideal discriminator; returns the errors. */
  const follow = (order: LoopOrder, loopHz: number, phase: (timeS: number) => number, steps: number, noise = 0) => {
    const filter = createLoopFilter();
    const stepS = 1e-3;
    let replica = 0;
    return Array.from({ length: steps }, (_, n) => {
      const error = phase(n * stepS) - replica;
      const input = error + noise * random.gaussian();
      replica += stepS * filter.step({ order, phaseHz: loopHz, frequencyHz: 0 }, input, 0, stepS);
      return -error;
    });
  };

  // A loop of order n follows a motion of order n - 1 without error and lags one of order n by motion/w0^n: Kaplan &
  // Hegarty 5.6.
  test.each([
    [1, 0.25, (t: number) => 3 * t, 3],
    [2, 0.53, (t: number) => 20 * t * t, 40],
    [3, 0.7845, (t: number) => 50 * t * t * t, 300],
  ] as const)("of order %s lags as its order says", (order, ratio, phase, motion) => {
    const errors = follow(order, 10, phase, 4000);
    expectNearRelative(-errors.at(-1)!, motion / (10 / ratio) ** order, 0.05, "steady error");
    const slower = follow(order, 10, (t) => (order === 1 ? 5 : order === 2 ? 5 * t : 5 * t * t), 4000);
    expectNear(slower.at(-1)!, 0, 1e-4, "motion of one order less");
  });

  // White input noise of variance s2 per step gives an output of variance 2 Bn T s2: definition of the noise bandwidth.
  test.each([1, 2, 3] as const)("of order %s has the noise bandwidth it is named by", (order) => {
    const errors = follow(order, 5, () => 0, 200_000, 1).slice(2000);
    // 4 Bn t = 4000 independent values: 1.1 % of the deviation, and 2 % of Bn T that bilinear integrators and one step
    // of delay add
    expectNearRelative(standardDeviation(errors), Math.sqrt(2 * 5 * 1e-3), 0.06, "output");
  });

  test("a frequency loop alone pulls the frequency in", () => {
    const filter = createLoopFilter();
    let rate = 0;
    for (let n = 0; n < 1000; n++) rate = filter.step({ order: 2, phaseHz: 0, frequencyHz: 10 }, 0, 37 - rate, 1e-3);
    expectNear(rate, 37, 1e-6, "frequency");
  });
});

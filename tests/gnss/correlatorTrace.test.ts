import { describe, expect, test } from "vitest";
import { correlatorTrace } from "@/lib/gnss/correlatorTrace";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";

const random = (stream: string | number) => seededRandom("d0".repeat(32), `trace ${stream}`);
const peakOf = (trace: Float64Array) => trace.reduce((best, value, n) => (value > trace[best] ? n : best), 0);

test("peaks at the delay, with the height that C/N0 and time give", () => {
  const trace = correlatorTrace({ prn: 14, delayChips: 812.375, cn0DbHz: 60, coherentMs: 10, random: random(1) });
  expect(trace).toHaveLength(8184);
  expect(peakOf(trace) / 8).toBe(812.375);
  // sqrt(2 rho), rho = 10^6 * 0.01; noise of one sigma on top
  expectNear(Math.max(...trace), Math.sqrt(2 * 1e4), 4, "height in sigma");
});

test("falls in a straight line to the code's -1/1023 over one chip on either side", () => {
  const trace = correlatorTrace({ prn: 14, delayChips: 500.3, cn0DbHz: 80, coherentMs: 20, random: random(2) });
  const peak = Math.sqrt(2 * 1e8 * 0.02);
  for (const chips of [-0.8, -0.425, -0.05, 0.2, 0.575, 0.95]) {
    const value = trace[Math.round((500.3 + chips) * 8)];
    expectNear(value / peak, 1 - Math.abs(chips), 0.004, `${chips} chips from the peak`);
  }
});

test("sidelobes of a strong signal stand at 65/1023, 24 dB down", () => {
  const trace = correlatorTrace({ prn: 7, delayChips: 100, cn0DbHz: 110, coherentMs: 20, random: random(3) });
  const away = trace.filter((_, n) => Math.abs(n - 800) > 8);
  expectNear(20 * Math.log10(Math.max(...away) / Math.max(...trace)), -23.9392, 0.01, "highest sidelobe in dB"); // S10
});

test("the delay wraps: a signal just below 1023 chips shows on both ends", () => {
  const trace = correlatorTrace({ prn: 7, delayChips: 1022.9, cn0DbHz: 60, coherentMs: 10, random: random(4) });
  const peak = Math.sqrt(2 * 1e4);
  expectNear(trace[0] / peak, 0.9, 0.03, "lag 0");
  expectNear(trace[8183] / peak, 0.975, 0.03, "last lag");
});

describe("noise alone", () => {
  const traces = Array.from({ length: 20 }, (_, n) =>
    correlatorTrace({ prn: 21, delayChips: 0, cn0DbHz: null, coherentMs: 4, random: random(n) }),
  );
  const average = (of: (trace: Float64Array, n: number) => number) =>
    traces.reduce((sum, trace) => sum + trace.reduce((part, _, n) => part + of(trace, n), 0) / 8184, 0) / traces.length;

  // A Rayleigh law of sigma 1: mean sqrt(pi/2), mean square 2. A trace has about 1023 independent values.
  test("is a Rayleigh law of sigma 1", () => {
    expectNear(
      average((trace, n) => trace[n]),
      Math.sqrt(Math.PI / 2),
      0.03,
      "mean",
    );
    expectNear(
      average((trace, n) => trace[n] ** 2),
      2,
      0.08,
      "mean square",
    );
    // P(|R| > 3.7169) = 0.001 (D01)
    expectNear(
      average((trace, n) => (trace[n] > 3.7169222 ? 1 : 0)),
      0.001,
      0.0008,
      "share above 3.717 sigma",
    );
  });

  // The noise of two lags d chips apart shares 1 - d of its samples; powers then correlate by (1 - d)^2.
  test.each([1, 4, 8, 12])("lags %i eighths of a chip apart share noise as in a real correlator", (eighths) => {
    const product = average((trace, n) => (trace[n] ** 2 - 2) * (trace[(n + eighths) % 8184] ** 2 - 2));
    const shared = Math.max(0, 1 - eighths / 8);
    expectNear(product / 4, shared * shared, 0.08, "correlation of the powers");
  });
});

// Simulated by a second program: at 38 dB-Hz and 1 ms only 24 % of the readings fall within 0.15 chip.
test("a weak signal is read right as rarely as simulated elsewhere", () => {
  const tries = 300;
  let within = 0;
  for (let n = 0; n < tries; n++) {
    const draws = random(`weak ${n}`);
    const delayChips = draws.uniform() * 1022;
    const trace = correlatorTrace({ prn: 1 + (n % 32), delayChips, cn0DbHz: 38, coherentMs: 1, random: draws });
    if (Math.abs(peakOf(trace) / 8 - delayChips) <= 0.15) within += 1;
  }
  expectNear(within / tries, 0.24, 3 * Math.sqrt((0.24 * 0.76) / tries) + 0.005, "share within 0.15 chip");
});

test("refuses delays outside the code and broken milliseconds", () => {
  const input = { prn: 1, delayChips: 0, cn0DbHz: 40, coherentMs: 1, random: random(0) };
  for (const delayChips of [-0.1, 1023, NaN])
    expect(() => correlatorTrace({ ...input, delayChips })).toThrow(RangeError);
  for (const coherentMs of [0, 21, 1.5]) expect(() => correlatorTrace({ ...input, coherentMs })).toThrow(RangeError);
});

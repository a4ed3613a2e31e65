import { expect, test } from "vitest";
import { searchMap } from "@/lib/gnss/search/searchMap";
import { searchSignalOf } from "@/lib/gnss/search/searchSignal";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import { expectNear } from "@/tests/support/expectNear";
import { rawCapture } from "./rawCapture";

// The capture is written down from the definition of the signal, apart from the engine; so is where its satellite stands.
const satellite = { prn: 12, codePhaseChips: 400.3, dopplerHz: 1240, cn0DbHz: 45 };
const scene = { seed: "3d".repeat(32), rateHz: 4e6, ifHz: 0.25e6, complex: true, durationMs: 20 };
const request = { coherentMs: 1, sums: 20, dopplerHalfWidthHz: 4000, falseAlarmPerSearch: 1e-3 };
const signal = searchSignalOf(gpsL1Ca);

test("the highest cell of the grid stands where the satellite is, at the height that the search tells", () => {
  const map = searchMap(rawCapture({ ...scene, satellites: [satellite] }), signal, 12, request);
  const at = map.power.indexOf(Math.max(...map.power));
  expectNear(map.lagsChips[at % map.lagsChips.length], 400.3, 0.5, "code phase");
  expectNear(map.dopplersHz[Math.floor(at / map.lagsChips.length)], 1240, 250, "Doppler");
  expect(map.finding.found).toBe(true);
  expectNear(map.power[at], map.finding.peak, 1e-5 * map.finding.peak, "peak");
  expectNear(map.finding.cn0DbHz, 45, 1.5, "C/N0");
});

// The mean of noise cells is 1 by definition of the grid; a sum of 20 squares scatters by 1/sqrt(20).
test("without the satellite the grid is noise of mean 1", () => {
  const { power, finding } = searchMap(rawCapture({ ...scene, satellites: [] }), signal, 12, request);
  const mean = power.reduce((sum, value) => sum + value, 0) / power.length;
  const scatter = Math.sqrt(power.reduce((sum, value) => sum + (value - mean) ** 2, 0) / power.length);
  expectNear(mean, 1, 0.02, "mean");
  expectNear(scatter, 1 / Math.sqrt(20), 0.02, "scatter");
  expect(finding.found).toBe(false);
});

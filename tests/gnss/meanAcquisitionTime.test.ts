import { expect, test } from "vitest";
import { meanAcquisitionTimeS } from "@/lib/gnss/meanAcquisitionTime";
import { seededRandom } from "@/lib/numeric/random";
import { formulaCases } from "@/tests/reference/formulaCases";
import { expectNearRelative } from "@/tests/support/expectNear";

const searchOf = (given: Record<string, number>) => ({
  cells: given.q,
  detection: given.Pd,
  falseAlarm: given.Pfa,
  dwellS: given.tau_s,
  penaltyDwells: given.K,
});

// D14: Holmes & Chen 1977, from memory.
test.each(formulaCases("D14"))("$name", ({ given, expected }) =>
  expectNearRelative(meanAcquisitionTimeS(searchOf(given)), expected.T_s, 2e-5, "mean time"),
);

test("a search played out takes that long on average", () => {
  const [given] = formulaCases("D14").map((entry) => searchOf(entry.given));
  const random = seededRandom("8".repeat(64), "searches");
  const runs = 4000;
  let dwells = 0;
  for (let run = 0; run < runs; run++) {
    for (let cell = random.integer(0, given.cells - 1); ; cell = (cell + 1) % given.cells) {
      dwells += 1;
      if (cell === 0 && random.uniform() < given.detection) break;
      if (cell !== 0 && random.uniform() < given.falseAlarm) dwells += given.penaltyDwells;
    }
  }
  // one search scatters by about its own mean: 4000 of them give it to 1.6 %
  expectNearRelative(dwells / runs, meanAcquisitionTimeS(given), 0.06, "mean dwells");
});

test("what is no probability is refused", () => {
  const search = { cells: 50, detection: 0.8, falseAlarm: 0.01, dwellS: 1, penaltyDwells: 10 };
  for (const wrong of [{ detection: 0 }, { detection: 1.1 }, { falseAlarm: -0.1 }, { cells: 0 }])
    expect(() => meanAcquisitionTimeS({ ...search, ...wrong })).toThrow(RangeError);
});

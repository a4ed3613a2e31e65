import { writeFileSync } from "node:fs";
import path from "node:path";
import { allCorrelations } from "@/lib/gnss/allCorrelations";
import { caCode } from "@/lib/gnss/caCode";
import { goldCorrelations } from "@/lib/gnss/goldCorrelations";
import published from "@/tests/reference/gps-l1-ca.json";
import type { Bench } from "./bench";

const ROWS = published.rows.slice(0, 32);
const CODES = ROWS.map((row) => caCode(row[0] as number));
const SHIFTS = ROWS.map((row) => 1023 - (row[2] as number)); // G2 delayed by d is G2 read 1023 - d chips later
const VALUES = 32 * 32 * 1023;
const WARM_UP = 100; // calls, until the engine's compiler has done what the reference's did before it was shipped

export const bench: Bench = {
  title: "all lags of all 32 x 32 C/A pairs, in whole numbers",
  async prepare(folder) {
    // Both sides write into memory that is there already: fresh pages can cost more than the sums.
    const [general, family] = [new Int16Array(VALUES), new Int16Array(VALUES)];
    const inputs = { prns: ROWS.map((row) => row[0]) };
    writeFileSync(path.join(folder, "inputs.json"), JSON.stringify(inputs));
    const contenders = [
      { name: "any codes", target: 1.5, run: () => allCorrelations(CODES, general) },
      { name: "one Gold family", target: 0.5, run: () => goldCorrelations(0o2011, 0o3515, SHIFTS, family) },
    ];
    for (const { run } of contenders) for (let call = 0; call < WARM_UP; call++) run();
    return {
      contenders,
      differences: (ours, reference) => {
        const values = Int16Array.from(reference as number[]);
        return (ours as Int16Array[]).flatMap((mine, n) => {
          const wrong = mine.reduce((sum, value, at) => sum + (value === values[at] ? 0 : 1), 0);
          return wrong === 0 && mine.length === values.length
            ? []
            : [`contender ${n + 1}: ${wrong} of ${VALUES} differ`];
        });
      },
    };
  },
};

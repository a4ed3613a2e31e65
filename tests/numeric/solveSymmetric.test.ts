import { expect, test } from "vitest";
import { seededRandom } from "@/lib/numeric/random";
import { solveSymmetric } from "@/lib/numeric/solveSymmetric";
import { expectNear } from "@/tests/support/expectNear";

test("the solution put back into the equations gives their right side", () => {
  const random = seededRandom("61".repeat(32), "solve");
  for (const size of [1, 2, 5, 9]) {
    const factor = Array.from({ length: size }, () => Float64Array.from({ length: size }, () => random.gaussian()));
    const matrix = factor.map((row) =>
      Float64Array.from(factor, (other) => row.reduce((sum, v, n) => sum + v * other[n], 0)),
    );
    const right = Float64Array.from({ length: size }, () => random.gaussian());
    const x = solveSymmetric(matrix, right);
    matrix.forEach((row, n) =>
      expectNear(
        row.reduce((sum, value, k) => sum + value * x[k], 0),
        right[n],
        1e-6,
        `equation ${n} of ${size}`,
      ),
    );
  }
});

// Written down by hand: 4x + 2y = 2, 2x + 3y = 5.
test("two equations", () => {
  const [x, y] = solveSymmetric([Float64Array.from([4, 2]), Float64Array.from([2, 3])], Float64Array.from([2, 5]));
  expectNear(x, -0.5, 1e-12, "x");
  expectNear(y, 2, 1e-12, "y");
});

test("an unknown that says the same as another is left at zero", () => {
  const ones = () => Float64Array.from([1, 1]);
  expect([...solveSymmetric([ones(), ones()], Float64Array.from([3, 3]))]).toEqual([3, 0]);
});

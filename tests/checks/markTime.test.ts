import { expect, test } from "vitest";
import type { AskedQuantity } from "@/lib/checks/askedQuantities";
import { markTime } from "@/lib/checks/markTime";

const quantity: AskedQuantity = {
  id: "start",
  label: "Start",
  unit: "s",
  choices: [],
  tolerance: 30,
  critical: false,
  reason: "",
};
const row = (typed: string, computedS: number | null) => markTime({ quantity, typed, computedS, toleranceS: 30 });

test.each([
  ["14:03:30", 50_610, true, 0],
  ["14:04:00", 50_610, true, 1],
  ["14:03:00", 50_610, true, -1],
  ["14:04:01", 50_610, false, 31 / 30],
  ["23:59:50", 10, true, -20 / 30],
  ["00:00:10", 86_390, true, 20 / 30],
])("%s for %i s of the day", (typed, computedS, within, offByTolerances) => {
  const marked = row(typed, computedS);
  expect(marked).toMatchObject({ within, offByTolerances: expect.closeTo(offByTolerances, 9) });
  if (!within) expect(marked.reason).toBe("Your time is 31\u00a0s after the computed one; 30\u00a0s is allowed.");
});

test.each([
  ["none", null, true, null],
  ["14:03:30", null, false, "There is no such time in this log."],
  ["", null, false, "Nothing was handed in."],
  ["none", 50_610, false, "There is such a time: 14:03:30."],
])("%j where the answer is %s", (typed, computedS, within, reason) =>
  expect(row(typed, computedS)).toMatchObject({ within, reason, offByTolerances: null }),
);

test("both times are shown as times", () =>
  expect(row("140400", 50_610)).toMatchObject({ understood: "14:04:00", computed: "14:03:30", handedIn: "140400" }));

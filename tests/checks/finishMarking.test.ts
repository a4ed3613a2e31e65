import { expect, test } from "vitest";
import type { AskedQuantity } from "@/lib/checks/askedQuantities";
import { finishMarking } from "@/lib/checks/finishMarking";
import type { MarkedRow } from "@/lib/checks/kind";
import { markWord } from "@/lib/checks/markWord";
import { satellites } from "@/lib/checks/satellites/satellites";
import { planOf } from "./planOf";

const quantity = (id: string, critical: boolean): AskedQuantity => ({
  id,
  label: id,
  unit: null,
  choices: [],
  tolerance: NaN,
  critical,
  reason: "",
});
const asked = new Map([quantity("a", true), quantity("b", false), quantity("c", false)].map((one) => [one.id, one]));
const row = (id: string, within: boolean): MarkedRow =>
  markWord({
    quantity: quantity(id, false),
    handedIn: "",
    computed: "",
    finding: within ? null : { errorClass: null, reason: "outside" },
  });
const finish = (rows: MarkedRow[], needs: number | null, uncounted: MarkedRow[] = []) =>
  finishMarking(satellites, { ...planOf(satellites), needs }, asked, rows, [], new Set(uncounted));

test("names the marking with its version", () => expect(finish([], null).marking).toBe("satellites@1"));

test("needs all where the plan says nothing", () => {
  expect(finish([row("a", true), row("b", true), row("c", true)], null)).toMatchObject({
    needs: 3,
    withinCount: 3,
    met: true,
  });
  expect(finish([row("a", true), row("b", true), row("c", false)], null)).toMatchObject({ withinCount: 2, met: false });
});

test("enough of them do, unless a critical one is outside", () => {
  expect(finish([row("a", true), row("b", true), row("c", false)], 2).met).toBe(true);
  expect(finish([row("a", false), row("b", true), row("c", true)], 2).met).toBe(false);
});

test("a quantity with one row outside is outside, one without a row too", () => {
  const marking = finish([row("a", true), row("a", false), row("b", true)], 1);
  expect(marking.quantities.map(({ within }) => within)).toEqual([false, true, false]);
});

test("a row that does not count is shown and changes nothing", () => {
  const extra = row("b", false);
  const marking = finish([row("a", true), row("b", true), row("c", true), extra], null, [extra]);
  expect(marking.rows).toContain(extra);
  expect(marking.met).toBe(true);
});

test("never needs more than there is", () =>
  expect(finish([row("a", true), row("b", true), row("c", true)], 9).met).toBe(true));

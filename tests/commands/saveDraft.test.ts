import { beforeEach, describe, expect, test } from "vitest";
import { saveDraft } from "@/lib/commands/saveDraft";
import { ConflictError, InvalidError } from "@/lib/errors";
import { makeModule } from "../support/chain";
import { NOW } from "../support/clock";
import { makeActor, makeFirm, type Firm } from "../support/factories";
import { ownerRows } from "../support/owner";
import { expectNothingLeft, rowsOf } from "../support/written";
import { refusals } from "./refusals";

let firm: Firm;
let other: Firm;
let moduleId: string;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  moduleId = (await makeModule(firm, { source: "As it was." })).id;
});
const text = (source: string, revision = 1) => ({ moduleId, title: "Prove a satellite", source, revision });
const source = async () => (await rowsOf<{ source: string }>("drafts"))[0]!.source;

test("keeps the text with who wrote it, and counts the revision up", async () => {
  const second = await makeActor(firm.employer, ["lead"]);
  const saved = await saveDraft(second, { ...text("A new sentence."), title: "Another title" }, NOW);
  expect(saved).toEqual({ revision: 2, savedAt: NOW.toISOString() });
  expect(await rowsOf("drafts")).toEqual([
    {
      ...{ module_id: moduleId, title: "Another title", source: "A new sentence.", revision: 2 },
      ...{ saved_by: second.personId, saved_at: NOW },
    },
  ]);
  const writers = await ownerRows<{ person_id: string }>("SELECT person_id FROM draft_writers WHERE module_id = $1", [
    moduleId,
  ]);
  expect(writers.map((writer) => writer.person_id).sort()).toEqual([firm.lead.personId, second.personId].sort());
});

test("keeps a text that is full of faults", async () => {
  await saveDraft(firm.lead, text("<Nothing like={this}"), NOW);
  expect(await source()).toBe("<Nothing like={this}");
});

test("run twice, the same text is kept once", async () => {
  const first = await saveDraft(firm.lead, text("Once."), NOW);
  expect(await saveDraft(firm.lead, text("Once."), NOW)).toEqual(first);
});

test("never overwrites a text that the writer has not seen", async () => {
  await saveDraft(firm.lead, text("First."), NOW);
  const second = await makeActor(firm.employer, ["lead"]);
  await expect(saveDraft(second, text("Second."), NOW)).rejects.toBeInstanceOf(ConflictError);
  expect(await source()).toBe("First.");
  expect(await ownerRows("SELECT 1 FROM draft_writers WHERE person_id = $1", [second.personId])).toEqual([]);
});

test("two writers at once: one text is kept, the other is told", async () => {
  const second = await makeActor(firm.employer, ["lead"]);
  const both = await Promise.allSettled([
    saveDraft(firm.lead, text("First."), NOW),
    saveDraft(second, text("Second."), NOW),
  ]);
  expect(both.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
  expect(await source()).toBe(both[0]!.status === "fulfilled" ? "First." : "Second.");
});

// A source is at most 64 KiB. One letter may take more than a byte.
test.each([
  ["65 536 bytes are kept", "é".repeat(32_768), true],
  ["65 538 bytes in fewer letters are refused", "é".repeat(32_769), false],
])("%s", async (_what, long, kept) => {
  const saving = saveDraft(firm.lead, text(long), NOW);
  if (kept) await expect(saving).resolves.toMatchObject({ revision: 2 });
  else await expect(saving).rejects.toBeInstanceOf(InvalidError);
});

test("an autosave is no entry of the trail", async () => {
  const before = await rowsOf("trail_entries");
  await saveDraft(firm.lead, text("A new sentence."), NOW);
  expect(await rowsOf("trail_entries")).toEqual(before);
});

test("a failure at the end leaves the text as it was", () =>
  expectNothingLeft("drafts", () => saveDraft(firm.lead, text("Lost."), NOW)));

describe("refusals", () =>
  refusals({
    allowed: "lead",
    setting: () => ({ firm, other, id: moduleId }),
    act: (actor, id) => saveDraft(actor, { ...text("Overwritten."), moduleId: id }, NOW),
  }));

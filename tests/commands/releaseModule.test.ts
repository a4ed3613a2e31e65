import { createHash } from "node:crypto";
import { readFileSync } from "node:fs";
import path from "node:path";
import { beforeEach, describe, expect, test, vi } from "vitest";
import { nextNumber, releaseModule } from "@/lib/commands/releaseModule";
import { saveDraft } from "@/lib/commands/saveDraft";
import { readModule } from "@/lib/mdx/readModule";
import { makeModule } from "../support/chain";
import { makeActor, makeFirm, type Firm } from "../support/factories";
import { owner, ownerRows } from "../support/owner";
import { makeReleaseChecks } from "../support/releaseChecks";
import { everythingStored, expectNothingLeft, rowsOf, trailOf, waitForWaiting } from "../support/written";
import { refusals } from "./refusals";

// The reader starts a thread of its own for every text.
vi.setConfig({ testTimeout: 90_000 });

const SOURCE = readFileSync(path.resolve(import.meta.dirname, "../../content/modules/sbw-r2.mdx"), "utf8");
const CODE = "SBW-R2";
const { checks: plans } = await readModule(SOURCE);

let firm: Firm;
let other: Firm;
let moduleId: string;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  moduleId = (await makeModule(firm, { code: CODE, source: SOURCE })).id;
  await makeReleaseChecks(plans);
});
type Order = Parameters<typeof releaseModule>[1];
const order = (revision = 1, kind: Order["kind"] = "minor"): Order => ({
  ...{ moduleId, revision, kind, reason: "because", outside: { checks: {}, sitting: "" } },
});
const change = (revision: number, more: string, who = firm.lead) =>
  saveDraft(who, { moduleId, title: "Prove it", source: `${SOURCE}\n${more}\n`, revision });

type Release = { id: string; number: string; kind: string; source: string; fingerprint: string };
type Stored = Release & { title: string; front_matter: object; checks: { id: string }[]; tree: { type: string } };
const numbers = async () =>
  (await ownerRows<Release>("SELECT number, kind FROM releases ORDER BY released_at")).map(
    ({ number, kind }) => `${number} ${kind}`,
  );

test("freezes text, front matter, checks and tree of the draft under number 1.0", async () => {
  const { id, number, fingerprint } = await releaseModule(firm.lead, order(1, "major"));
  expect(number).toBe("1.0");
  const [stored] = await rowsOf<Stored>("releases");
  expect(stored).toMatchObject({
    ...{ id, module_id: moduleId, employer_id: firm.employer.id, number: "1.0", kind: "first", fingerprint },
    ...{ title: "Prove which satellites you really have", source: SOURCE, reason: "because" },
    released_by: firm.lead.personId,
  });
  expect(stored!.front_matter).toMatchObject({ code: CODE, sitting: { days: 30, freshCases: 1, waitHours: 24 } });
  expect(stored!.checks.map((check) => check.id)).toEqual([
    "reading",
    "plan",
    "satellites",
    "false-lock",
    "side-peak",
    "cn0",
  ]);
  expect(stored!.tree.type).toBe("root");
});

test("the fingerprint can be worked out again from what is stored", async () => {
  await releaseModule(firm.lead, order());
  const [{ front_matter: frontMatter, ...stored }] = (await rowsOf<Stored>("releases")) as [Stored];
  const { number, source, checks } = stored;
  const record = { schema: "lagmark-release-1", employer: firm.employer.slug, code: CODE };
  const text = sorted({ ...record, number, source, frontMatter, checks });
  expect(stored.fingerprint).toBe(createHash("sha256").update(text).digest("hex"));
});

test("numbers count up: 1.0, editorial and minor 1.1 and 1.2, major 2.0", async () => {
  await releaseModule(firm.lead, order(1));
  await change(1, "One.");
  await releaseModule(firm.lead, order(2, "editorial"));
  await change(2, "Two.");
  await releaseModule(firm.lead, order(3, "minor"));
  await change(3, "Three.");
  await releaseModule(firm.lead, order(4, "major"));
  expect(await numbers()).toEqual(["1.0 first", "1.1 editorial", "1.2 minor", "2.0 major"]);
  const prints = (await rowsOf<Release>("releases")).map(({ fingerprint }) => fingerprint);
  expect(new Set(prints).size).toBe(4);
});

test("the tenth minor release is 1.10 and not 2.0", () => {
  expect(nextNumber("1.9", "minor")).toBe("1.10");
  expect(nextNumber("1.10", "editorial")).toBe("1.11");
  expect(nextNumber("9.4", "major")).toBe("10.0");
});

test("an earlier release stays as it was when the draft goes on", async () => {
  await releaseModule(firm.lead, order());
  await change(1, "Later.");
  expect((await rowsOf<Release>("releases"))[0]!.source).toBe(SOURCE);
});

test("names everybody who ever saved the text, and who released it", async () => {
  const second = await makeActor(firm.employer, ["lead"]);
  await change(1, "By another.", second);
  await releaseModule(firm.lead, order(2));
  const hands = await ownerRows("SELECT person_id, part FROM release_writers ORDER BY part, person_id");
  const wrote = [firm.lead.personId, second.personId].sort().map((person_id) => ({ person_id, part: "wrote" }));
  expect(hands).toEqual([{ person_id: firm.lead.personId, part: "released" }, ...wrote]);
});

test("stands in the trail with who released it and for which firm", async () => {
  const { id } = await releaseModule(firm.lead, order());
  const employer = firm.employer.id;
  const hand = (part: string) => `${id}/${firm.lead.personId}/${part}`;
  const relied = await ownerRows<{ id: string }>("SELECT id FROM released_checks ORDER BY check_id NULLS LAST");
  const entries = await trailOf(firm.lead);
  expect(entries.filter(({ act }) => act !== "released_checks added")).toEqual([
    { act: "releases added", employer, key: id },
    { act: "release_writers added", employer, key: hand("wrote") },
    { act: "release_writers added", employer, key: hand("released") },
  ]);
  const kept = entries.filter(({ act }) => act === "released_checks added");
  expect(kept.map(({ key }) => key).sort()).toEqual(relied.map((row) => row.id).sort());
});

describe("refuses", () => {
  const refused = async (given: Order, message: RegExp) => {
    const before = await everythingStored();
    await expect(releaseModule(firm.lead, given)).rejects.toMatchObject({
      name: expect.stringMatching(/^(Conflict|Invalid)Error$/),
      publicMessage: expect.stringMatching(message),
    });
    expect(await everythingStored()).toEqual(before);
  };

  test("a draft that has not changed since the last release", async () => {
    await releaseModule(firm.lead, order());
    await refused(order(1, "major"), /^Nothing changed since release 1\.0\.$/);
  });

  test("a draft with an error in it, and says how many there are", async () => {
    await change(1, "<Unknown />");
    await refused(order(2), /^1 error to fix first\.$/);
    await change(2, "<Unknown />\n\n<Other />");
    await refused(order(3), /^2 errors to fix first\.$/);
  });

  test("a text of another module's code", async () => {
    const source = SOURCE.replace("code: SBW-R2", "code: SBW-R9");
    await saveDraft(firm.lead, { moduleId, title: "Prove it", source, revision: 1 });
    await refused(order(2), /SBW-R9.*this module is SBW-R2/);
  });

  test("a draft that was changed since it was looked at", async () => {
    await change(1, "Not looked at.");
    await refused(order(1), /changed meanwhile/);
  });

  test("a draft that is changed while its text is being read", async () => {
    const writer = await owner.connect();
    await writer.query("BEGIN");
    await writer.query("UPDATE drafts SET source = source || ' ', revision = 2 WHERE module_id = $1", [moduleId]);
    const release = releaseModule(firm.lead, order(1)).catch((error: Error) => error);
    await waitForWaiting();
    await writer.query("COMMIT");
    writer.release();
    expect(await release).toMatchObject({ name: "ConflictError" });
    expect(await rowsOf("releases")).toEqual([]);
  });

  test("a second press of the same key, also at once", async () => {
    const both = await Promise.allSettled([releaseModule(firm.lead, order()), releaseModule(firm.lead, order())]);
    expect(both.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    expect(both.find((one) => one.status === "rejected")?.reason).toMatchObject({ name: "ConflictError" });
    expect(await numbers()).toEqual(["1.0 first"]);
  });

  test("whoever may not release, before it says a word about the text", async () => {
    await change(1, "<Unknown />");
    await expect(releaseModule(firm.technician, order(2))).rejects.toMatchObject({ name: "ForbiddenError" });
  });

  refusals({
    allowed: "lead",
    setting: () => ({ firm, other, id: moduleId }),
    act: (actor, id) => releaseModule(actor, { ...order(), moduleId: id }),
  });
});

test("a failure at the end leaves no release", () =>
  expectNothingLeft("release_writers", () => releaseModule(firm.lead, order())));

/** JSON by RFC 8785 as far as a release needs it: sorted names and nothing between the parts. */
function sorted(value: unknown): string {
  if (typeof value !== "object" || value === null) return JSON.stringify(value);
  if (Array.isArray(value)) return `[${value.map(sorted).join()}]`;
  const members = Object.entries(value).filter(([, member]) => member !== undefined);
  members.sort(([a], [b]) => (a < b ? -1 : 1));
  return `{${members.map(([name, member]) => `${JSON.stringify(name)}:${sorted(member)}`).join()}}`;
}

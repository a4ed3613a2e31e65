import { beforeEach, expect, test, vi } from "vitest";
import { releaseModule } from "@/lib/commands/releaseModule";
import { readModule } from "@/lib/mdx/readModule";
import { makeModule } from "../support/chain";
import { makeFirm, type Firm } from "../support/factories";
import { ownerRows } from "../support/owner";
import { makeReleaseCheck } from "../support/releaseChecks";
import { everythingStored } from "../support/written";
import { TWO_CHECKS } from "../support/twoChecks";

// The reader starts a thread of its own for every text.
vi.setConfig({ testTimeout: 90_000 });

const { checks: plans } = await readModule(TWO_CHECKS);
const GUESSED = { guess: { tried: 10_000, met: 500 } };

let firm: Firm;
let moduleId: string;
beforeEach(async () => {
  firm = await makeFirm();
  moduleId = (await makeModule(firm, { code: "TWO-1", source: TWO_CHECKS })).id;
});
const release = (outside: { checks?: Record<string, string>; sitting?: string } = {}) =>
  releaseModule(firm.lead, {
    ...{ moduleId, revision: 1, kind: "minor", reason: "because" },
    outside: { checks: {}, sitting: "", ...outside },
  });
const relied = () =>
  ownerRows<object>(
    `SELECT check_id, release_check_id IS NOT NULL AS checked, within, reason FROM released_checks ORDER BY check_id NULLS LAST`,
  );
async function refused(act: () => Promise<unknown>, name: string, message: RegExp) {
  const before = await everythingStored();
  await expect(act()).rejects.toMatchObject({ name, publicMessage: expect.stringMatching(message) });
  expect(await everythingStored()).toEqual(before);
}

test("refuses while a check has no finished release check, and names it", async () => {
  await refused(release, "ConflictError", /^The release check of "list", "lock" has not finished\.$/);
  await makeReleaseCheck(plans[0]!);
  await refused(release, "ConflictError", /^The release check of "lock" has not finished\.$/);
});

test("a look at fewer cases permits nothing", async () => {
  await makeReleaseCheck(plans[0]!);
  const { fingerprint } = await makeReleaseCheck(plans[1]!);
  await ownerRows("ALTER TABLE release_checks DISABLE TRIGGER release_checks_kept");
  await ownerRows("DELETE FROM release_checks WHERE fingerprint = $1", [fingerprint]);
  await ownerRows("ALTER TABLE release_checks ENABLE TRIGGER release_checks_kept");
  await ownerRows(
    `INSERT INTO release_check_runs (fingerprint, preview, plan, employer_id, asked_by, asked_at, tried, finished_at)
     VALUES ($1, true, $2, $3, $4, now(), 200, now())`,
    [fingerprint, JSON.stringify(plans[1]), firm.employer.id, firm.lead.personId],
  );
  await refused(release, "ConflictError", /"lock" has not finished/);
});

test("a result of another parameter or tolerance is no result of this check", async () => {
  await makeReleaseCheck(plans[0]!);
  await makeReleaseCheck({ ...plans[1]!, parameters: { ...(plans[1]!.parameters as object), decoy: 49 } });
  await refused(release, "ConflictError", /"lock" has not finished/);
});

test("keeps what the release relied on, check by check and for the sitting", async () => {
  for (const plan of plans) await makeReleaseCheck(plan);
  await release();
  expect(await relied()).toEqual([
    { check_id: "list", checked: true, within: true, reason: "" },
    { check_id: "lock", checked: true, within: true, reason: "" },
    { check_id: null, checked: false, within: true, reason: "" },
  ]);
});

test("outside a bound it asks for a reason, and keeps it", async () => {
  await makeReleaseCheck(plans[0]!, { read: { tried: 1000, met: 940 } });
  await makeReleaseCheck(plans[1]!);
  await refused(release, "InvalidError", /^Outside its bounds: "list"\. Give a reason/);
  await refused(() => release({ checks: { list: "  " } }), "InvalidError", /"list"/);
  await refused(() => release({ checks: { lock: "Not this one." } }), "InvalidError", /"list"/);
  // A name that every object inherits is no reason.
  await refused(() => release({ checks: JSON.parse('{"toString":"x"}') }), "InvalidError", /"list"/);
  await release({ checks: { list: " Read by two people until the form is mended. ", lock: "Not asked." } });
  expect(await relied()).toMatchObject([
    { check_id: "list", within: false, reason: "Read by two people until the form is mended." },
    { check_id: "lock", within: true, reason: "" },
    { check_id: null, within: true },
  ]);
});

test("a sitting that guessing could meet asks for a reason of its own", async () => {
  for (const plan of plans) await makeReleaseCheck(plan, GUESSED);
  const checks = { list: "A first edition.", lock: "A first edition." };
  await refused(() => release({ checks }), "InvalidError", /^Outside its bounds: the sitting as a whole\./);
  await release({ checks, sitting: "Decided with the log of the day beside it." });
  expect((await relied()).at(-1)).toMatchObject({
    check_id: null,
    within: false,
    reason: "Decided with the log of the day beside it.",
  });
});

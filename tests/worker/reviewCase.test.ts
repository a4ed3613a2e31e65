import { beforeEach, expect, test } from "vitest";
import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { sealSecret } from "@/lib/commands/caseSecret";
import { EngineDiffersError } from "@/lib/commands/computeMarking";
import { plainTruth } from "@/lib/commands/plainTruth";
import { reportProgress } from "@/lib/commands/reportProgress";
import { reviewCase } from "@/lib/commands/reviewCase";
import { makeMarkingRecord } from "../support/chain";
import { NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { insert } from "../support/owner";
import { makeReview, MARKING } from "../support/reviews";
import { builtCase, FakeEngine } from "./fake-engine";
import { rowsOf, SEED_KEY } from "./tools";

const SEED = "5e".repeat(32);
let firm: Firm;
let record: Awaited<ReturnType<typeof makeMarkingRecord>>;
let given: { reviewId: string; caseId: string };
beforeEach(async () => {
  firm = await makeFirm();
  record = await makeMarkingRecord(firm);
  const { caseId } = record;
  given = { reviewId: (await makeReview(firm)).id, caseId };
  const truth = plainTruth(builtCase(SEED).truth);
  const sealed = sealSecret({ seedHex: SEED, truth }, caseId, SEED_KEY);
  await insert("case_secrets", { caseId, sealed, truthSha256: fingerprintOf(truth), engineVersion: "1.0.0" });
});
const review = (engine: FakeEngine) => reviewCase(given, { engine, seedKey: SEED_KEY }, () => NOW);
const engine = (over: ConstructorParameters<typeof FakeEngine>[0] = {}) => new FakeEngine({ name: MARKING, ...over });

test("keeps what the corrected marking says beside the record, and adds no record", async () => {
  await reportProgress(given.caseId, "review-case", { step: "acquiring", done: 3, total: 32 });
  expect(await review(engine({ met: false }))).toBe("reviewed");
  expect(await rowsOf("review_findings")).toMatchObject([
    {
      ...{ review_id: given.reviewId, case_id: given.caseId, record_id: record.id, met_before: true, met: false },
      changed_rows: [
        { label: expect.any(String), before: expect.stringMatching(/^within/), now: expect.stringMatching(/^outside/) },
      ],
      ...{ marking: { marking: MARKING, met: false }, found_at: NOW },
    },
  ]);
  expect(await rowsOf("marking_records")).toHaveLength(1);
  expect(await rowsOf("mails")).toEqual([]);
  expect(await rowsOf("progress")).toEqual([]);
});

test("run twice, also at once, the first finding stays", async () => {
  await Promise.all([review(engine()), review(engine())]);
  const unused = engine({ met: false });
  expect(await review(unused)).toBe("was reviewed");
  expect(unused.seeds).toEqual([]);
  expect(await rowsOf("review_findings")).toMatchObject([{ met: true, changed_rows: [] }]);
});

test("an engine that marks by another revision, or does not re-create the case, finds nothing", async () => {
  await expect(review(new FakeEngine())).rejects.toThrow(/asked for correlator-reading@1\.2/);
  await expect(review(engine({ truth: { lagChips: 1 } }))).rejects.toThrow(EngineDiffersError);
  expect(await rowsOf("review_findings")).toEqual([]);
});

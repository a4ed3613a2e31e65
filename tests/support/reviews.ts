import type { ChangedRow } from "@/lib/checks/changedRows";
import type { Correction } from "@/lib/checks/corrections";
import type { Given, Row } from "./chain";
import { NOW } from "./clock";
import type { Firm } from "./factories";
import { insert, ownerRows } from "./owner";
import { LAG, markedRow } from "./samples";

/** No kind of the product has been corrected: this is the tests' own. */
export const REASON = "The side of the highest cell was taken for its middle.";
export const MARKING = "correlator-reading@1.2";
const refuse = () => {
  throw new Error("the correction of the tests computes nothing");
};
export const CORRECTION: Correction = {
  ...{ kind: "correlator-reading", version: 1, revision: 2, reason: REASON, mark: refuse, judge: refuse },
};

export const makeReview = (firm: Firm, over: { cases?: number } = {}) =>
  insert<Row>("marking_reviews", {
    ...{ employerId: firm.employer.id, kind: "correlator-reading", kindVersion: 1, marking: MARKING, reason: REASON },
    ...{ cases: 1, askedBy: firm.lead.personId, askedAt: NOW, ...over },
  });

/** What the corrected marking says of a case with a record, against its newest one. */
export async function makeFinding(
  given: { review: Row; record: Row<{ caseId: string; met: boolean }>; met: boolean } & Given<
    object,
    { changedRows: ChangedRow[] }
  >,
) {
  const { review, record, met } = given;
  const { changedRows = met === record.met ? [] : [{ label: LAG, before: "outside", now: "within" }] } = given;
  return insert<Row>("review_findings", {
    ...{ reviewId: review.id, caseId: record.caseId, recordId: record.id, metBefore: record.met, met, changedRows },
    marking: {
      ...{ marking: MARKING, rows: [markedRow(met)], needs: 1, withinCount: met ? 1 : 0, met, workings: [] },
      quantities: [{ of: "lag", label: LAG, critical: false, within: met }],
    },
    ...{ engineVersion: "1.0.0", durationMs: 40, foundAt: NOW },
  });
}

export const recordsOf = (caseId: string) =>
  ownerRows<{ id: string; sequence: number; marking: string; met: boolean; reason: string }>(
    "SELECT id, sequence, marking, met, reason FROM marking_records WHERE case_id = $1 ORDER BY sequence",
    [caseId],
  );

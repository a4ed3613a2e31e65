import { expect, test } from "vitest";
import { getAssignment } from "@/lib/queries/getAssignment";
import { getCase } from "@/lib/queries/getCase";
import { getCaseProgress } from "@/lib/queries/getCaseProgress";
import { getCertificate } from "@/lib/queries/getCertificate";
import { getCounter, getOrder } from "@/lib/queries/getCounter";
import { getDecisionDesk } from "@/lib/queries/getDecisionDesk";
import { getJudging } from "@/lib/queries/getJudging";
import { getMarkingRecord } from "@/lib/queries/getMarkingRecord";
import { getModule } from "@/lib/queries/getModule";
import { getPublicVerification } from "@/lib/queries/getPublicVerification";
import { getRelease } from "@/lib/queries/getRelease";
import { getReleaseStatistics } from "@/lib/queries/getReleaseStatistics";
import { getSitting } from "@/lib/queries/getSitting";
import { listCertificates } from "@/lib/queries/listCertificates";
import { listJudging } from "@/lib/queries/listJudging";
import { listCertificateReviews } from "@/lib/queries/listCertificateReviews";
import { listCorrections } from "@/lib/queries/listCorrections";
import { listModules } from "@/lib/queries/listModules";
import { listPeople } from "@/lib/queries/listPeople";
import { listQueue } from "@/lib/queries/listQueue";
import { listQuestions } from "@/lib/queries/listQuestions";
import { listRecords } from "@/lib/queries/listRecords";
import { listSittings } from "@/lib/queries/listSittings";
import { listTrail } from "@/lib/queries/listTrail";
import { makeMarkingRecord } from "../support/chain";
import { minutesFrom, NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { CORRECTION, makeFinding, makeReview } from "../support/reviews";
import { expectPlain, shapeOf } from "./shape";
import { makeWholeChain, type WholeChain } from "./wholeChain";

type View = {
  run: (firm: Firm, chain: WholeChain) => Promise<unknown>;
  /** Every field a page gets, and no other; `*` marks what is handed on as it was stored. */
  fields: string;
};
const FEE = (path: string) =>
  "amountMinor caseDrawn code currency dueAt id orderId release settledAt technician title"
    .split(" ")
    .map((name) => `${path}.${name}`)
    .join(" ");
const ORDER = (path: string) =>
  "amountMinor checkoutUrl closedAt currency fees id orderedAt orderedBy paidAt"
    .split(" ")
    .map((name) => `${path}.${name}`)
    .join(" ");

const VIEWS: Record<string, View> = {
  getAssignment: {
    run: ({ technician }, { assignment }) => getAssignment(technician, assignment.id),
    fields: `assignedBy checkCards* checks* code dueOn feeSettled fingerprint frontMatter* id isMine release sittingId
      technician title tree*`,
  },
  getCase: {
    run: ({ technician }, { open }) => getCase(technician, open.id, NOW),
    fields: `answers* brief byClock code endsAt files[].mediaType files[].name files[].sha256 files[].sizeBytes handedInAt id
      number ofCases openedAt plan.id plan.kind plan.minutes plan.title revision savedAt serverNow sittingId sittingNumber
      state title view*`,
  },
  getCaseProgress: {
    run: ({ technician }, { open }) => getCaseProgress(technician, open.id),
    fields: "done fault state step total",
  },
  getCertificate: {
    run: ({ technician }, { certificate }) => getCertificate(technician, certificate.number, NOW),
    fields: `effectiveOn employerId fingerprint history[].ground history[].reason history[].setAt history[].setBy
      history[].standing holder isMine issuedAt lastDay maySetStanding number record* shown sittingId stored`,
  },
  getCounter: {
    run: ({ administrator }) => getCounter(administrator),
    fields: `${FEE("due[]")} ${FEE("settled[]")} ${ORDER("orders[]")}`,
  },
  getOrder: {
    run: ({ administrator }, { order }) => getOrder(administrator, order.id),
    fields: `${FEE("fees[]")} ${ORDER("order")}`,
  },
  getDecisionDesk: {
    run: ({ decider, lead }, { sitting }) =>
      Promise.all(
        [decider, { ...lead, roles: ["decider" as const] }].map((who) => getDecisionDesk(who, sitting.id, NOW)),
      ),
    fields: `[].bars[] [].decidability.decidable [].decidability.requirementMet [].exposureNote [].isMarkedAgain [].mayDecide [].outsideLine
      [].questions[].answer [].questions[].askedAt [].questions[].caseId [].questions[].quantity
      [].questions[].words [].records[].byClock
      [].records[].caseId [].records[].caseNumber [].records[].checkId [].records[].endsAt [].records[].handedInAt
      [].records[].met [].records[].needs [].records[].openedAt [].records[].quantities* [].records[].rows*
      [].records[].withinCount [].records[].words [].releasedOutside[].checkId [].releasedOutside[].reason [].sitting*`,
  },
  getMarkingRecord: {
    run: ({ technician }, { record }) => getMarkingRecord(technician, record.caseId),
    fields: `byClock captureSha256 caseId caseNumber checkId checkTitle code durationMs engineVersion fingerprint
      freshCases handedInAt id isMine judge markedAt marking mayAnswer met moduleTitle needs quantities*
      questions[].answer questions[].answeredAt questions[].answeredBy questions[].askedAt questions[].id questions[].quantity questions[].words reason records[].markedAt
      records[].marking records[].met records[].sequence release rows* sequence sittingId sittingNumber
      sittingState technician withinCount words workings*`,
  },
  getModule: {
    run: ({ lead }, { module }) => getModule(lead, module.id),
    fields: `code completions* id releases[].fingerprint releases[].id releases[].isDraft releases[].kind releases[].number
      releases[].reason releases[].releasedAt releases[].releasedBy revision savedAt savedBy source title`,
  },
  getPublicVerification: {
    run: (_firm, { certificate }) => getPublicVerification(certificate.number, NOW),
    fields: `cautions[] decided.at decided.outsideLine demonstration effectiveOn fingerprint ground holder identity
      issuedAt issuer.accreditation issuer.name issuer.standing issuer.timeZone lastDay limits number pdfSha256 quantities[].check
      quantities[].critical quantities[].label quantities[].tolerance quantities[].title readAt release.code release.fingerprint release.number
      scheme.code scheme.edition scheme.title scope standing standingSince supervision today`,
  },
  getRelease: {
    run: ({ lead }, { module }) => getRelease(lead, module.id, "1.0"),
    fields: `assigned[].dueOn assigned[].feeSettled assigned[].id assigned[].sittingId assigned[].state
      assigned[].technician checkCards* checks* code fingerprint frontMatter* id kind moduleId number outside[].checkId outside[].reason reason releasedAt
      releasedBy technicians[].id technicians[].name title tree*`,
  },
  getReleaseStatistics: {
    run: ({ lead }, { release }) => getReleaseStatistics(lead, release.id),
    fields: `checks[].bounds.lower checks[].bounds.upper checks[].byClock checks[].cases checks[].checkId
      checks[].discrimination checks[].errors* checks[].fresh.cases checks[].fresh.met checks[].met
      checks[].minutes.lower checks[].minutes.middle checks[].minutes.upper checks[].title leastSittings
      review.day review.sittings sittings`,
  },
  getSitting: {
    run: ({ technician }, { sitting, second, waiting }) =>
      Promise.all([sitting, second, waiting].map(({ id }) => getSitting(technician, id, NOW))),
    fields: `[].certificate [].checkCards* [].checks[].cases[].byClock [].checks[].cases[].endsAt
      [].checks[].cases[].handedInAt [].checks[].cases[].id [].checks[].cases[].met [].checks[].cases[].number
      [].checks[].cases[].openedAt [].checks[].cases[].state [].checks[].met [].checks[].next.caseId
      [].checks[].next.opensAt [].checks[].next.reason [].checks[].next.state [].checks[].plan* [].checks[].required
      [].code [].decidedAt [].decider [].decisionReason [].fingerprint [].frontMatter* [].id [].isMine [].lastDay
      [].moduleId [].number [].outcome [].release [].startedAt [].state [].technician [].title [].tree*`,
  },
  getJudging: {
    run: ({ assessor }, { written }) => getJudging(assessor, written.id),
    fields: `brief byClock caseId caseNumber checkTitle code handedInAt isJudged lines[].critical lines[].label
      lines[].of lines[].text moduleTitle sittingNumber technician words`,
  },
  listJudging: {
    run: ({ assessor }) => listJudging(assessor),
    fields: "[].caseId [].caseNumber [].checkTitle [].code [].handedInAt [].sittingNumber [].technician",
  },
  listQuestions: {
    run: ({ assessor }) => listQuestions(assessor),
    fields: "[].askedAt [].caseId [].checkTitle [].code [].id [].quantity [].sittingNumber [].technician [].words",
  },
  listCertificates: {
    run: ({ lead }) => listCertificates(lead, NOW),
    fields:
      "[].code [].daysLeft [].effectiveOn [].holder [].issuer [].lastDay [].number [].release [].standing [].title",
  },
  listCorrections: {
    run: async (firm, { record }) => {
      const review = await makeReview(firm);
      await makeFinding({ review, record, met: false });
      return listCorrections(firm.lead, [CORRECTION]);
    },
    fields: `[].marking [].older [].reason [].review.askedAt [].review.askedBy [].review.cases
      [].review.changed[].act [].review.changed[].actReason [].review.changed[].actedAt [].review.changed[].actedBy
      [].review.changed[].cases[].caseId [].review.changed[].cases[].changedRows[].before
      [].review.changed[].cases[].changedRows[].label [].review.changed[].cases[].changedRows[].now
      [].review.changed[].cases[].checkId [].review.changed[].cases[].checkTitle [].review.changed[].cases[].met
      [].review.changed[].cases[].metBefore [].review.changed[].cases[].number [].review.changed[].certificate
      [].review.changed[].code [].review.changed[].isMarkedAgain [].review.changed[].number [].review.changed[].outcome
      [].review.changed[].requirement.before [].review.changed[].requirement.now [].review.changed[].sittingId
      [].review.changed[].standing [].review.changed[].technician [].review.changed[].title
      [].review.computed [].review.id [].review.stopped [].review.unchanged [].title`,
  },
  listCertificateReviews: {
    run: async (firm, { record }) => {
      const again = { sequence: 2, reason: "corrected", met: false, markedAt: minutesFrom(NOW, 5) };
      await makeMarkingRecord(firm, { case: { id: record.caseId }, ...again });
      return listCertificateReviews(firm.decider);
    },
    fields: "[].code [].markedAt [].number [].sittingNumber [].technician [].title",
  },
  listModules: {
    run: ({ lead }) => listModules(lead),
    fields: `[].changed [].code [].fingerprint [].id [].number [].openSittings [].releasedAt [].savedAt [].title`,
  },
  listPeople: {
    run: ({ lead }) => listPeople(lead),
    fields: `may.add may.endRole may.grantRole may.recordTraining people[].email people[].id people[].name
      people[].roles[].grantId people[].roles[].grantedOn people[].roles[].outsideLine people[].roles[].role`,
  },
  listQueue: {
    run: ({ decider }) => listQueue(decider),
    fields: `[].checks [].code [].met [].number [].questions [].readyAt [].sittingId [].technician [].title`,
  },
  listRecords: {
    run: ({ decider }) => listRecords(decider),
    fields: `[].caseId [].caseNumber [].checkTitle [].code [].markedAt [].met [].quantityCount [].questions
      [].sittingNumber [].technician [].withinCount`,
  },
  listSittings: {
    run: ({ lead }) => listSittings(lead),
    fields: `[].assignmentId [].certificate [].checks [].code [].dueOn [].lastDay [].marked [].met [].number [].release
      [].sittingId [].startedAt [].state [].technician [].title`,
  },
  listTrail: {
    run: ({ administrator }) => listTrail(administrator, null),
    fields: `[].act [].actor [].at [].id [].linkSha256 [].rowSha256 [].sequence [].subjectKey [].subjectTable`,
  },
};

test.each(Object.entries(VIEWS))("%s gives plain data with its own fields and no other", async (_name, view) => {
  const firm = await makeFirm();
  const given = await view.run(firm, await makeWholeChain(firm));
  const fields = view.fields.split(/\s+/);
  const opaque = fields.filter((field) => field.endsWith("*")).map((field) => field.slice(0, -1));
  expect(shapeOf(given, opaque)).toEqual(fields.map((field) => field.replace("*", "")).sort());
  expectPlain(given);
});

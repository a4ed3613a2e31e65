import { beforeEach, describe, expect, test } from "vitest";
import { ROLES, type Actor, type Role } from "@/lib/policies/actor";
import { checkDraft } from "@/lib/queries/checkDraft";
import { getAssignment } from "@/lib/queries/getAssignment";
import { getCase } from "@/lib/queries/getCase";
import { getCaseFile } from "@/lib/queries/getCaseFile";
import { getCaseProgress } from "@/lib/queries/getCaseProgress";
import { getCertificate, getCertificatePdf, getRegisterEntry } from "@/lib/queries/getCertificate";
import { getCounter, getOrder } from "@/lib/queries/getCounter";
import { getDecisionDesk } from "@/lib/queries/getDecisionDesk";
import { getJudging } from "@/lib/queries/getJudging";
import { getMarkingRecord } from "@/lib/queries/getMarkingRecord";
import { getModule } from "@/lib/queries/getModule";
import { getFailingCase } from "@/lib/queries/getFailingCase";
import { getRelease } from "@/lib/queries/getRelease";
import { getReleaseStatistics } from "@/lib/queries/getReleaseStatistics";
import { getReleaseCheck } from "@/lib/queries/getReleaseCheck";
import { getSitting } from "@/lib/queries/getSitting";
import { listCertificates, listOwnCertificates, listRegister } from "@/lib/queries/listCertificates";
import { listJudging } from "@/lib/queries/listJudging";
import { listModules } from "@/lib/queries/listModules";
import { listQueue } from "@/lib/queries/listQueue";
import { listQuestions } from "@/lib/queries/listQuestions";
import { listRecords } from "@/lib/queries/listRecords";
import { listOwnSittings, listSittings } from "@/lib/queries/listSittings";
import { listTrail } from "@/lib/queries/listTrail";
import { makeModule } from "../support/chain";
import { NOW } from "../support/clock";
import { makeActor, makeFirm, type Firm } from "../support/factories";
import { ownerRows } from "../support/owner";
import { TWO_CHECKS } from "../support/twoChecks";
import { makeWholeChain, type WholeChain } from "./wholeChain";

let firm: Firm;
let other: Firm;
let chain: WholeChain;
let tried: string;
const getFailing = (actor: Actor, id: string) =>
  getFailingCase(actor, id, { checkId: "list", line: "read", n: 0, hand: 0 });
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  chain = await makeWholeChain(firm);
  tried = (await makeModule(firm, { code: "TWO-1", source: TWO_CHECKS })).id;
});

type Outcome = "given" | "none" | "refused";
const outcomeOf = async (asked: Promise<unknown>): Promise<Outcome> => {
  try {
    const found = await asked;
    return found === null || (Array.isArray(found) && found.length === 0) ? "none" : "given";
  } catch (error) {
    if (error instanceof Error && error.name === "ForbiddenError") return "refused";
    throw error;
  }
};
const LEADS: Role[] = ["lead", "administrator"];
const JUDGES: Role[] = ["assessor", "decider"];
const STAFF: Role[] = [...LEADS, ...JUDGES];

/** One row by its id: who of the own firm gets it, and whether the others get nothing or a refusal. */
type OneRow = { ask: (actor: Actor, id: string) => Promise<unknown>; id: () => string; to: Role[]; else: Outcome };
const ONE_ROW: Record<string, OneRow> = {
  getAssignment: { ask: getAssignment, id: () => chain.assignment.id, to: ["technician", ...STAFF], else: "none" },
  getCase: { ask: getCase, id: () => chain.open.id, to: ["technician"], else: "none" },
  getCaseProgress: {
    ask: getCaseProgress,
    id: () => chain.open.id,
    to: ["technician", "lead", ...JUDGES],
    else: "none",
  },
  getSitting: { ask: getSitting, id: () => chain.sitting.id, to: ["technician", ...STAFF], else: "none" },
  getMarkingRecord: {
    ask: getMarkingRecord,
    id: () => chain.record.caseId,
    to: ["technician", "lead", ...JUDGES],
    else: "none",
  },
  getDecisionDesk: { ask: getDecisionDesk, id: () => chain.sitting.id, to: JUDGES, else: "refused" },
  getCertificate: {
    ask: getCertificate,
    id: () => chain.certificate.number,
    to: ["technician", ...STAFF],
    else: "none",
  },
  getCertificatePdf: {
    ask: getCertificatePdf,
    id: () => chain.certificate.number,
    to: ["technician", ...STAFF],
    else: "none",
  },
  getRegisterEntry: { ask: getRegisterEntry, id: () => chain.certificate.number, to: JUDGES, else: "refused" },
  getReleaseCheck: { ask: getReleaseCheck, id: () => chain.module.id, to: ["lead"], else: "none" },
  getFailingCase: { ask: getFailing, id: () => tried, to: ["lead"], else: "refused" },
  getModule: { ask: getModule, id: () => chain.module.id, to: LEADS, else: "refused" },
  getRelease: {
    ask: (actor, id) => getRelease(actor, id, "1.0"),
    id: () => chain.module.id,
    to: LEADS,
    else: "refused",
  },
  getReleaseStatistics: { ask: getReleaseStatistics, id: () => chain.release.id, to: ["lead"], else: "refused" },
  getOrder: { ask: getOrder, id: () => chain.order.id, to: ["administrator"], else: "refused" },
};

describe.each(Object.entries(ONE_ROW))("%s", (_name, { ask, id, to, else: otherwise }) => {
  test("gives it to these roles of the firm and to no other", async () => {
    for (const role of ROLES) {
      expect(await outcomeOf(ask(firm[role], id())), role).toBe(to.includes(role) ? "given" : otherwise);
    }
  });

  test("gives nothing to anybody of another firm, nor for an id that is unknown or none", async () => {
    for (const role of ROLES) expect(await outcomeOf(ask(other[role], id())), role).not.toBe("given");
    for (const wrong of ["00000000-0000-4000-8000-000000000000", "no id", ""]) {
      expect(await outcomeOf(ask(firm[to[0]!], wrong)), wrong).toBe("none");
    }
  });
});

test.each(["getAssignment", "getCase", "getCaseProgress", "getSitting", "getMarkingRecord", "getCertificate"])(
  "%s gives nothing to another technician of the firm",
  async (name) => {
    const second = await makeActor(firm.employer, ["technician"]);
    const { ask, id } = ONE_ROW[name]!;
    expect(await outcomeOf(ask(second, id()))).toBe("none");
  },
);

/** Lists: who may ask; somebody of another firm sees that firm's rows, of which there are none. */
const LISTS: Record<string, { ask: (actor: Actor) => Promise<unknown>; to: Role[] }> = {
  listCertificates: { ask: (actor) => listCertificates(actor, NOW), to: STAFF },
  listRegister: { ask: (actor) => listRegister(actor, NOW), to: JUDGES },
  listModules: { ask: listModules, to: LEADS },
  listQueue: { ask: listQueue, to: JUDGES },
  listQuestions: { ask: listQuestions, to: JUDGES },
  listRecords: { ask: listRecords, to: ["lead", ...JUDGES] },
  listSittings: { ask: listSittings, to: STAFF },
};

test.each(Object.entries(LISTS))("%s is given to these roles, each of its own firm", async (_name, { ask, to }) => {
  for (const role of ROLES) {
    expect(await outcomeOf(ask(firm[role])), role).toBe(to.includes(role) ? "given" : "refused");
    expect(await outcomeOf(ask(other[role])), role).toBe(to.includes(role) ? "none" : "refused");
  }
});

test("own sittings and own certificates are the person's and nobody else's", async () => {
  expect(await listOwnSittings(firm.technician)).toHaveLength(5);
  expect(await listOwnCertificates(firm.technician, NOW)).toHaveLength(1);
  for (const somebody of [firm.lead, other.technician, await makeActor(firm.employer, ["technician"])]) {
    expect(await listOwnSittings(somebody)).toEqual([]);
    expect(await listOwnCertificates(somebody, NOW)).toEqual([]);
  }
});

test("a holder keeps the certificate after leaving, also as somebody of another firm", async () => {
  const { personId } = firm.technician;
  const elsewhere = { ...other.technician, personId };
  for (const holder of [{ ...firm.technician, roles: [] }, elsewhere]) {
    expect(await outcomeOf(getCertificate(holder, chain.certificate.number))).toBe("given");
    expect(await outcomeOf(getCertificatePdf(holder, chain.certificate.number))).toBe("given");
    expect(await listOwnCertificates(holder, NOW)).toHaveLength(1);
  }
});

test("the counter and the trail are the firm's own, and its administrator's alone", async () => {
  for (const role of ROLES.filter((one) => one !== "administrator")) {
    expect(await outcomeOf(getCounter(firm[role])), role).toBe("refused");
    expect(await outcomeOf(listTrail(firm[role], null)), role).toBe("refused");
  }
  expect(await getCounter(other.administrator)).toEqual({ due: [], settled: [], orders: [] });
  const { due, settled } = await getCounter(firm.administrator);
  expect([due.length, settled.length]).toEqual([1, 4]);
  const others = (await listTrail(other.administrator, null)).map(({ subjectTable }) => subjectTable);
  expect(others).toEqual(Array(ROLES.length).fill("role_grants"));
});

test("the trail comes in pages, newest first, without a gap between them", async () => {
  const all = await ownerRows<{ id: string }>(
    "SELECT id::text AS id FROM trail_entries WHERE employer_id = $1 ORDER BY trail_entries.id DESC",
    [firm.employer.id],
  );
  const first = await listTrail(firm.administrator, null);
  expect(first.map(({ id }) => id)).toEqual(all.slice(0, 100).map(({ id }) => id));
  const next = await listTrail(firm.administrator, first[1]!.id);
  expect(next[0]).toEqual(first[2]);
  expect(await listTrail(firm.administrator, "no id")).toEqual(first);
});

test("a draft is read for its writers only", async () => {
  const source = "Nothing yet.";
  for (const role of ROLES.filter((one) => one !== "lead")) {
    await expect(checkDraft(firm[role], chain.module.id, source)).rejects.toMatchObject({ name: "ForbiddenError" });
  }
  await expect(checkDraft(other.lead, chain.module.id, source)).rejects.toMatchObject({ name: "NotFoundError" });
  expect((await checkDraft(firm.lead, chain.module.id, source)).problems.length).toBeGreaterThan(0);
});

describe("a file of a case", () => {
  const ask = (actor: Actor, name = "a.sigmf-data") => getCaseFile(actor, chain.open.id, name);

  test("is nobody's but the technician's while the case is open", async () => {
    for (const role of ROLES.filter((one) => one !== "technician")) expect(await ask(firm[role]), role).toBeNull();
    for (const role of ROLES) expect(await ask(other[role]), role).toBeNull();
    expect(await ask(await makeActor(firm.employer, ["technician"]))).toBeNull();
    expect(await ask(firm.technician, "../a.sigmf-data")).toBeNull();
  });
});

test("a written account is an assessor's to read for judging, and not of who wrote it", async () => {
  const { id } = chain.written;
  for (const role of ROLES) {
    const outcome = role === "assessor" ? "given" : role === "decider" ? "none" : "refused";
    expect(await outcomeOf(getJudging(firm[role], id)), role).toBe(outcome);
    expect(await outcomeOf(listJudging(firm[role])), role).toBe(outcome);
    expect(await outcomeOf(getJudging(other[role], id)), role).not.toBe("given");
    expect(await outcomeOf(listJudging(other[role])), role).not.toBe("given");
  }
  const both = { ...firm.technician, roles: ["technician" as const, "assessor" as const] };
  expect(await getJudging(both, id)).toBeNull();
  expect(await listJudging(both)).toEqual([]);
  for (const wrong of ["no id", chain.record.caseId]) expect(await getJudging(firm.assessor, wrong)).toBeNull();
});

test("a sitting tells nobody the parameters of its checks, where a lead's formulas stand", async () => {
  for (const actor of [firm.technician, firm.decider]) {
    const sitting = await getSitting(actor, chain.sitting.id, NOW);
    expect(sitting?.checks[0]?.plan).not.toHaveProperty("parameters");
  }
});

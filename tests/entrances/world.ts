import { createHash } from "node:crypto";
import { encode } from "next-auth/jwt";
import { kindOf } from "@/lib/checks/registry";
import { ROLES } from "@/lib/policies/actor";
import { storage } from "@/lib/storage/storage";
import { makeCertificate, makeDecision } from "@/tests/support/certified";
import {
  makeAssignment,
  makeMarkingRecord,
  makeModule,
  makeOpenCase,
  makeRelease,
  makeSitting,
  makeWrittenHandIn,
  settleFee,
} from "@/tests/support/chain";
import { makeActor, makeEmployer, makeFirm, makePerson, makeSession } from "@/tests/support/factories";
import { insert, ownerRows } from "@/tests/support/owner";
import { checkPlan } from "@/tests/support/samples";
import { TWO_CHECKS } from "@/tests/support/twoChecks";
import type { Ids, Visitor } from "./visitors";

/** One firm with every record of the chain; put into the database of the running product. */
export async function makeWorld() {
  const firm = await makeFirm();
  const made = await makeModule(firm);
  const release = await makeRelease(firm, { module: made });
  const assignment = await makeAssignment(firm, { release });
  const { orderId } = await settleFee(firm, assignment);
  const sitting = await makeSitting(firm, { assignment });
  const built = kindOf("correlator-reading").build("5e".repeat(32), checkPlan());
  const openCase = await makeOpenCase(firm, { sitting, view: built.publicCase });
  const undecided = await makeSitting(firm, { assignment: await makeAssignment(firm) });
  const marked = await makeMarkingRecord(firm, { sitting: undecided });
  const decided = await makeDecision(firm);
  const certificate = await makeCertificate(firm, { decision: decided });
  const people: Record<Exclude<Visitor, "signed out">, string> = {
    "the technician": firm.technician.sessionId,
    "another technician": (await makeActor(firm.employer, ["technician"])).sessionId,
    lead: firm.lead.sessionId,
    assessor: firm.assessor.sessionId,
    decider: firm.decider.sessionId,
    administrator: firm.administrator.sessionId,
    "every role elsewhere": (await makeActor(await makeEmployer(), [...ROLES])).sessionId,
    operator: (await makeSession((await makePerson({ isOperator: true })).id)).id,
  };
  const ids: Ids = {
    employer: firm.employer.slug,
    module: made.id,
    // Its checks can be tried.
    triedModule: (await makeModule(firm, { code: "TWO-1", source: TWO_CHECKS })).id,
    release: release.number,
    // Not started yet: once it is, its page leads on to the sitting.
    assignment: (await makeAssignment(firm)).id,
    order: orderId,
    openCase: openCase.id,
    file: await storedFile(openCase.id),
    sitting: sitting.id,
    undecided: undecided.id,
    written: (await makeWrittenHandIn(firm)).id,
    record: marked.caseId,
    certificate: certificate.number,
    verification: await signedVerification(certificate.id),
  };
  return { firm, ids, cookies: await cookiesOf(people) };
}
export type World = Awaited<ReturnType<typeof makeWorld>>;

/** Answered to anybody; what a real one holds is tried with the task that signs it. */
async function signedVerification(certificateId: string): Promise<string> {
  const [{ id }] = (await ownerRows<{ id: string }>(SIGNED_VERIFICATION, [certificateId])) as [{ id: string }];
  return id;
}

const SIGNED_VERIFICATION = `
  INSERT INTO verifications (certificate_id, asked_at, pdf, signed_at) VALUES ($1, now(), '%PDF-1.7', now())
  RETURNING id`;

/** A file of the case, put where the running product looks for it. */
async function storedFile(caseId: string): Promise<string> {
  const name = "capture.txt";
  const bytes = Buffer.from("eight samples");
  const storageKey = `entrances/${caseId}`;
  await storage().put(storageKey, bytes, "text/plain");
  const sha256 = createHash("sha256").update(bytes).digest("hex");
  await insert("captures", { caseId, name, storageKey, mediaType: "text/plain", sizeBytes: bytes.length, sha256 });
  return name;
}

/** The cookie each visitor's browser would hold; the sessions are prolonged to the day of the run. */
async function cookiesOf(people: Record<Exclude<Visitor, "signed out">, string>): Promise<Record<Visitor, string>> {
  const sessions = Object.values(people);
  await ownerRows("UPDATE sessions SET expires_at = now() + interval '1 hour' WHERE id = ANY($1)", [sessions]);
  const cookies = { "signed out": "" } as Record<Visitor, string>;
  for (const [visitor, sid] of Object.entries(people)) {
    const value = await encode({ token: { sid }, secret: process.env.NEXTAUTH_SECRET! });
    cookies[visitor as Visitor] = `lagmark-session=${value}`;
  }
  return cookies;
}

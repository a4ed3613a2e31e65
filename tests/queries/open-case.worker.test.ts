import { mkdtempSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { pathToFileURL } from "node:url";
import { beforeAll, beforeEach, expect, test, vi } from "vitest";
import { kindOf } from "@/lib/checks/registry";
import type { BuiltCase, CheckPlan } from "@/lib/checks/kind";
import type { SatellitesTruth } from "@/lib/checks/satellites/drawScene";
import { buildCase } from "@/lib/commands/buildCase";
import { reportProgress, type Report } from "@/lib/commands/reportProgress";
import { getAssignment } from "@/lib/queries/getAssignment";
import { getCase } from "@/lib/queries/getCase";
import { getCaseFile } from "@/lib/queries/getCaseFile";
import { getCaseProgress } from "@/lib/queries/getCaseProgress";
import { getSitting } from "@/lib/queries/getSitting";
import { listOwnSittings } from "@/lib/queries/listSittings";
import { openStorage } from "@/lib/storage/storage";
import { makeAssignment, makeCase, makeRelease, makeSitting } from "../support/chain";
import { NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { insert } from "../support/owner";
import { checkPlan } from "../support/samples";

// A real capture of the real kind is computed, on a machine that may be busy.
vi.setConfig({ testTimeout: 120_000 });

const KIND = kindOf("satellites", 1);
const parameters = Object.fromEntries(KIND.parameters.map((parameter) => [parameter.name, parameter.default]));
const PLAN: CheckPlan = checkPlan({ id: "satellites", kind: KIND.id, title: KIND.title, minutes: 40, parameters });

const folder = pathToFileURL(mkdtempSync(path.join(tmpdir(), "storage-"))).href;
const SEED_KEY = Buffer.alloc(32, 7).toString("base64url");
beforeAll(() => void (process.env.STORAGE_URL = folder));

let firm: Firm;
let ids: { caseId: string; sittingId: string; assignmentId: string };
let drawn: { seedHex: string; built: BuiltCase<SatellitesTruth> };
/** Everything that was sent to the technician, as text. */
let sent: Record<string, string>;

beforeEach(async () => {
  firm = await makeFirm();
  const assignment = await makeAssignment(firm, { release: await makeRelease(firm, { checks: [PLAN] }) });
  const sitting = await makeSitting(firm, { assignment });
  const { id: caseId } = await makeCase(firm, { sitting, checkId: PLAN.id, kind: KIND.id });
  ids = { caseId, sittingId: sitting.id, assignmentId: assignment.id };
  sent = {};
  const reports: Report[] = [];
  const build = async (seedHex: string, plan: CheckPlan) => {
    const built = KIND.build(seedHex, plan, (done, total, step) => reports.push({ done, total, step }));
    drawn = { seedHex, built: built as BuiltCase<SatellitesTruth> };
    // What the worker tells while it builds, every step of it.
    for (const [index, report] of distinct(reports).entries()) {
      await reportProgress(caseId, "build-case", report);
      sent[`progress ${index}`] = JSON.stringify(await getCaseProgress(firm.technician, caseId));
    }
    await collect("building");
    return built;
  };
  const tools = { engine: { build, mark: neverAsked }, storage: openStorage(folder), seedKey: SEED_KEY };
  expect(await buildCase(caseId, tools, () => NOW)).toBe("built");
  await collect("open");
});

async function collect(when: string): Promise<void> {
  const { technician } = firm;
  const { caseId, sittingId, assignmentId } = ids;
  const views = {
    case: await getCase(technician, caseId, NOW),
    progress: await getCaseProgress(technician, caseId),
    sitting: await getSitting(technician, sittingId, NOW),
    sittings: await listOwnSittings(technician),
    assignment: await getAssignment(technician, assignmentId),
  };
  for (const [name, view] of Object.entries(views)) {
    expect(view, name).not.toBeNull();
    sent[`${name}, ${when}`] = JSON.stringify(view);
  }
  for (const { name } of views.case!.files) {
    const file = await getCaseFile(technician, caseId, name);
    sent[`${name}, ${when}`] = Buffer.from(file!.bytes).toString("latin1");
  }
}

test("what an open case sends holds neither its seed nor its truth", () => {
  expectMuchWasSent();
  expectNoSeed();
  expectNoNumberOfTheTruth();
  expectNoSatelliteNamed();
});

function expectMuchWasSent(): void {
  expect(sent["case, building"]).toContain('"state":"building"');
  expect(sent["case, open"]).toContain('"state":"open"');
  expect(JSON.parse(sent["progress 0"]!)).toMatchObject({ state: "building", step: expect.stringMatching(/\w/) });
  const [metadata, samples] = [sent["capture.sigmf-meta, open"]!, sent["capture.sigmf-data, open"]!];
  expect(JSON.parse(metadata).global["core:datatype"]).toBe("ci8");
  // 100 ms of I and Q at one of the kind's rates.
  expect(samples).toHaveLength((JSON.parse(metadata).global["core:sample_rate"] / 10) * 2);
}

function expectNoSeed(): void {
  // However it is written.
  const bytes = Buffer.from(drawn.seedHex, "hex");
  const written = [drawn.seedHex, drawn.seedHex.toUpperCase(), bytes.toString("latin1")];
  for (const form of [...written, bytes.toString("base64"), bytes.toString("base64url")]) {
    // A part of it would be as good.
    const part = form.slice(0, 16);
    for (const [what, text] of Object.entries(sent)) expect(text.includes(part), what).toBe(false);
  }
}

function expectNoNumberOfTheTruth(): void {
  const { scene, clockPpm } = drawn.built.truth;
  const secrets = scene.satellites.flatMap(({ codePhaseChips, dopplerHz, cn0DbHz, carrierPhaseCycles }) => [
    ...[codePhaseChips, dopplerHz, cn0DbHz, carrierPhaseCycles],
  ]);
  expect(secrets.length).toBeGreaterThanOrEqual(4 * 3);
  // Drawn to many places: so many figures in a row do not come by chance.
  const figures = [clockPpm, ...secrets].map((value) => String(Math.abs(value)).slice(0, 8));
  for (const [what, text] of Object.entries(sent)) {
    if (what.startsWith("capture.sigmf-data")) continue;
    for (const figure of figures) expect(text.includes(figure), `${what}: ${figure}`).toBe(false);
    const told = numbersIn(text).filter((number) => secrets.some((secret) => near(secret, number)));
    expect(told, what).toEqual([]);
  }
}

function expectNoSatelliteNamed(): void {
  const { view } = JSON.parse(sent["case, open"]!) as { view: BuiltCase["publicCase"] };
  expect(view.data).toEqual({ captureFile: "capture.sigmf-data", sky: [], ...pick(view.data) });
  expect(JSON.stringify(view)).not.toMatch(/"(prns?|satellites|scene|truth|seed\w*)":/i);
}
const pick = ({ rateHz, samples, windowHz, foundFromDbHz }: Record<string, unknown>) => ({
  ...{ rateHz, samples, windowHz, foundFromDbHz },
});

test("a file of the case is read by the people who assess once it is handed in, and not before", async () => {
  const ask = (who: keyof Omit<Firm, "employer">) => getCaseFile(firm[who], ids.caseId, "capture.sigmf-meta");
  expect(await ask("assessor")).toBeNull();
  await insert("hand_ins", { caseId: ids.caseId, answers: {}, byClock: false, handedInAt: NOW });
  for (const who of ["technician", "lead", "assessor", "decider"] as const) {
    expect((await ask(who))?.mediaType, who).toBe("application/json");
  }
  expect(await ask("administrator")).toBeNull();
});

const distinct = (reports: readonly Report[]) => [
  ...new Map(reports.map((report) => [`${report.step} ${report.done}`, report])).values(),
];
const numbersIn = (text: string) =>
  [...text.replace(/T[\d:.]+Z/g, "").matchAll(/-?\d+\.\d{3,}/g)].map(([number]) => Number(number));
const near = (secret: number, number: number) => Math.abs(Math.abs(secret) - Math.abs(number)) < 1e-3;

function neverAsked(): never {
  throw new Error("nothing is marked here");
}

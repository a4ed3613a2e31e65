import { createHash } from "node:crypto";
import type { Page } from "playwright-core";
import { expect } from "vitest";
import type { Answers, CheckPlan, PublicCase } from "@/lib/checks/kind";
import { kindOf } from "@/lib/checks/registry";
import { ownerRows } from "@/tests/support/owner";
import { ORIGIN } from "./browser";

/** What the right method reads from the case as the technician has it: the public view and its files, nothing else. */
export async function rightAnswers(page: Page, caseId: string): Promise<Answers> {
  const [row] = await ownerRows<{
    view: PublicCase;
    files: { name: string; mediaType: string; sha256: string }[];
    checks: CheckPlan[];
    checkId: string;
  }>(
    `SELECT v.view, v.files, r.checks, c.check_id AS "checkId" FROM case_views v JOIN cases c ON c.id = v.case_id
     JOIN sittings s ON s.id = c.sitting_id JOIN releases r ON r.id = s.release_id WHERE c.id = $1`,
    [caseId],
  );
  const { view, files, checks, checkId } = row!;
  const loaded = [];
  for (const { name, mediaType, sha256 } of files) {
    const response = await page.request.get(`${ORIGIN}/api/employers/saltmarsh/cases/${caseId}/files/${name}`);
    const bytes = await response.body();
    expect(createHash("sha256").update(bytes).digest("hex")).toBe(sha256);
    loaded.push({ name, mediaType, bytes: new Uint8Array(bytes) });
  }
  const plan = checks.find(({ id }) => id === checkId)!;
  return kindOf(plan.kind, plan.version).solve({ truth: null, publicCase: view, files: loaded, draws: 1 }, plan);
}

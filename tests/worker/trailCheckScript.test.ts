import { execFile } from "node:child_process";
import { mkdtemp, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { beforeAll, beforeEach, expect, test } from "vitest";
import { sealTrail } from "@/lib/commands/sealTrail";
import { makeCertificate } from "../support/certified";
import { NOW } from "../support/clock";
import { makeFirm } from "../support/factories";
import { ownerRows } from "../support/owner";
import { freshIssuer } from "./issuer-keys";

let folder: string;
let keyPem: string;
beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), "trail-"));
  const issuer = await freshIssuer();
  keyPem = issuer.keyPem;
  await writeFile(path.join(folder, "certificate.pem"), issuer.certificatePem);
});
beforeEach(async () => {
  await makeCertificate(await makeFirm());
  await sealTrail(keyPem, NOW);
});

function trailCheck(...files: string[]): Promise<{ code: number; output: string }> {
  const args = ["--import", "./scripts/register.mjs", "scripts/trail-check.ts", ...files];
  const { PATH, OWNER_DATABASE_URL } = process.env;
  const env = { PATH, OWNER_DATABASE_URL, ISSUER_CERTIFICATE_FILE: path.join(folder, "certificate.pem") };
  return new Promise((resolve) => {
    execFile(
      process.execPath,
      args,
      { cwd: path.resolve(import.meta.dirname, "../.."), env: env as unknown as NodeJS.ProcessEnv },
      (error, stdout, stderr) => resolve({ code: error ? Number(error.code) : 0, output: stdout + stderr }),
    );
  });
}

test("says that the trail is whole, and with which heads it was held", async () => {
  const [head] = await ownerRows<{ signature: string }>("SELECT signature FROM trail_heads");
  const kept = path.join(folder, "heads.json");
  await writeFile(kept, JSON.stringify({ daily: [{ signature: head!.signature }] }));
  const { code, output } = await trailCheck(kept);
  expect(output).toMatch(/1 signed heads, 1 kept heads, checked in/);
  expect(output).toMatch(/The trail is whole\./);
  expect(code).toBe(0);
});

test("names the first broken row and ends with 1", async () => {
  const [row] = await ownerRows<{ id: string }>("SELECT id FROM decisions");
  await ownerRows("ALTER TABLE decisions DISABLE TRIGGER USER");
  await ownerRows("UPDATE decisions SET reason = 'another reason'");
  await ownerRows("ALTER TABLE decisions ENABLE TRIGGER USER");
  const { code, output } = await trailCheck();
  expect(output).toContain(`First broken row: decisions ${row!.id} was changed without an entry.`);
  expect(code).toBe(1);
});

import { spawnSync } from "node:child_process";
import { createPrivateKey, X509Certificate } from "node:crypto";
import { mkdtempSync, readdirSync, readFileSync, rmSync, statSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, expect, test, vi } from "vitest";

vi.setConfig({ testTimeout: 60_000 });

const home = mkdtempSync(path.join(tmpdir(), "issuer-"));
afterAll(() => rmSync(home, { recursive: true, force: true }));

const run = (...options: string[]) =>
  spawnSync(process.execPath, ["--import", "./scripts/register.mjs", "scripts/make-issuer-key.ts", ...options], {
    encoding: "utf8",
  });

test("writes root and issuer key, the private ones for their owner alone, and never over an earlier key", () => {
  const folder = path.join(home, "issuer");
  expect(run(folder, "--demonstration")).toMatchObject({ status: 0, stderr: "" });
  expect(readdirSync(folder).sort()).toEqual(["certificate.pem", "key.pem", "root-key.pem", "root.pem"]);
  const read = (name: string) => readFileSync(path.join(folder, name), "utf8");
  for (const name of ["key.pem", "root-key.pem"]) expect(statSync(path.join(folder, name)).mode & 0o077, name).toBe(0);
  const issuer = new X509Certificate(read("certificate.pem"));
  expect(issuer.verify(new X509Certificate(read("root.pem")).publicKey)).toBe(true);
  expect(issuer.checkPrivateKey(createPrivateKey(read("key.pem")))).toBe(true);
  expect(issuer.subject).toContain("(Demonstration)");

  const key = read("key.pem");
  expect(run(folder)).toMatchObject({ status: 1, stderr: expect.stringContaining("exists") });
  expect(read("key.pem")).toBe(key);
});

test.each([[[]], [["a", "b"]], [["a", "--country", "Britain"]]])(
  "says how it is called when called with %j",
  (options) => {
    expect(run(...options)).toMatchObject({ status: 1, stderr: expect.stringContaining("make-issuer-key FOLDER") });
  },
);

import { spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { serialize } from "next-mdx-remote/serialize";
import remarkGfm from "remark-gfm";
import { signPdf } from "@/lib/certificates/signPdf";
import { drawn, issuerKey, issuerKeyFiles, SIGNED_AT } from "../certificates/issued";

const PAGES = ["trust", "privacy", "impartiality", "cautions"];

test.each(PAGES)("%s has a title, a lead and one heading of the first order, and compiles", async (name) => {
  const source = readFileSync(`content/${name}.mdx`, "utf8");
  const { frontmatter, compiledSource } = await serialize(source, {
    parseFrontmatter: true,
    mdxOptions: { remarkPlugins: [remarkGfm] },
  });
  expect(frontmatter).toEqual({
    title: expect.any(String),
    lead: expect.any(String),
    description: expect.any(String),
  });
  expect(compiledSource).toContain("h1");
  const body = source.replace(/```[\s\S]*?```/g, "");
  expect(body.match(/^# .+$/gm)).toEqual([`# ${String(frontmatter.title)}`]);
});

test.each(PAGES)("%s keeps to the voice of the product", (name) => {
  const text = readFileSync(`content/${name}.mdx`, "utf8");
  expect(text).not.toMatch(
    /\b(please|sorry|oops|successfully|simply|course|lesson|quiz|enrol|learner|student|badge)\b/i,
  );
  expect(text.replace(/```[\s\S]*?```/g, "")).not.toMatch(/[a-z]!/);
});

describe("the commands of the trust page", () => {
  const folder = mkdtempSync(path.join(tmpdir(), "trust-"));
  const blocks = [...readFileSync("content/trust.mdx", "utf8").matchAll(/```bash\n([\s\S]*?)```/g)].map(
    (match) => match[1] ?? "",
  );
  const bash = (script: string) =>
    spawnSync("bash", ["-euc", `{ ${script}\n} 2>&1`], { cwd: folder, encoding: "utf8" }).stdout;
  let fingerprint = "";

  beforeAll(async () => {
    const files = await issuerKeyFiles();
    const certificate = await drawn();
    fingerprint = certificate.fingerprint;
    writeFileSync(path.join(folder, "root.pem"), files.rootPem);
    writeFileSync(path.join(folder, "certificate.pdf"), await signPdf(certificate.pdf, issuerKey(files), SIGNED_AT));
  }, 60_000);
  afterAll(() => rmSync(folder, { recursive: true, force: true }));

  test("print the fingerprint of the root", () => {
    expect(bash(blocks[0] ?? "")).toMatch(/^sha256 Fingerprint=([0-9A-F]{2}:){31}[0-9A-F]{2}$/im);
  });

  test("find the signature valid, trusted and over the whole file", () => {
    const said = bash(blocks[1] ?? "");
    expect(said).toContain("Signature is Valid");
    expect(said).toContain("Certificate is Trusted");
    expect(said).toContain("Total document signed");
  });

  test("find the same from the bytes alone", () => {
    const said = bash(blocks[2] ?? "");
    expect(said).toContain("Whole file signed");
    expect(said).toMatch(/CMS Verification successful/i);
  });

  test("give the record whose SHA-256 is the fingerprint", () => {
    expect(bash(blocks[3] ?? "")).toContain(`${fingerprint}  record.json`);
    const record = readFileSync(path.join(folder, "record.json"));
    expect(createHash("sha256").update(record).digest("hex")).toBe(fingerprint);
  });

  test("notice what was added after the signature", () => {
    const file = path.join(folder, "certificate.pdf");
    const whole = readFileSync(file);
    writeFileSync(file, Buffer.concat([whole, Buffer.from("\n% added\n")]));
    const said = bash(blocks[2] ?? "");
    expect(said).not.toContain("Whole file signed");
    expect(said).toMatch(/CMS Verification failure/i);
    writeFileSync(file, whole);
  });

  test("notice one changed byte", () => {
    const file = path.join(folder, "certificate.pdf");
    const whole = readFileSync(file);
    const changed = Buffer.from(whole);
    changed[1000] = (changed[1000] ?? 0) ^ 1;
    writeFileSync(file, changed);
    expect(bash(blocks[2] ?? "")).toMatch(/CMS Verification failure/i);
    // The trust was set up above; the last line of the block is the check itself.
    expect(bash(blocks[1]?.trim().split("\n").at(-1) ?? "")).toContain("Digest Mismatch");
    writeFileSync(file, whole);
  });
});

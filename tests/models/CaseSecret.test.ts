import { expect, test } from "vitest";
import { db } from "@/lib/db";
import { CaseSecret } from "@/models";

// These tests run as the web process does.
test("the web process cannot read seed and truth", async () => {
  await expect(CaseSecret.findAll()).rejects.toThrow(/permission denied for table case_secrets/);
});

test("nor count, write, change or delete them, nor lend itself the worker's role", async () => {
  const seal = {
    caseId: "00000000-0000-4000-8000-000000000000",
    sealed: Buffer.alloc(1),
    truthSha256: "",
    engineVersion: "",
  };
  await expect(CaseSecret.count()).rejects.toThrow(/permission denied/);
  await expect(CaseSecret.create(seal)).rejects.toThrow(/permission denied/);
  await expect(CaseSecret.update({ truthSha256: "x" }, { where: {} })).rejects.toThrow(/permission denied/);
  await expect(CaseSecret.destroy({ where: {} })).rejects.toThrow(/permission denied/);
  await expect(db.query("SET ROLE lagmark_worker")).rejects.toThrow(/permission denied/);
});

import { describe, expect, test } from "vitest";
import { db } from "@/lib/db";
import { RECORDS } from "./everyRecord";
import { recordsAreKept } from "./recordsKept";

describe("worker", () => recordsAreKept("the worker", (sql) => db.query(sql)));

test("the worker cannot empty a table of records", async () => {
  for (const table of RECORDS) await expect(db.query(`TRUNCATE ${table} CASCADE`), table).rejects.toThrow(/permission/);
});

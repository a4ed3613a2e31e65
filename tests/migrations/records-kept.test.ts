import { describe, expect, test } from "vitest";
import { db } from "@/lib/db";
import { ownerRows } from "../support/owner";
import { RECORDS } from "./everyRecord";
import { recordsAreKept } from "./recordsKept";

describe("web", () => recordsAreKept("the web process", (sql) => db.query(sql)));
describe("owner", () => recordsAreKept("the owner", (sql) => ownerRows(sql), true));

test("the web process cannot empty a table of records", async () => {
  for (const table of RECORDS) await expect(db.query(`TRUNCATE ${table} CASCADE`), table).rejects.toThrow(/permission/);
});

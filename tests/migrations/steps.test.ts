import { expect, test } from "vitest";
import { owner, ownerRows } from "../support/owner";
import { schemaText } from "./schemaText";
import { runDown, runUp } from "./steps";

// In one transaction that is undone: PostgreSQL takes back every statement of a schema, too.
test("all steps down leave nothing, and up again the very same schema", async () => {
  const client = await owner.connect();
  try {
    await client.query("BEGIN");
    const before = await schemaText(client);
    expect(before.filter((line) => line.startsWith("relation r ")).length).toBeGreaterThan(25);
    await runDown(client);
    expect(await schemaText(client)).toEqual([]);
    await runUp(client);
    expect(await schemaText(client)).toEqual(before);
  } finally {
    await client.query("ROLLBACK");
    client.release();
  }
});

test("a function that names tables never finds them in a session's own temporary schema", async () => {
  const functions = await ownerRows<{ name: string; settings: string[] | null }>(`
    SELECT p.proname AS name, p.proconfig AS settings FROM pg_proc p JOIN pg_namespace n ON n.oid = p.pronamespace
    WHERE n.nspname = 'public' AND p.prolang = (SELECT oid FROM pg_language WHERE lanname = 'plpgsql')
      AND replace(p.prosrc, 'DISTINCT FROM', '') ~ '\\m(FROM|INTO|JOIN)\\M'`);
  expect(functions.map(({ name }) => name).sort()).toEqual([
    "case_needs_settled_fee",
    "certificate_needs_settled_fee",
    "marking_record_hand",
    "standing_may_follow",
    "write_trail",
  ]);
  for (const { name, settings } of functions) expect(settings, name).toContain("search_path=public, pg_temp");
});

import { Model, type ModelStatic } from "sequelize";
import { expect, test } from "vitest";
import * as models from "@/models";
import { ownerRows } from "../support/owner";

const MODELS = Object.values(models as Record<string, unknown>).filter(
  (exported): exported is ModelStatic<Model> => typeof exported === "function" && exported.prototype instanceof Model,
);
// Tables that plain SQL reads and writes, and that no model stands for.
const WITHOUT_MODEL = [
  "draft_writers",
  "release_writers",
  "schema_steps",
  "sign_in_links",
  "stripe_events",
  "throttles",
  "trail_entries",
  "trail_heads",
  "trail_links",
  "trail_unsealed",
  "verifications",
];

test("every table has its model or is known to have none", async () => {
  const tables = await ownerRows<{ name: string }>(
    "SELECT tablename AS name FROM pg_tables WHERE schemaname = 'public'",
  );
  const named = MODELS.map((model) => String(model.getTableName()));
  expect([...named, ...WITHOUT_MODEL].sort()).toEqual(tables.map(({ name }) => name).sort());
});

test.each(MODELS.map((model) => [model.name, model] as const))(
  "%s names the columns of its table",
  async (_name, model) => {
    const columns = await ownerRows<{ name: string; required: boolean }>(COLUMNS, [model.getTableName()]);
    const attributes = Object.values(model.getAttributes());
    expect(attributes.map(({ field }) => field).sort()).toEqual(columns.map(({ name }) => name).sort());
    const asked = attributes.filter(({ allowNull, primaryKey }) => primaryKey || allowNull === false);
    const required = columns.filter((column) => column.required).map(({ name }) => name);
    expect(asked.map(({ field }) => field)).toEqual(expect.arrayContaining(required));
  },
);

// Required: no null and nothing that the database would fill in.
const COLUMNS = `
  SELECT column_name AS name, is_nullable = 'NO' AND column_default IS NULL AND is_identity = 'NO' AS required
  FROM information_schema.columns WHERE table_schema = 'public' AND table_name = $1`;

import type { PoolClient } from "pg";

/** Everything that the steps make, as text: two schemas are the same when their texts are. */
export async function schemaText(client: PoolClient): Promise<string[]> {
  const lines: string[] = [];
  for (const [what, sql] of Object.entries(PARTS)) {
    const { rows } = await client.query<{ line: string }>(sql);
    lines.push(...rows.map(({ line }) => `${what} ${line}`).sort());
  }
  return lines;
}

// schema_steps belongs to the tool that runs the steps.
const OURS = `n.nspname = 'public' AND c.relname <> 'schema_steps' AND c.relname <> 'schema_steps_pkey'`;
const RELATIONS = `pg_class c JOIN pg_namespace n ON n.oid = c.relnamespace`;
const rights = (acl: string) => `
  (SELECT string_agg(x.grantee::regrole || ':' || x.privilege_type, ',' ORDER BY x.grantee::regrole::text, x.privilege_type)
   FROM aclexplode(${acl}) x WHERE x.grantee <> 0)`;

const PARTS = {
  relation: `
    SELECT concat_ws(' ', c.relkind, c.relname, ${rights("c.relacl")}, obj_description(c.oid)) AS line
    FROM ${RELATIONS} WHERE ${OURS}`,
  column: `
    SELECT concat_ws(' ', c.relname, a.attnum, a.attname, format_type(a.atttypid, a.atttypmod), a.attnotnull, a.attidentity,
      pg_get_expr(d.adbin, d.adrelid), ${rights("a.attacl")}, col_description(c.oid, a.attnum)) AS line
    FROM ${RELATIONS} JOIN pg_attribute a ON a.attrelid = c.oid AND a.attnum > 0
    LEFT JOIN pg_attrdef d ON d.adrelid = c.oid AND d.adnum = a.attnum WHERE ${OURS}`,
  constraint: `
    SELECT concat_ws(' ', c.relname, k.conname, pg_get_constraintdef(k.oid)) AS line
    FROM ${RELATIONS} JOIN pg_constraint k ON k.conrelid = c.oid WHERE ${OURS}`,
  index: `SELECT pg_get_indexdef(c.oid) AS line FROM ${RELATIONS} WHERE ${OURS} AND c.relkind = 'i'`,
  view: `SELECT c.relname || ' ' || pg_get_viewdef(c.oid) AS line FROM ${RELATIONS} WHERE ${OURS} AND c.relkind = 'v'`,
  trigger: `
    SELECT pg_get_triggerdef(t.oid) AS line FROM ${RELATIONS} JOIN pg_trigger t ON t.tgrelid = c.oid
    WHERE ${OURS} AND NOT t.tgisinternal`,
  function: `
    SELECT pg_get_functiondef(p.oid) AS line FROM pg_proc p JOIN pg_namespace n ON n.oid = p.pronamespace
    WHERE n.nspname = 'public' AND NOT EXISTS (SELECT 1 FROM pg_depend d WHERE d.objid = p.oid AND d.deptype = 'e')`,
  extension: `SELECT extname AS line FROM pg_extension WHERE extname <> 'plpgsql'`,
  "right by default": `
    SELECT d.defaclobjtype::text || ' ' || ${rights("d.defaclacl")} AS line FROM pg_default_acl d
    JOIN pg_namespace n ON n.oid = d.defaclnamespace WHERE n.nspname = 'public'`,
  "right in the schema": `
    SELECT x.grantee::regrole || ' ' || x.privilege_type AS line FROM pg_namespace n, aclexplode(n.nspacl) x
    WHERE n.nspname = 'public' AND x.grantee <> 0 AND x.grantee::regrole::text LIKE 'lagmark_w%'`,
};

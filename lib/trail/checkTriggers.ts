import type { Finding, Read } from "./finding";
import { CHAIN_TABLES, RECORD_TABLES, TRAILED_TABLES } from "./trailed-tables";

/** Without its triggers a table loses rows or takes them in unseen, so one that is missing or switched off is a finding. */
export async function* checkTriggers(read: Read): AsyncGenerator<Finding> {
  const states = new Map(
    (await read<{ name: string; state: string }>(TRIGGERS)).map(({ name, state }) => [name, state]),
  );
  const needed = [
    ...TRAILED_TABLES.map((table) => [table, `${table}_trail`] as const),
    ...[...RECORD_TABLES, ...CHAIN_TABLES].map((table) => [table, `${table}_kept`] as const),
  ];
  for (const [table, name] of needed) {
    const state = states.get(name);
    if (state === undefined) yield { table, key: name, disagrees: "the trigger is gone" };
    // O: fires in ordinary sessions, A: in all (PostgreSQL 15 manual, 53.63 pg_trigger).
    else if (state !== "O" && state !== "A") yield { table, key: name, disagrees: "the trigger is switched off" };
  }
}

const TRIGGERS = `
  SELECT t.tgname AS "name", t.tgenabled AS "state" FROM pg_trigger t JOIN pg_class c ON c.oid = t.tgrelid
  WHERE NOT t.tgisinternal AND c.relnamespace = 'public'::regnamespace`;

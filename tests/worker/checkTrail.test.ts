import { createPublicKey } from "node:crypto";
import { beforeEach, expect, test } from "vitest";
import { readSnapshot } from "@/scripts/trail/readSnapshot";
import { sealTrail } from "@/lib/commands/sealTrail";
import { checkTrail } from "@/lib/trail/checkTrail";
import { CHAIN_TABLES, RECORD_TABLES, TRAILED_TABLES } from "@/lib/trail/trailed-tables";
import { makeCertificate } from "../support/certified";
import { NOW } from "../support/clock";
import { makeFirm } from "../support/factories";
import { owner, ownerRows } from "../support/owner";
import { freshKeyPem } from "./issuer-keys";

const key = freshKeyPem();
const check = (keptHeads: string[] = [], address = process.env.OWNER_DATABASE_URL!) =>
  readSnapshot(address, (read) => checkTrail(read, createPublicKey(key), keptHeads));
const found = async (keptHeads: string[] = []) => (await check(keptHeads)).findings;
const one = async <Row extends object>(sql: string, values: unknown[] = []) => (await ownerRows<Row>(sql, values))[0]!;

/** What only the owner of the database could do: switch the guards off, change something, switch them on again. */
async function behindTheGuards(table: string, ...statements: string[]): Promise<void> {
  const client = await owner.connect();
  try {
    await client.query("BEGIN");
    await client.query(`ALTER TABLE ${table} DISABLE TRIGGER USER`);
    for (const statement of statements) await client.query(statement);
    await client.query(`ALTER TABLE ${table} ENABLE TRIGGER USER`);
    await client.query("COMMIT");
  } finally {
    client.release();
  }
}

// A whole chain of records, sealed in two parts so that there are two heads.
beforeEach(async () => {
  const firm = await makeFirm();
  await sealTrail(key, NOW);
  await makeCertificate(firm);
  await sealTrail(key, NOW);
});

test("a trail that nobody touched is whole", async () => {
  const checked = await check();
  expect(checked.findings).toEqual([]);
  expect(checked.notCompared).toEqual([]);
  expect(Number(checked.links)).toBeGreaterThan(15);
  expect(checked.heads).toBe("2");
});

test("a row changed behind the triggers is named", async () => {
  const { id } = await one<{ id: string }>("SELECT id FROM marking_records");
  await behindTheGuards("marking_records", "UPDATE marking_records SET met = NOT met");
  expect(await found()).toEqual([{ table: "marking_records", key: id, disagrees: "was changed without an entry" }]);
});

test("a row of a table that may change is named as well", async () => {
  const { id } = await one<{ id: string }>("SELECT id FROM fees");
  await behindTheGuards("fees", "UPDATE fees SET amount_minor = 1");
  expect(await found()).toEqual([{ table: "fees", key: id, disagrees: "was changed without an entry" }]);
});

test("a row taken away is named by the trail", async () => {
  const { id } = await one<{ id: string }>("SELECT id FROM standings");
  await behindTheGuards("standings", "DELETE FROM standings");
  expect(await found()).toEqual([{ table: "standings", key: id, disagrees: "is gone, the trail has it" }]);
});

test("a row slipped in without an entry is named", async () => {
  const slipIn = `INSERT INTO standings (certificate_id, sequence, standing, ground, set_by, set_at)
    SELECT certificate_id, 2, 'withdrawn', 'none', set_by, set_at FROM standings`;
  await behindTheGuards("standings", slipIn);
  const { id } = await one<{ id: string }>("SELECT id FROM standings WHERE sequence = 2");
  expect(await found()).toEqual([{ table: "standings", key: id, disagrees: "has no entry in the trail" }]);
});

test("an altered entry is named, with the link that was made over it", async () => {
  const { id, sequence } = await one<{ id: string; sequence: string }>(
    "SELECT e.id, l.sequence FROM trail_entries e JOIN trail_links l ON l.entry_id = e.id WHERE e.act = 'decisions added'",
  );
  await behindTheGuards(
    "trail_entries",
    "UPDATE trail_entries SET actor_id = NULL, act = 'decisions changed' WHERE act = 'decisions added'",
  );
  const disagrees = `its content is not what link ${sequence} was made over`;
  expect(await found()).toEqual([{ table: "trail_entries", key: id, disagrees }]);
});

test("an instant moved by a microsecond is found", async () => {
  await behindTheGuards("trail_entries", "UPDATE trail_entries SET at = at + interval '1 microsecond' WHERE id = 3");
  expect(await found()).toMatchObject([{ table: "trail_entries", key: "3" }]);
});

test("a deleted link is named, and so is the entry that lost it", async () => {
  const { entry_id } = await one<{ entry_id: string }>("SELECT entry_id FROM trail_links WHERE sequence = 2");
  await behindTheGuards("trail_links", "DELETE FROM trail_links WHERE sequence = 2");
  expect(await found()).toEqual([{ table: "trail_links", key: "2", disagrees: "is gone" }]);
  await behindTheGuards("trail_entries", `UPDATE trail_entries SET at = at - interval '1 hour' WHERE id = ${entry_id}`);
  expect(await found()).toEqual([
    { table: "trail_links", key: "2", disagrees: "is gone" },
    { table: "trail_entries", key: entry_id, disagrees: "is in no link and does not wait for one" },
  ]);
});

test("a link whose hashes were changed does not follow from the one before", async () => {
  await behindTheGuards("trail_links", `UPDATE trail_links SET link_sha256 = repeat('0', 64) WHERE sequence = 4`);
  const disagrees = "does not follow from the link before it and its entry's hash";
  expect((await found()).slice(0, 2)).toEqual([
    { table: "trail_links", key: "4", disagrees },
    { table: "trail_links", key: "5", disagrees },
  ]);
});

test("a chain worked out anew over a changed entry fails at the signed head", async () => {
  await behindTheGuards("trail_entries", "UPDATE trail_entries SET actor_id = gen_random_uuid() WHERE id = 1");
  await rechain();
  const { sequence } = await one<{ sequence: string }>("SELECT sequence FROM trail_heads ORDER BY sequence LIMIT 1");
  const [first] = await found();
  expect(first).toMatchObject({
    table: "trail_links",
    key: sequence,
    disagrees: expect.stringMatching(/^is not the link that was signed on/),
  });
});

test("heads signed by a key of the forger's own are named", async () => {
  await behindTheGuards("trail_entries", "UPDATE trail_entries SET actor_id = gen_random_uuid() WHERE id = 1");
  await rechain(freshKeyPem());
  expect(await found()).toMatchObject([{ table: "trail_heads", disagrees: "is not signed by the issuer's key" }]);
});

test("a chain without its heads is named", async () => {
  await behindTheGuards("trail_heads", "DELETE FROM trail_heads");
  expect(await found()).toEqual([{ table: "trail_links", key: "1", disagrees: "stands after the last signed head" }]);
});

test("a head kept outside tells what is gone from the database altogether", async () => {
  const { sequence, signature } = await one<{ sequence: string; signature: string }>(
    "SELECT sequence, signature FROM trail_heads ORDER BY sequence DESC LIMIT 1",
  );
  expect(await found([signature])).toEqual([]);
  await forgetAll();
  expect(await found()).toEqual([]);
  const disagrees = `is gone, named by the kept head of ${NOW.toISOString()}`;
  expect(await found([signature])).toEqual([{ table: "trail_links", key: sequence, disagrees }]);
});

test("entries that wait for more than a minute are named", async () => {
  await makeFirm();
  await behindTheGuards(
    "trail_entries",
    "UPDATE trail_entries SET at = at - interval '1 hour' WHERE id IN (SELECT entry_id FROM trail_unsealed)",
  );
  expect((await found())[0]).toMatchObject({
    table: "trail_entries",
    disagrees: "waits to be sealed for more than a minute",
  });
});

test("entries of this minute may still wait", async () => {
  await makeFirm();
  expect(await found()).toEqual([]);
});

test("a trigger switched off is named even before anything was changed", async () => {
  await ownerRows("ALTER TABLE decisions DISABLE TRIGGER decisions_kept");
  try {
    expect(await found()).toEqual([
      { table: "decisions", key: "decisions_kept", disagrees: "the trigger is switched off" },
    ]);
  } finally {
    await ownerRows("ALTER TABLE decisions ENABLE TRIGGER decisions_kept");
  }
});

test("a check by the worker's role compares everything as well", async () => {
  expect(await check([], process.env.WORKER_DATABASE_URL)).toMatchObject({ findings: [], notCompared: [] });
});

test("the lists of tables are those that have the triggers", async () => {
  const rows = await ownerRows<{ name: string }>("SELECT tgname AS name FROM pg_trigger WHERE NOT tgisinternal");
  const having = (ending: string) =>
    rows.filter(({ name }) => name.endsWith(ending)).map(({ name }) => name.slice(0, -ending.length));
  expect(having("_trail").sort()).toEqual([...TRAILED_TABLES].sort());
  expect(having("_kept").sort()).toEqual([...RECORD_TABLES, ...CHAIN_TABLES].sort());
});

/** The forger's work: all links made again over the entries as they are now; with a key, the heads too. */
async function rechain(forgersKey?: string): Promise<void> {
  const heads = await ownerRows<{ sequence: string; link_sha256: string; signed_at: Date; signature: string }>(
    "SELECT * FROM trail_heads",
  );
  await behindTheGuards("trail_heads", "DELETE FROM trail_heads");
  await behindTheGuards(
    "trail_links",
    "DELETE FROM trail_links",
    "INSERT INTO trail_unsealed SELECT id FROM trail_entries",
  );
  await sealTrail(forgersKey ?? key, NOW);
  if (forgersKey) return;
  await behindTheGuards("trail_heads", "DELETE FROM trail_heads");
  const put = "INSERT INTO trail_heads (sequence, link_sha256, signed_at, signature) VALUES ($1, $2, $3, $4)";
  for (const head of heads) await ownerRows(put, [head.sequence, head.link_sha256, head.signed_at, head.signature]);
}

/** Every record, its entries, links and heads, as if none had ever been. */
async function forgetAll(): Promise<void> {
  await ownerRows(`TRUNCATE ${[...TRAILED_TABLES, ...CHAIN_TABLES, "trail_unsealed"].join(", ")} CASCADE`);
}

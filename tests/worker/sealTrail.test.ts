import { createPublicKey } from "node:crypto";
import pg from "pg";
import { expect, test } from "vitest";
import { sealTrail, SEAL_BATCH } from "@/lib/commands/sealTrail";
import { db, select } from "@/lib/db";
import { readHead } from "@/lib/trail/head";
import { linkSha256, NO_LINK } from "@/lib/trail/link";
import { NOW } from "../support/clock";
import { makeEmployer } from "../support/factories";
import { ownerRows } from "../support/owner";
import { freshKeyPem } from "./issuer-keys";

const key = freshKeyPem();
const seal = () => sealTrail(key, NOW);
type Link = { sequence: string; entry_id: string; entry_sha256: string; link_sha256: string };
const links = () => ownerRows<Link>("SELECT * FROM trail_links ORDER BY sequence");
const waiting = async () => (await ownerRows("SELECT * FROM trail_unsealed")).length;

test("links what waits in order, each link over the one before it, and nothing waits any more", async () => {
  await makeEmployer();
  await makeEmployer();
  expect(await seal()).toBe(2);
  const [first, second] = await links();
  expect(first).toMatchObject({ sequence: "1", link_sha256: linkSha256(NO_LINK, first!.entry_sha256) });
  expect(second).toMatchObject({ sequence: "2", link_sha256: linkSha256(first!.link_sha256, second!.entry_sha256) });
  expect(Number(second!.entry_id)).toBeGreaterThan(Number(first!.entry_id));
  expect(await waiting()).toBe(0);
});

test("signs the new end of the chain", async () => {
  await makeEmployer();
  await seal();
  const [head] = await ownerRows<{ sequence: string; signature: string }>("SELECT * FROM trail_heads");
  const [link] = await links();
  expect(await readHead(head!.signature, createPublicKey(key))).toEqual({
    sequence: "1",
    link: link!.link_sha256,
    at: NOW.toISOString(),
  });
});

test("sealing again with nothing new adds neither link nor head", async () => {
  await makeEmployer();
  await seal();
  expect(await seal()).toBe(0);
  expect(await links()).toHaveLength(1);
  expect(await ownerRows("SELECT * FROM trail_heads")).toHaveLength(1);
});

test("goes on after the last link, batch by batch", async () => {
  await ownerRows(
    "INSERT INTO employers (slug, name) SELECT 'firm-x' || n, 'Firm' FROM generate_series(1, $1::int) n",
    [SEAL_BATCH + 3],
  );
  expect(await seal()).toBe(SEAL_BATCH);
  expect(await seal()).toBe(3);
  const all = await links();
  expect(all.map(({ sequence }) => Number(sequence))).toEqual(Array.from({ length: SEAL_BATCH + 3 }, (_, n) => n + 1));
  const [before, after] = all.slice(SEAL_BATCH - 1);
  expect(after!.link_sha256).toBe(linkSha256(before!.link_sha256, after!.entry_sha256));
});

test("an entry that commits late is linked late, and the chain never waits for it", async () => {
  const slow = new pg.Client({ connectionString: process.env.OWNER_DATABASE_URL });
  await slow.connect();
  try {
    await slow.query("BEGIN");
    await slow.query("INSERT INTO employers (slug, name) VALUES ('slow', 'Slow')");
    await makeEmployer();
    expect(await seal()).toBe(1);
    await slow.query("COMMIT");
    expect(await seal()).toBe(1);
  } finally {
    await slow.end();
  }
  const [first, second] = await links();
  expect(Number(second!.entry_id)).toBeLessThan(Number(first!.entry_id));
});

test("two sealers at once link every entry once", async () => {
  for (let n = 0; n < 5; n += 1) await makeEmployer();
  const counts = await Promise.all([seal(), seal(), seal()]);
  expect(counts.reduce((sum, count) => sum + count, 0)).toBe(5);
  expect(await links()).toHaveLength(5);
});

test("stopped before the head is signed, nothing is linked and the next run does it all", async () => {
  await makeEmployer();
  await expect(sealTrail("no key", NOW)).rejects.toThrow();
  expect(await links()).toHaveLength(0);
  expect(await waiting()).toBe(1);
  expect(await seal()).toBe(1);
});

test.each([
  ["change", "UPDATE trail_links SET entry_sha256 = 'x'"],
  ["delete", "DELETE FROM trail_links"],
])("the worker's role may not %s a link", async (_act, sql) => {
  await makeEmployer();
  await seal();
  await expect(db.query(sql)).rejects.toThrow(/permission denied/);
});

test("the worker's role may not write an entry past the trigger", async () => {
  const sql = "INSERT INTO trail_entries (act, subject_table, subject_key, row_sha256) VALUES ('a', 'b', 'c', 'd')";
  await expect(select(sql)).rejects.toThrow(/permission denied/);
});

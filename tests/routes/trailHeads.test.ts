import { createPublicKey, generateKeyPairSync, type JsonWebKey } from "node:crypto";
import { mkdtempSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { beforeAll, beforeEach, expect, test } from "vitest";
import { GET } from "@/app/api/trail/heads/route";
import { makeIssuerKey } from "@/lib/certificates/makeIssuerKey";
import type { PublicTrailHeads } from "@/lib/queries/getPublicTrailHeads";
import { readHead, signHead } from "@/lib/trail/head";
import { NOW } from "../support/clock";
import { makeFirm } from "../support/factories";
import { insert, ownerRows } from "../support/owner";

let keyPem: string;
beforeAll(async () => {
  const issuer = await makeIssuerKey({ organisation: "Test register", demonstration: false, from: NOW });
  keyPem = issuer.keyPem;
  const folder = mkdtempSync(path.join(tmpdir(), "heads-"));
  for (const [name, pem] of Object.entries({ CERTIFICATE: issuer.certificatePem, ROOT: issuer.rootPem })) {
    const file = path.join(folder, `${name}.pem`);
    writeFileSync(file, pem);
    process.env[`ISSUER_${name}_FILE`] = file;
  }
});

/** A head signed so many days ago by the database's clock, at noon or an hour later. */
async function head(sequence: string, daysAgo: number, hour = 12): Promise<string> {
  const [{ at }] = (await ownerRows<{ at: Date }>(
    `SELECT (date_trunc('day', now() AT TIME ZONE 'UTC') - $1 * interval '1 day' + $2 * interval '1 hour') AT TIME ZONE 'UTC' AS at`,
    [daysAgo, hour],
  )) as [{ at: Date }];
  const link = sequence.padStart(64, "a");
  const [{ id }] = (await ownerRows<{ id: string }>("SELECT id FROM trail_entries ORDER BY id OFFSET $1 LIMIT 1", [
    Number(sequence) - 1,
  ])) as [{ id: string }];
  await insert("trail_links", { sequence, entryId: id, entrySha256: "e", linkSha256: link });
  const signature = await signHead({ sequence, link, at: at.toISOString() }, keyPem);
  await insert("trail_heads", { sequence, linkSha256: link, signedAt: at, signature });
  return at.toISOString();
}

beforeEach(() => makeFirm());
const get = async () => (await (await GET()).json()) as PublicTrailHeads;

test("before anything is sealed there is no head, and the key is published all the same", async () => {
  const { newest, daily, key } = await get();
  expect([newest, daily]).toEqual([null, []]);
  expect(key).toMatchObject({ kty: "EC", crv: "P-256" });
  expect(key).not.toHaveProperty("d");
});

test("gives the newest head and the last one of each day, newest first", async () => {
  await head("1", 2);
  const dayBefore = await head("2", 2, 13);
  const yesterday = await head("3", 1);
  const { newest, daily } = await get();
  expect(newest).toMatchObject({ sequence: "3", at: yesterday });
  expect(daily.map(({ sequence, at }) => [sequence, at])).toEqual([
    ["3", yesterday],
    ["2", dayBefore],
  ]);
});

test("a head older than sixty days is no longer listed, though it may be the newest", async () => {
  const at = await head("1", 62);
  expect(await get()).toMatchObject({ newest: { sequence: "1", at }, daily: [] });
});

test("what is published verifies with the published key", async () => {
  await head("1", 1);
  const { newest, key } = await get();
  const published = createPublicKey({ key: key as JsonWebKey, format: "jwk" });
  expect(await readHead(newest!.signature, published)).toEqual({
    sequence: "1",
    link: newest!.link,
    at: newest!.at,
  });
  const another = generateKeyPairSync("ec", { namedCurve: "P-256" }).publicKey;
  expect(await readHead(newest!.signature, another)).toBeNull();
});

test("may be kept by anyone for a minute", async () => {
  expect((await GET()).headers.get("cache-control")).toBe("public, max-age=60");
});

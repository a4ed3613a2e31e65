// `npm run trail:check`: verifies the whole trail and names the first broken row. Exit code 0 when all agrees, else 1.
// Further arguments are files with signed heads kept from GET /api/trail/heads (a head a line, or the answer itself).
import { createPublicKey } from "node:crypto";
import { readFileSync } from "node:fs";
import { checkTrail } from "@/lib/trail/checkTrail";
import { readSnapshot } from "./trail/readSnapshot";
import { trailSettings } from "./trail/trailSettings";

const JWS = /eyJ[\w-]*\.[\w-]+\.[\w-]+/g;

const { address, certificateFile } = trailSettings(process.env);
const key = createPublicKey(readFileSync(certificateFile, "utf8"));
const kept = process.argv.slice(2).flatMap((file) => readFileSync(file, "utf8").match(JWS) ?? []);
const started = performance.now();
const { findings, links, heads, notCompared } = await readSnapshot(address, (read) => checkTrail(read, key, kept));

const say = (line: string) => process.stdout.write(`${line}\n`);
const seconds = ((performance.now() - started) / 1000).toFixed(1);
say(`${links} links, ${heads} signed heads, ${kept.length} kept heads, checked in ${seconds} s.`);
if (notCompared.length) say(`Not compared, since this database role may not read them: ${notCompared.join(", ")}.`);
for (const [index, { table, key: row, disagrees }] of findings.entries())
  say(`${index === 0 ? "First broken row" : "And"}: ${table} ${row} ${disagrees}.`);
if (!findings.length) say("The trail is whole.");
process.exitCode = findings.length ? 1 : 0;

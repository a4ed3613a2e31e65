import type { KeyObject } from "node:crypto";
import { checkHeads } from "./checkHeads";
import { checkLinks } from "./checkLinks";
import { checkRows } from "./checkRows";
import { checkTriggers } from "./checkTriggers";
import { checkUnlinked } from "./checkUnlinked";
import type { Finding, Read } from "./finding";

export type TrailCheck = {
  /** In the order found; empty when everything agrees. */
  findings: Finding[];
  links: string;
  heads: string;
  /** Tables that the asking role may not read, so that their rows were not compared. */
  notCompared: string[];
};

/** A forged trail may have no end of broken rows; so many are enough to know. */
const MOST_FINDINGS = 20;

/**
 * The whole trail: each entry's hash, each link, each signed head, entries left out, and the rows they are about.
 * @param read must see one moment of the database, in UTC
 * @param keptHeads signed heads from outside the database, the published ones for example
 */
export async function checkTrail(
  read: Read,
  issuerKey: KeyObject,
  keptHeads: readonly string[] = [],
): Promise<TrailCheck> {
  const findings: Finding[] = [];
  const notCompared: string[] = [];
  const parts = [
    checkLinks(read),
    checkHeads(read, issuerKey, keptHeads),
    checkUnlinked(read, MOST_FINDINGS),
    checkRows(read, MOST_FINDINGS, (table) => notCompared.push(table)),
    checkTriggers(read),
  ];
  for (const part of parts) {
    for await (const finding of part) {
      findings.push(finding);
      if (findings.length === MOST_FINDINGS) break;
    }
    if (findings.length === MOST_FINDINGS) break;
  }
  const [counted] = await read<{ links: string; heads: string }>(COUNTED);
  return { findings, ...counted!, notCompared };
}

const COUNTED = `
  SELECT (SELECT count(*)::text FROM trail_links) AS "links", (SELECT count(*)::text FROM trail_heads) AS "heads"`;

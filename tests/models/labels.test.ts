import { expect, test } from "vitest";
import { select } from "@/lib/db";
import { Capture } from "@/models";
import { makeOpenCase } from "../support/chain";
import { makeFirm } from "../support/factories";
import { ownerRows } from "../support/owner";

// Everything that the notation of the type has a meaning for.
const LABELS = { site: 'Quay "3"', "a=>b": "c, d", back: "one \\ two", empty: "", umlaut: "Mâle Ä 北" };

test("free labels come back as they were put in, by the model and in a raw row", async () => {
  const { id: caseId } = await makeOpenCase(await makeFirm());
  await ownerRows(
    `INSERT INTO captures (case_id, name, storage_key, media_type, size_bytes, sha256, labels)
     VALUES ($1, 'a', 'a', 'text/plain', 0, repeat('0', 64), hstore($2::text[], $3::text[]))`,
    [caseId, Object.keys(LABELS), Object.values(LABELS)],
  );
  expect((await Capture.findAll({ where: { caseId } }))[0]!.labels).toEqual(LABELS);
  expect(await select("SELECT labels FROM captures WHERE case_id = :caseId", { caseId })).toEqual([{ labels: LABELS }]);
  const sites = `SELECT labels -> 'site' AS site FROM captures WHERE labels ? 'site'`;
  expect(await ownerRows(sites)).toEqual([{ site: 'Quay "3"' }]);
});

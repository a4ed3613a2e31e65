import { expect, test } from "vitest";
import { makeCertificate } from "@/tests/support/certified";
import { makeFirm } from "@/tests/support/factories";
import { ownerRows } from "@/tests/support/owner";

test("the factories' graph passes every constraint and trigger of the schema", async () => {
  const firm = await makeFirm();
  const certificate = await makeCertificate(firm);
  const sql = "SELECT standing FROM certificate_standings WHERE certificate_id = $1";
  expect(await ownerRows(sql, [certificate.id])).toEqual([{ standing: "valid" }]);
});

test("every record of the chain leaves its entry in the trail, though the owner put it in", async () => {
  await makeCertificate(await makeFirm());
  const entries = await ownerRows<{ name: string }>("SELECT DISTINCT subject_table AS name FROM trail_entries");
  expect(entries.map((entry) => entry.name).sort()).toEqual(
    [
      "assignments",
      "case_views",
      "cases",
      "certificates",
      "decisions",
      "employers",
      "fees",
      "hand_ins",
      "marking_records",
      "orders",
      "release_writers",
      "releases",
      "role_grants",
      "sittings",
      "standings",
    ].sort(),
  );
});

import { expect, test } from "vitest";
import { entrySha256, type TrailEntry } from "@/lib/trail/entry";

const ENTRY: TrailEntry = {
  id: "42",
  at: "2026-12-01T10:00:00.000123Z",
  act: "decisions added",
  actorId: "11111111-2222-4333-8444-555555555555",
  employerId: null,
  subjectTable: "decisions",
  subjectKey: "a/b",
  rowSha256: "ab".repeat(32),
};

// The canonical text was written by hand and hashed with sha256sum:
// {"act":"decisions added","actorId":"1111...","at":"2026-...","employerId":null,"id":"42","rowSha256":"abab...","subjectKey":"a/b","subjectTable":"decisions"}
test("hashes the entry's canonical JSON", () => {
  expect(entrySha256(ENTRY)).toBe("60e20d7f9e852e1715d7d05c711bbb1a6079fd824e18d6ca024fc9c8f0f339c5");
});

test.each(Object.keys(ENTRY) as (keyof TrailEntry)[])("another %s gives another hash", (field) => {
  expect(entrySha256({ ...ENTRY, [field]: "1" })).not.toBe(entrySha256(ENTRY));
});

test("a column that was joined in does not enter", () => {
  const joined = { sequence: "7", ...ENTRY };
  expect(entrySha256(joined)).toBe(entrySha256(ENTRY));
});

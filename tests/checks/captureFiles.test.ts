import { createHash } from "node:crypto";
import { expect, test } from "vitest";
import { captureFiles, readCapture } from "@/lib/checks/captureFiles";

const samples = Int8Array.from([1, -2, 127, -127, 0, 5]);
const files = captureFiles({ samples, rateHz: 2_046_000 }, "2026-03-01T08:00:00.000Z");
const metadata = JSON.parse(new TextDecoder().decode(files[0].bytes));

test("metadata as the SigMF schema of the 1.2 line asks", () => {
  expect(files.map(({ name }) => name)).toEqual(["capture.sigmf-meta", "capture.sigmf-data"]);
  expect(metadata.global["core:datatype"]).toBe("ci8"); // the pattern of the schema: ^(c|r)(...|i8|...)
  expect(metadata.global["core:version"]).toMatch(/^1\.2\.\d+$/);
  expect(metadata.global["core:sample_rate"]).toBe(2_046_000);
  expect(metadata.captures).toEqual([
    { "core:sample_start": 0, "core:frequency": 1_575_420_000, "core:datetime": "2026-03-01T08:00:00.000Z" },
  ]);
  expect(metadata.annotations).toEqual([]);
});

test("the hash is that of the samples' bytes", () => {
  expect(metadata.global["core:sha512"]).toBe(createHash("sha512").update(files[1].bytes).digest("hex"));
  expect(metadata.global["core:sha512"]).toMatch(/^[0-9a-f]{128}$/);
});

test("says nothing beyond how the samples are to be read", () =>
  expect(Object.keys(metadata.global).sort()).toEqual([
    "core:datatype",
    "core:description",
    "core:hw",
    "core:num_channels",
    "core:sample_rate",
    "core:sha512",
    "core:version",
  ]));

test("reads back what was written", () => {
  const capture = readCapture(files);
  expect([...capture.samples]).toEqual([...samples]);
  expect(capture.rateHz).toBe(2_046_000);
});

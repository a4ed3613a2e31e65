import { mkdtempSync, readdirSync, rmSync, statSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { pathToFileURL } from "node:url";
import { afterAll, beforeAll, describe, expect, test, vi } from "vitest";
import { openStorage } from "@/lib/storage/storage";
import { startBucket } from "./bucket";

const folder = mkdtempSync(path.join(tmpdir(), "storage-"));
let bucket: Awaited<ReturnType<typeof startBucket>>;
const open = {
  disk: () => openStorage(pathToFileURL(folder).href),
  bucket: () => openStorage(`s3://captures/first/light?region=eu-central-1&endpoint=${bucket.endpoint}`),
};

beforeAll(async () => {
  bucket = await startBucket();
  vi.stubEnv("AWS_ACCESS_KEY_ID", "key");
  vi.stubEnv("AWS_SECRET_ACCESS_KEY", "secret");
});
afterAll(async () => {
  await bucket.close();
  rmSync(folder, { recursive: true });
  vi.unstubAllEnvs();
});

describe.each(["disk", "bucket"] as const)("storage on %s", (driver) => {
  const bytes = Uint8Array.from({ length: 100_000 }, (_, index) => (index * 31) % 251);

  test("gives back the very bytes, also when they are replaced", async () => {
    await open[driver]().put("cases/7/capture.sigmf-data", Uint8Array.of(9), "application/octet-stream");
    await open[driver]().put("cases/7/capture.sigmf-data", bytes, "application/octet-stream");
    expect(Buffer.from((await open[driver]().get("cases/7/capture.sigmf-data")) ?? []).equals(bytes)).toBe(true);
  });

  test("says null for what is not there", async () => {
    expect(await open[driver]().get("cases/8/capture.sigmf-data")).toBeNull();
  });

  test("stores nothing as nothing", async () => {
    await open[driver]().put("empty", new Uint8Array(), "text/plain");
    expect(await open[driver]().get("empty")).toEqual(new Uint8Array());
  });

  test("deletes, and deleting again is no error", async () => {
    await open[driver]().put("cases/9/a", bytes, "application/octet-stream");
    await open[driver]().delete("cases/9/a");
    await open[driver]().delete("cases/9/a");
    expect(await open[driver]().get("cases/9/a")).toBeNull();
  });

  const outside = ["", "/etc/passwd", "../secrets.json", "a/../../b", "a//b", "a/", ".hidden", "a\\..\\b", "a\0b", "ü"];
  test.each([...outside, "a".repeat(501), "a".repeat(201)])("refuses the key %j", async (key) => {
    for (const call of [
      async () => open[driver]().put(key, bytes, "text/plain"),
      async () => open[driver]().get(key),
      async () => open[driver]().delete(key),
    ]) {
      await expect(call()).rejects.toThrow(RangeError);
    }
  });
});

test("a write that fails leaves the earlier bytes and no rest", async () => {
  await open.disk().put("kept/file", Uint8Array.of(1), "text/plain");
  // The driver hands this on to Node, which writes the first part before the second one fails.
  const broken = halfOfAFile() as unknown as Uint8Array;
  await expect(open.disk().put("kept/file", broken, "text/plain")).rejects.toThrow("disk is full");
  expect(await open.disk().get("kept/file")).toEqual(Uint8Array.of(1));
  expect(readdirSync(path.join(folder, "kept"))).toEqual(["file"]);
});

test("files on disk are readable by this account alone", async () => {
  await open.disk().put("private/file", Uint8Array.of(1), "text/plain");
  expect(statSync(path.join(folder, "private/file")).mode & 0o077).toBe(0);
});

test("an object in a bucket stands below the prefix with its media type", async () => {
  await open.bucket().put("certificates/1.pdf", Uint8Array.of(1), "application/pdf");
  expect(bucket.objects.get("/captures/first/light/certificates/1.pdf")?.mediaType).toBe("application/pdf");
});

test("an address without a driver is refused", () => {
  expect(() => openStorage("https://storage.example/")).toThrow("no driver for https:");
});

function* halfOfAFile() {
  yield Uint8Array.of(2);
  throw new Error("disk is full");
}

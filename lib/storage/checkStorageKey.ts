import "server-only";

const KEY = /^[a-z0-9][a-z0-9._-]*(\/[a-z0-9][a-z0-9._-]*)*$/i;
const LONGEST = 500; // S3 allows 1024 bytes with the prefix; a disk 255 a part

/** A key is a relative path of plain names: no part is empty or starts with a dot, so none can climb out. */
export function checkStorageKey(key: string): string {
  if (key.length > LONGEST || !KEY.test(key) || key.split("/").some((part) => part.length > 200)) {
    throw new RangeError(`checkStorageKey: not a storage key: ${JSON.stringify(key.slice(0, 80))}`);
  }
  return key;
}

import { expect, test } from "vitest";
import { formula } from "@/lib/checks/formula/formula";
import { goldenOf } from "../goldenOf";
import { seedOf } from "../planOf";
import { CHAIN, planFrom } from "./plan";

/*
 * Cases of version 1 of the plan in plan.ts, for `seedOf(0)` and on: a released builder never changes, and a difference means
 * a new version of the kind.
 */
const HASHES: readonly string[] = [
  "03a765656726e261ce1a3baca0827d2fa555598c280a05ca0296c9a5b5293895",
  "87a514dc80134a03047eea207c6b7e14ec2d2ea20ed71fb672c2cecf5d00398b",
  "eadb3c427fa8419529ebb9d42acc2e3f59a76241f5f1ed0a9fd988550630d91e",
  "2ee0dc29e0b931d63e72b7d8bd9e60d57559ce6883968590e2cb3bf380537d4f",
  "ab575a9a5946a1883b11774bb32820ac02e623c93f9a7829ce0b1490aeea1742",
  "43dd3bf8e4a63043bf6eed0dc56385c586b754ddc82b0db9b593c1ce8247d2d1",
  "03b26b5509a18e25ac7f27679415884fa8e492924e6797208c4f1fe6e01e0ea5",
  "f5fcb3c3b7c63badb4288d7c2fa2c72b2c3c96fb37cee6729859dad653fcb556",
  "50affd6f4ee590d8fac995e1c0e20d14ae57f79eaac941a9f941c24576e77d5a",
  "2a40241b265924c164747ed3cdd0599068028f8eb19a01633a8ebf6bffee2832",
  "b24d589742668e77f5fe7a73ceccab04a45f438074cb14a58c2f3423ae258470",
  "205f6f67a0f7a328330812780506235f0ba30492d79032bb1a773eba291ef32c",
  "f1a7d366af054d0d683e81fc7d5f7cee712d72dbf89470d74dfb821223b056f1",
  "23983b23266231c1c6e3161b2b3a2fafd559bb158c09ba97773116076bfbbc86",
  "8f34e43311449a4ceab98a1638a8af6171ea92cc13539f0859315922fe83d018",
  "c8466ab7fccad50ba08b47423a5309f9a645c8fd9c586884184934dc0914e0af",
  "f65808a0b7fda04b08880f46227b7d12fb777a517a844b71b8e357391c1f0259",
  "06faa821c70e6ca23e9373025fc1da0191cec44afa379496f5c336542bb99ae5",
  "c58e62c73d5eeb567c052384e68a03b40d7fb164ed62a2b66be489c8988aecc6",
  "06de92ed7ea322fc94f7a96edb482bbd6444c1db340300f9b19d189423c9cee6",
];

test.each(HASHES.map((hash, n) => [n, hash] as const))("seed %i", (n, hash) =>
  expect(goldenOf(formula.build(seedOf(n), planFrom(CHAIN)))).toBe(hash),
);

import { expect, test } from "vitest";
import { linkSha256, NO_LINK } from "@/lib/trail/link";

// Both values by sha256sum over the two hashes written one after the other.
test("a link is the hash of the link before it and the entry's hash", () => {
  const first = linkSha256(NO_LINK, "60e20d7f9e852e1715d7d05c711bbb1a6079fd824e18d6ca024fc9c8f0f339c5");
  expect(first).toBe("5bb544f59f1e40ec79e3c0e0b1af948791e9419c203fd418528cb16da46d968d");
  expect(linkSha256(first, "cd".repeat(32))).toBe("6e396e7d985c0cbae71572d5b668acf5fd3323c82237482d2765fa2f47e572e9");
});

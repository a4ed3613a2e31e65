import { expect, test } from "vitest";
import { safeBack } from "@/lib/auth/safeBack";

test.each([
  ["/firm/desk", "/firm/desk"],
  ["/firm/sittings?page=2", "/firm/sittings?page=2"],
  ["/firm/desk#peak", "/firm/desk"],
  ["/firm/../other/desk", "/other/desk"],
  ["/sign-inside", "/sign-inside"],
])("%j is a place of our own", (back, place) => expect(safeBack(back)).toBe(place));

test.each([
  ["//elsewhere.example"],
  ["///elsewhere.example"],
  ["/\\elsewhere.example"],
  ["/\t/elsewhere.example"],
  ["/\n//elsewhere.example"],
  ["/.//elsewhere.example"],
  ["https://elsewhere.example/firm"],
  ["javascript:alert(1)"],
  ["firm/desk"],
  [""],
  ["/sign-in"],
  ["/sign-in/link?token=x"],
  ["/firm/../sign-in"],
  ["/api/trail/heads"],
  [null],
  [undefined],
  [42],
])("%j is none", (back) => expect(safeBack(back)).toBeNull());

test("a list, as an address with two answers gives it, is none", () => expect(safeBack(["/a", "/b"])).toBeNull());

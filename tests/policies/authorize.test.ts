import { expect, test } from "vitest";
import { ForbiddenError } from "@/lib/errors";
import { authorize } from "@/lib/policies/authorize";

test("refuses with a sentence for the person, and lets pass what is allowed", () => {
  expect(() => authorize(false, "pay this order")).toThrow(new ForbiddenError("You may not pay this order."));
  expect(authorize(true, "pay this order")).toBeUndefined();
});

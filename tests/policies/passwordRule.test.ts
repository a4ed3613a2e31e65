import { expect, test } from "vitest";
import { needsPresentPassword } from "@/lib/policies/passwordRule";
import { minutesFrom, NOW } from "@/tests/support/clock";

test.each([
  [
    "the first password of a person",
    { hasPassword: false, passwordAt: null, startedAt: minutesFrom(NOW, -300) },
    false,
  ],
  ["a session begun by password", { hasPassword: true, passwordAt: NOW, startedAt: NOW }, true],
  ["a link followed 15 minutes ago", { hasPassword: true, passwordAt: null, startedAt: minutesFrom(NOW, -15) }, false],
  ["a link followed 16 minutes ago", { hasPassword: true, passwordAt: null, startedAt: minutesFrom(NOW, -16) }, true],
])("%s decides whether the present one is asked for", (_when, person, asks) => {
  expect(needsPresentPassword(person, NOW)).toBe(asks);
});

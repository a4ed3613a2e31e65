import { readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, test } from "vitest";
import { readEnv, SETTINGS, settingProblems } from "@/lib/env";

const good = {
  PUBLIC_ORIGIN: "https://lagmark.example",
  NEXTAUTH_SECRET: "n".repeat(32),
  OWNER_DATABASE_URL: "postgres://lagmark_owner:a@127.0.0.1:5432/lagmark",
  DATABASE_URL: "postgres://lagmark_web:b@127.0.0.1:5432/lagmark",
  WORKER_DATABASE_URL: "postgres://lagmark_worker:c@127.0.0.1:5432/lagmark",
  STRIPE_SECRET_KEY: "sk_test_1",
  STRIPE_WEBHOOK_SECRET: "whsec_1",
  SMTP_URL: "smtp://127.0.0.1:2525",
  MAIL_FROM: "Lagmark <register@lagmark.example>",
  ISSUER_KEY_FILE: "/etc/lagmark/key.pem",
  ISSUER_CERTIFICATE_FILE: "/etc/lagmark/certificate.pem",
  ISSUER_ROOT_FILE: "/etc/lagmark/root.pem",
  SEED_KEY: "A".repeat(43),
  STORAGE_URL: "file:///var/lib/lagmark",
};
const everyProcess = ["owner", "web", "worker"] as const;

test("a complete set of settings has no problems", () => {
  expect(settingProblems(everyProcess, good)).toEqual([]);
});

test("everything missing is told at once, each with what it is for", () => {
  const problems = settingProblems(everyProcess, {});
  expect(problems.map((line) => line.trim().split(" ")[0]).sort()).toEqual(Object.keys(good).sort());
  for (const line of problems) expect(line).toMatch(/^ {2}[A-Z_]+ is missing \(.{10,}\)$/);
});

test("an empty setting counts as missing", () => {
  expect(settingProblems(["web"], { ...good, NEXTAUTH_SECRET: "" })).toEqual([
    "  NEXTAUTH_SECRET is missing (signs the session cookies)",
  ]);
});

test.each([
  ["PUBLIC_ORIGIN", "https://lagmark.example/register"],
  ["PUBLIC_ORIGIN", "http://lagmark.example"],
  ["NEXTAUTH_SECRET", "n".repeat(31)],
  ["DATABASE_URL", "mysql://127.0.0.1/lagmark"],
  ["STRIPE_SECRET_KEY", "pk_test_1"],
  ["STRIPE_WEBHOOK_SECRET", "secret"],
  ["SMTP_URL", "http://127.0.0.1"],
  ["MAIL_FROM", "nobody"],
  ["TRUSTED_PROXIES", "-1"],
  ["TRUSTED_PROXIES", "one"],
  ["TRUSTED_PROXIES", "10"],
  ["SEED_KEY", "A".repeat(42)],
  ["STORAGE_URL", "ftp://127.0.0.1/lagmark"],
  ["LOG_LEVEL", "loud"],
])("%s=%s is refused without repeating the value", (name, value) => {
  const problems = settingProblems(everyProcess, { ...good, [name]: value });
  expect(problems).toHaveLength(1);
  expect(problems[0]).toContain(`  ${name} `);
  expect(problems[0]).not.toContain(value);
});

test("a plain http address is taken on this machine", () => {
  expect(settingProblems(["web"], { ...good, PUBLIC_ORIGIN: "http://127.0.0.1:3000" })).toEqual([]);
});

describe("stand-ins stay in the demonstration", () => {
  const standIn = { ...good, STRIPE_API_URL: "http://127.0.0.1:9000" };
  test("another payment host is refused outside it", () =>
    expect(settingProblems(["web"], standIn)).toEqual(["  STRIPE_API_URL is for the demonstration only"]));
  test("and taken inside it", () => expect(settingProblems(["web"], { ...standIn, DEMONSTRATION: "1" })).toEqual([]));
  test("a live key is refused inside it", () =>
    expect(settingProblems(["web"], { ...standIn, DEMONSTRATION: "1", STRIPE_SECRET_KEY: "sk_live_1" })).toEqual([
      "  STRIPE_SECRET_KEY is a live key in a demonstration",
    ]));
});

test("the web process reads neither seed key nor issuer key nor another role's address", () => {
  const names = Object.keys(readEnv("web", good));
  expect(names).toContain("DATABASE_URL");
  for (const name of ["SEED_KEY", "ISSUER_KEY_FILE", "OWNER_DATABASE_URL", "WORKER_DATABASE_URL"]) {
    expect(names).not.toContain(name);
  }
});

test("the worker reads neither the web role's address nor the session secret", () => {
  const names = Object.keys(readEnv("worker", good));
  expect(names).toContain("SEED_KEY");
  for (const name of ["DATABASE_URL", "OWNER_DATABASE_URL", "NEXTAUTH_SECRET"]) expect(names).not.toContain(name);
});

test("reading an incomplete set throws the whole list", () => {
  expect(() => readEnv("worker", { ...good, SEED_KEY: undefined, SMTP_URL: "" })).toThrow(
    /Settings of the worker process:\n {2}SMTP_URL is missing .*\n {2}SEED_KEY is missing /,
  );
});

test(".env.example documents every setting, and no other", () => {
  const lines = readFileSync(path.resolve(import.meta.dirname, "../../.env.example"), "utf8").split("\n");
  const names = lines.flatMap((line) => line.match(/^(?:# )?([A-Z][A-Z0-9_]+)=/)?.[1] ?? []);
  // PORT is read by the start command alone.
  expect([...names].sort()).toEqual([...Object.keys(SETTINGS.shape), "PORT"].sort());
});

import { NextRequest } from "next/server";
import { afterEach, expect, test, vi } from "vitest";
import { config, proxy } from "@/proxy";

afterEach(() => vi.unstubAllEnvs());

const policyOf = () =>
  proxy(new NextRequest("https://register.example/verify")).headers.get("content-security-policy")!;
const nonceOf = (policy: string) => /'nonce-([^']+)'/.exec(policy)?.[1];

test("every answer has a nonce of its own", () => {
  const [first, second] = [policyOf(), policyOf()].map(nonceOf);
  expect(first).toBeTruthy();
  expect(first).not.toBe(second);
});

test("the page is told the nonce of its policy", () => {
  const response = proxy(new NextRequest("https://register.example/verify"));
  const nonce = nonceOf(response.headers.get("content-security-policy")!);
  expect(response.headers.get("x-middleware-request-x-nonce")).toBe(nonce);
  expect(response.headers.get("x-middleware-request-content-security-policy")).toContain(nonce);
});

test("in production no script runs without the nonce, no page is framed, no form goes elsewhere", () => {
  vi.stubEnv("NODE_ENV", "production");
  const rules = new Map(
    policyOf()
      .split("; ")
      .map((rule) => [rule.split(" ")[0], rule.split(" ").slice(1)]),
  );
  expect(rules.get("script-src")).not.toContain("'unsafe-inline'");
  expect(rules.get("script-src")).not.toContain("'unsafe-eval'");
  expect(rules.get("style-src")).not.toContain("'unsafe-inline'");
  expect(rules.get("frame-ancestors")).toEqual(["'none'"]);
  expect(rules.get("form-action")).toEqual(["'self'"]);
  expect(rules.get("object-src")).toEqual(["'none'"]);
});

test("uploads and files of the build do not pass through it", () => {
  const [{ source }] = config.matcher;
  const matches = (path: string) => new RegExp(`^${source}$`).test(path);
  expect(["/", "/verify/LM-1", "/firm/desk", "/apiary"].map(matches)).toEqual([true, true, true, true]);
  expect(["/api/verify/file", "/_next/static/a.js", "/icon.svg"].map(matches)).toEqual([false, false, false]);
});

import path from "node:path";
import { defineConfig } from "vitest/config";

const alias = {
  "@": path.resolve(import.meta.dirname),
  // Next replaces this package at build time; plain Node would refuse it.
  "server-only": path.resolve(import.meta.dirname, "tests/support/server-only.ts"),
};
const project = (name: string, folders: string[], more: object = {}) => ({
  resolve: { alias },
  // A limit against hanging only: on a busy machine the default of five seconds cut off tests that pass.
  test: { name, include: folders.map((folder) => `tests/${folder}/**/*.test.{ts,tsx}`), testTimeout: 60_000, ...more },
});

export default defineConfig({
  test: {
    projects: [
      // No database, no network.
      project("unit", [
        "numeric",
        "gnss",
        "formats",
        "checks",
        "policies",
        "mdx",
        "certificates",
        "schemas",
        "lib",
        "scripts",
        "components",
      ]),
      { resolve: { alias }, test: { name: "rules", include: ["tests/*.test.ts"], testTimeout: 60_000 } },
      // Real PostgreSQL: OWNER_DATABASE_URL, DATABASE_URL and WORKER_DATABASE_URL come from scripts/test.mjs.
      project(
        "database",
        ["migrations", "models", "commands", "queries", "jobs", "payments", "auth", "routes", "worker"],
        {
          fileParallelism: false,
          setupFiles: ["tests/support/database.ts"],
          testTimeout: 120_000,
        },
      ),
      // A built application, driven by Chromium: PUBLIC_ORIGIN comes from scripts/test.mjs.
      project("browser", ["entrances", "e2e"], { fileParallelism: false, testTimeout: 240_000, hookTimeout: 120_000 }),
    ],
  },
});

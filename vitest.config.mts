import path from "node:path";
import { defineConfig } from "vitest/config";

const alias = {
  "@": path.resolve(import.meta.dirname),
  // Next replaces this package at build time; plain Node would refuse it.
  "server-only": path.resolve(import.meta.dirname, "tests/support/server-only.ts"),
};
const project = (name: string, folders: string[], more: object = {}) => ({
  resolve: { alias },
  // Limits against hanging only: on a busy machine the defaults of five and ten seconds cut off tests that pass.
  test: {
    name,
    include: folders.map((folder) => `tests/${folder}/**/*.test.{ts,tsx}`),
    testTimeout: 60_000,
    hookTimeout: 60_000,
    ...more,
  },
});

// All files share the database and, one after the other, one process: half of the time went into loading the same modules.
const DATABASE = {
  fileParallelism: false,
  isolate: false,
  setupFiles: ["tests/support/database.ts"],
  testTimeout: 120_000,
};

export default defineConfig({
  test: {
    projects: [
      // No database, no network. Pure functions keep nothing from file to file, so that they are loaded once.
      project("unit", ["numeric", "gnss", "formats", "checks", "policies"], { isolate: false }),
      project("unit-settings", ["mdx", "certificates", "schemas", "lib", "scripts", "components"]),
      { resolve: { alias }, test: { name: "rules", include: ["tests/*.test.ts"], testTimeout: 60_000 } },
      // Real PostgreSQL: OWNER_DATABASE_URL, DATABASE_URL and WORKER_DATABASE_URL come from scripts/test.mjs.
      project("database", ["migrations", "models", "commands", "queries"], {
        ...DATABASE,
        exclude: ["**/*.worker.test.ts"],
        sequence: { groupOrder: 1 },
      }),
      // One process has one role, so the tests of the worker's tasks have a process of their own.
      project("database-worker", ["worker"], {
        ...DATABASE,
        include: ["tests/worker/**/*.test.ts", "tests/**/*.worker.test.ts"],
        sequence: { groupOrder: 2 },
      }),
      // Entrances read their settings once, and these tests set them: each file begins anew.
      project("database-entrances", ["payments", "auth", "routes"], {
        ...DATABASE,
        isolate: true,
        sequence: { groupOrder: 3 },
      }),
      // A built application, driven by Chromium: PUBLIC_ORIGIN comes from scripts/test.mjs.
      project("browser", ["entrances", "e2e"], { fileParallelism: false, testTimeout: 240_000, hookTimeout: 120_000 }),
    ],
  },
});

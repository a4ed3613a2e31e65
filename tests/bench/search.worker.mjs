// A thread starts with plain JavaScript; the rest is TypeScript, which the register script teaches it.
await import("../../scripts/register.mjs");
await import("./search.worker.ts");

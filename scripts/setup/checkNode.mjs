import { Refusal } from "./say.mjs";

/** The packages' own floor; a newer major is not what the tests ran on. */
export function checkNode() {
  const [major, minor] = process.versions.node.split(".").map(Number);
  if (major === 20 && minor >= 19) return;
  throw new Refusal(`Node.js 20.19 or a later 20 is needed; this is ${process.versions.node}.`);
}

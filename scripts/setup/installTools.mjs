import fs from "node:fs";
import path from "node:path";
import { installDebianPackages } from "./installDebianPackages.mjs";
import { say } from "./say.mjs";

/** Programs the tests hold the product's files against, with the Debian package of each. */
const TOOLS = {
  chromium: "chromium",
  pdfsig: "poppler-utils",
  pdftotext: "poppler-utils",
  qpdf: "qpdf",
  certutil: "libnss3-tools",
  openssl: "openssl",
};

export async function installTools() {
  const missing = Object.keys(TOOLS).filter((name) => !programPath(name));
  if (missing.length === 0) return;
  const packages = [...new Set(missing.map((name) => TOOLS[name]))];
  say(`Installing tools of the tests: ${packages.join(", ")} ...`);
  await installDebianPackages(packages);
}

export const programPath = (name) =>
  (process.env.PATH ?? "")
    .split(":")
    .map((folder) => path.join(folder, name))
    .find((file) => fs.existsSync(file));

import { createHash } from "node:crypto";
import fs from "node:fs";
import path from "node:path";

/** One fingerprint of files and whole folders by path and content; what is not there counts as not there. */
export function fingerprint(root, names, more = []) {
  const hash = createHash("sha256").update(JSON.stringify(more));
  for (const name of names) addTo(hash, root, name);
  return hash.digest("hex");
}

function addTo(hash, root, name) {
  const entry = fs.statSync(path.join(root, name), { throwIfNoEntry: false });
  if (!entry) return;
  if (entry.isDirectory()) {
    for (const child of fs.readdirSync(path.join(root, name)).sort()) addTo(hash, root, path.join(name, child));
  } else hash.update(`${name}\0${entry.size}\0`).update(fs.readFileSync(path.join(root, name)));
}

import { createHash } from "node:crypto";
import type { BuiltCase, CaseFile, Marking } from "@/lib/checks/kind";

/** SHA-256 over a case as it is handed out and as it is marked: public case, truth, files. */
export function goldenOf({ publicCase, truth, files }: Pick<BuiltCase, "publicCase" | "truth" | "files">): string {
  const hash = createHash("sha256").update(JSON.stringify([publicCase, truth]));
  for (const file of files) hash.update(fileHead(file)).update(file.bytes);
  return hash.digest("hex");
}

const fileHead = ({ name, mediaType, bytes }: CaseFile) => `\n${name} ${mediaType} ${bytes.length}\n`;

/** SHA-256 over what a marking computed: its figures, not the words around them. */
export function goldenFigures({ rows, workings, withinCount, needs, met }: Marking): string {
  const figures = rows.map(({ quantity, subject, understood, computed, difference, within }) => [
    ...[quantity, subject, understood, computed, difference, within],
  ]);
  const values = workings.map(({ value }) => value);
  return createHash("sha256")
    .update(JSON.stringify([figures, values, withinCount, needs, met]))
    .digest("hex");
}

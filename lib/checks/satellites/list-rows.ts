import type { SceneSatellite } from "@/lib/gnss/scene";
import type { AskedQuantities, AskedQuantity } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import type { MarkedRow } from "../kind";
import { markWord } from "../markWord";
import type { Finding } from "../markNumber";
import type { SatellitesTruth } from "./drawScene";
import type { ListedLine, ReadLines } from "./readLines";

/** Whether a satellite that must be found is listed, once. */
export function markFound(quantity: AskedQuantity, satellite: SceneSatellite, lines: readonly ListedLine[]): MarkedRow {
  const level = formatQuantity(satellite.cn0DbHz, "dB-Hz", 1);
  const missing: Finding = {
    errorClass: "missed",
    reason: `PRN ${satellite.prn} is in the capture at ${level} and not in your list.`,
  };
  const problem = lines.length === 0 ? missing : twice(satellite.prn, lines);
  return markWord({
    quantity,
    subject: `PRN ${satellite.prn}`,
    label: "Listed",
    handedIn: lines.length === 0 ? "" : "listed",
    computed: `in the capture, ${level}`,
    finding: problem,
  });
}

/** One row for each line that names a satellite which is not there, or none at all. */
export function markInvented(
  asked: AskedQuantities,
  { scene }: SatellitesTruth,
  { byPrn, unread }: ReadLines,
): MarkedRow[] {
  const quantity = asked.get("invented");
  if (!quantity) return [];
  const outside = (subject: string, handedIn: string, finding: Finding) =>
    markWord({
      quantity,
      subject,
      label: "Listed",
      handedIn,
      computed: "not in the capture",
      tolerance: "none",
      finding,
    });
  const present = new Set(scene.satellites.map(({ prn }) => prn));
  const invented = [...byPrn.keys()].filter((prn) => !present.has(prn));
  const rows = [
    ...invented.map((prn) =>
      outside(`PRN ${prn}`, "listed", { errorClass: "invented", reason: `PRN ${prn} is not in the capture.` }),
    ),
    ...unread.map(({ line, prn, problem }) => outside(`Line ${line}`, prn, { errorClass: null, reason: problem })),
  ];
  if (rows.length > 0) return rows;
  const empty = byPrn.size === 0;
  return [
    markWord({
      quantity,
      handedIn: empty ? "" : "none",
      computed: "none",
      tolerance: "none",
      finding: empty ? { errorClass: null, reason: "Nothing was handed in." } : null,
    }),
  ];
}

export const twice = (prn: number, lines: readonly ListedLine[]): Finding | null =>
  lines.length < 2
    ? null
    : {
        errorClass: "listed twice",
        reason: `PRN ${prn} is listed in lines ${lines.map(({ line }) => line).join(" and ")}, so none of them is taken.`,
      };

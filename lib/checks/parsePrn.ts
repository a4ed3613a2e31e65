import { isBlank } from "./answerOf";

const LAST_PRN = 32;

/** "7", "07", "G07" or "PRN 7". */
export function parsePrn(text: string): { prn: number } | { problem: string } {
  if (isBlank(text)) return { problem: "Nothing was handed in." };
  const figures = /^\s*(?:G|PRN|SV)?\s*0*([0-9]{1,3})\s*$/i.exec(text)?.[1];
  if (figures === undefined) return { problem: `“${shortened(text)}” is not a PRN.` };
  const prn = Number(figures);
  if (prn >= 1 && prn <= LAST_PRN) return { prn };
  return { problem: `GPS satellites have PRN 1 to ${LAST_PRN}; ${prn} is none of them.` };
}

const shortened = (text: string) => (text.trim().length > 40 ? `${text.trim().slice(0, 40)}…` : text.trim());

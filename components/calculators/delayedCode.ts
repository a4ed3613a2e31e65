import { caCode } from "@/lib/gnss/caCode";
import { circularCorrelation } from "@/lib/gnss/correlation";

/**
 * A satellite's C/A code, received `delayChips` late, against the receiver's own copy: agreement in chips at every lag.
 * @param delayChips whole chips, 0 to 1022
 */
export function delayedCorrelation(prn: number, delayChips: number): Int32Array {
  const code = caCode(prn);
  const received = code.map((_, chip) => code[(chip - delayChips + code.length) % code.length]);
  return circularCorrelation(code, received);
}

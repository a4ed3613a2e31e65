import { CA_CHIP_RATE_HZ, chipsToMetres } from "@/lib/gnss/constants";
import { parseQuantity, type Reading } from "./parseQuantity";

/** A C/A code phase in chip; a time or a length is turned into chips of this code. */
export function parseCodePhase(text: string): Reading {
  const chips = parseQuantity(text, "chip");
  if ("value" in chips) return chips;
  const seconds = parseQuantity(text, "s");
  if ("value" in seconds) return { value: seconds.value * CA_CHIP_RATE_HZ };
  const metres = parseQuantity(text, "m");
  return "value" in metres ? { value: metres.value / chipsToMetres(1) } : chips;
}

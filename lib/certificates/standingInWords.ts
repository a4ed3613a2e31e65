import { dayInWords } from "./dates";
import type { RegisterEntry } from "./verificationFacts";

const NO_RELIANCE = "Do not rely on this certificate.";

/** What the register said of the certificate, as one or two sentences; one that does not hold begins with what not to do. */
export function standingInWords(entry: RegisterEntry): string {
  const since = dayInWords(entry.standingSince.slice(0, 10));
  switch (entry.standing) {
    case "Valid":
      return "On this day the register showed the certificate as valid.";
    case "Not yet valid":
      return `It holds from ${dayInWords(entry.effectiveOn)} on, and not before.`;
    case "Suspended":
      return `${NO_RELIANCE} It is suspended since ${since}${ground(entry)}. A suspension can be taken back.`;
    case "Withdrawn":
      return `${NO_RELIANCE} It was withdrawn on ${since}${ground(entry)}.`;
    case "Superseded":
      return `${NO_RELIANCE} A later certificate took its place on ${since}.`;
    case "Expired":
      return `${NO_RELIANCE} Its last day was ${dayInWords(entry.lastDay)}.`;
  }
}

const ground = (entry: RegisterEntry) => (entry.ground ? `; ground: ${entry.ground}` : "");

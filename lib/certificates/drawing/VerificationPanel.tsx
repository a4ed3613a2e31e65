import { instantInZone, offsetInZone } from "../dates";
import type { VerificationFacts } from "../verificationFacts";
import type { Density } from "./page";
import { Panel } from "./Panel";

/** When and where it was verified, against which file; and by what this page is signed. */
export function VerificationPanel({ facts, density }: { facts: VerificationFacts; density: Density }) {
  const { entry, origin, file } = facts;
  const { issuer } = entry;
  return (
    <Panel
      density={density}
      cells={[
        {
          title: "Verified",
          rows: [
            ["At", instantInZone(entry.readAt, issuer.timeZone)],
            ["Time zone", `${issuer.timeZone}, ${offsetInZone(entry.readAt, issuer.timeZone)}`],
            ["Register", origin.replace(/^https?:\/\//, "")],
            ["File", fileInWords(file)],
          ],
        },
        {
          title: "Signed by the register",
          rows: [
            ["Signature", "in this file, over all of it"],
            ["Key", "ES256, its certificate in this file"],
            ["What for", "this record alone; it is no certificate"],
          ],
        },
      ]}
    />
  );
}

function fileInWords(file: VerificationFacts["file"]): string {
  if (!file) return "none was compared";
  const print = file.sha256.slice(0, 16).toUpperCase();
  return file.agrees
    ? `compared, and byte for byte the one issued; SHA-256 ${print}...`
    : `compared, and NOT the one issued; SHA-256 ${print}...`;
}

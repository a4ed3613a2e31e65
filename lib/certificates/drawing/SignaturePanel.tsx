import { instantInWords } from "../dates";
import type { CertificateFace } from "./CertificateDocument";
import type { Density } from "./page";
import { Panel } from "./Panel";
import { verifyPlace } from "./verifyPlace";

/** Who decided, and by what the file is signed: a decider signs in afresh and has no key, the register has one. */
export function SignaturePanel({ face, density }: { face: CertificateFace; density: Density }) {
  const { decided } = face.record;
  const line = decided.outsideLine ? "outside the candidate's line" : "inside the candidate's line";
  return (
    <Panel
      density={density}
      cells={[
        {
          title: "Decided",
          rows: [
            ["Decided by", `${decided.by}, ${line}`],
            ["At", instantInWords(decided.at)],
            ["Signed in afresh", instantInWords(decided.signedAfreshAt)],
          ],
        },
        {
          title: "Signed by the register",
          rows: [
            ["Signature", "in this file, over all of it"],
            ["Key", "ES256, its certificate in this file"],
            ["Standing", `read it at ${verifyPlace(face.verifyAddress)}`],
          ],
        },
      ]}
    />
  );
}

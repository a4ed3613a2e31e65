import type { PublicFileVerdict } from "@/lib/queries/verifyPublicFile";

/** What a person is told of a file. */
export type FileAnswer = {
  tone: "plus" | "caution" | "minus";
  fact: string;
  detail: string;
  /** A number that the register knows; null when there is nothing to open. */
  number: string | null;
};

/** Each way in which a file can disagree gets its own sentence; only a whole, genuine, agreeing and valid one is blue. */
export function fileAnswer({ file, register, agrees }: PublicFileVerdict): FileAnswer {
  const number = register?.number ?? null;
  const refuse = (fact: string, detail: string): FileAnswer => ({ tone: "minus", fact, detail, number });
  switch (file.signature) {
    case "unreadable":
      return refuse(
        "This is not a certificate file.",
        "It could not be read as a PDF of this register, or it is larger than 10 MB.",
      );
    case "absent":
      return refuse(
        "This file carries no signature.",
        "A certificate of this register is always signed. Ask the holder for the file as it was mailed.",
      );
    case "other-signer":
      return refuse(
        "This file was not signed by this register.",
        `It names ${file.signerName ?? "an unknown signer"}. Do not rely on it.`,
      );
    case "altered":
      return file.wholeFile
        ? refuse(
            "This file was changed after it was signed.",
            "Its bytes do not agree with its signature. Do not rely on it.",
          )
        : refuse(
            "Something was added to this file after it was signed.",
            "The signature does not cover the whole file. Do not rely on it.",
          );
    case "genuine":
      break;
  }
  if (!file.number)
    return refuse(
      "This register signed the file, but it is no certificate.",
      "It may be the record of a verification. Verify the certificate's number for its standing today.",
    );
  if (!register)
    return refuse(
      "The signature is genuine, but the register has no such entry.",
      "Do not rely on it before you have asked the register.",
    );
  if (!agrees)
    return refuse(
      "File and register do not agree.",
      "The signature is genuine, but this is not the file the register holds for this number.",
    );
  if (register.standing === "Valid") {
    return {
      tone: "plus",
      fact: "Signature genuine, file and register agree.",
      detail: "The register says: Valid.",
      number,
    };
  }
  const tone = register.standing === "Suspended" || register.standing === "Not yet valid" ? "caution" : "minus";
  const detail = "File and register agree, and the signature is genuine; the standing decides.";
  return { tone, fact: `The register says: ${register.standing}.`, detail, number };
}

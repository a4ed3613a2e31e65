/** Why a typed text is no certificate number, and what to look at. */
export const numberProblem = (problem: "form" | "check-character"): string =>
  problem === "form"
    ? "A number has ten characters and a check character, as in LM-7K4Q2-M9XR0-5."
    : "No certificate has this number: the last character does not follow from the others. One character is mistyped.";

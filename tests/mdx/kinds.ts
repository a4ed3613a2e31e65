import type { CheckKind } from "@/lib/checks/kind";

const unused = () => {
  throw new Error("Reading a module builds and marks nothing");
};

/** A kind with every sort of parameter and quantity, which only the reading of modules sees. */
export const SAMPLE_KIND: CheckKind = {
  id: "sample",
  version: 3,
  letter: "Z1",
  title: "Read a sample",
  defaultMinutes: 20,
  parameters: [
    {
      name: "cn0",
      label: "C/N0",
      help: "Weakest.",
      input: "range",
      unit: "dB-Hz",
      from: 20,
      to: 55,
      whole: false,
      default: [34, 43],
    },
    {
      name: "window",
      label: "Window",
      help: "Half width.",
      input: "number",
      unit: "Hz",
      from: 0,
      to: 20_000,
      whole: false,
      default: 5000,
    },
    {
      name: "format",
      label: "Format",
      help: "Samples.",
      input: "choice",
      choices: [
        { value: "ci8", label: "8 bit" },
        { value: "ci16", label: "16 bit" },
      ],
      default: "ci8",
    },
  ],
  quantities: [
    {
      id: "found",
      label: "Satellites",
      unit: null,
      tolerance: null,
      toleranceRange: null,
      critical: true,
      reason: "Exact.",
    },
    {
      id: "codePhase",
      label: "Code phase",
      unit: "chip",
      tolerance: { value: 0.5, unit: "chip" },
      toleranceRange: { from: 0.1, to: 2, unit: "chip" },
      critical: false,
      reason: "Half a chip.",
    },
    {
      id: "length",
      label: "Length",
      unit: "m",
      tolerance: { value: 1, unit: "%" },
      toleranceRange: { from: 0.2, to: 5, unit: "%" },
      critical: false,
      reason: "A conversion.",
    },
    {
      id: "bin",
      label: "Doppler",
      unit: "Hz",
      tolerance: null,
      toleranceRange: null,
      critical: false,
      reason: "Half of your own bin.",
    },
  ],
  cautions: [],
  build: unused,
  mark: unused,
  solve: unused,
  wrongMethods: {},
};

import type { CodeTable, Signal } from "./signal";

// Loaded one by one: a page that draws C/A codes must not carry the tables of all the others into the browser.
const SIGNALS = {
  GPS_L1CA: async () => (await import("./gpsL1Ca")).gpsL1Ca,
  GPS_L1CD: async () => (await import("./gpsL1cD")).gpsL1cD,
  GPS_L1CP: async () => (await import("./gpsL1cP")).gpsL1cP,
  GPS_L2CM: async () => (await import("./gpsL2cM")).gpsL2cM,
  GPS_L2CL: async () => (await import("./gpsL2cL")).gpsL2cL,
  GPS_L5I: async () => (await import("./gpsL5I")).gpsL5I,
  GPS_L5Q: async () => (await import("./gpsL5Q")).gpsL5Q,
  GAL_E1B: async () => (await import("./galileoE1B")).galileoE1B,
  GAL_E1C: async () => (await import("./galileoE1C")).galileoE1C,
  GAL_E5aI: async () => (await import("./galileoE5aI")).galileoE5aI,
  GAL_E5aQ: async () => (await import("./galileoE5aQ")).galileoE5aQ,
  GAL_E5bI: async () => (await import("./galileoE5bI")).galileoE5bI,
  GAL_E5bQ: async () => (await import("./galileoE5bQ")).galileoE5bQ,
} satisfies Record<string, () => Promise<Signal>>;

const TABLES = {
  ...SIGNALS,
  // A code of its own table that no signal carries alone.
  GPS_L1CO: async () => (await import("./gpsL1cO")).gpsL1cO,
} satisfies Record<string, () => Promise<CodeTable>>;

export type SignalName = keyof typeof SIGNALS;
export type CodeName = keyof typeof TABLES;

export const SIGNAL_NAMES = Object.keys(SIGNALS) as readonly SignalName[];
export const CODE_NAMES = Object.keys(TABLES) as readonly CodeName[];

export const isSignalName = (name: string): name is SignalName => Object.hasOwn(SIGNALS, name);
export const isCodeName = (name: string): name is CodeName => Object.hasOwn(TABLES, name);

export const loadSignal = (name: SignalName): Promise<Signal> => SIGNALS[name]();
export const loadCodes = (name: CodeName): Promise<CodeTable> => TABLES[name]();

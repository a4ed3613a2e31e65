import type { Signal } from "./signal";

// Loaded one by one: a page that draws C/A codes must not carry the tables of all the others into the browser.
const SIGNALS = {
  GPS_L1CA: async () => (await import("./gpsL1Ca")).gpsL1Ca,
} satisfies Record<string, () => Promise<Signal>>;

export type SignalName = keyof typeof SIGNALS;

export const SIGNAL_NAMES = Object.keys(SIGNALS) as readonly SignalName[];

export const isSignalName = (name: string): name is SignalName => Object.hasOwn(SIGNALS, name);

export const loadSignal = (name: SignalName): Promise<Signal> => SIGNALS[name]();

/** A part of the chain as direct current sees it. Order: antenna first. */
export type DcPart = {
  /** Current that the part itself draws, 0 for a passive one. */
  currentMa: number;
  /** Least voltage at which it works; 0 for a passive one. */
  minimumV: number;
  /** Resistance of the way through it, there and back; a cable's loop resistance times its length. */
  resistanceOhm: number;
  /** Whether feed current gets through towards the antenna. */
  passesDc: boolean;
};

/** The feed at the receiver's end. */
export type DcSupply = { volts: number; limitMa: number; sourceOhm: number };

export type DcState = {
  /** Through the part's end at the receiver's side. */
  currentMa: number;
  /** At the part, on its receiver's side; null when no feed reaches it. */
  volts: number | null;
  /** A part that draws no current is always fed well. */
  fed: boolean;
};

export type DcFeed = { parts: DcState[]; totalMa: number; withinLimit: boolean; allFed: boolean };

/**
 * Voltage and current along a chain that the receiver feeds through the coaxial line: Ohm's law, parts drawing constant
 * currents. A part works on the voltage at its receiver's side and hands on what is left behind its own resistance.
 * @param parts antenna first, as the signal runs
 */
export function dcFeed(parts: readonly DcPart[], supply: DcSupply): DcFeed {
  for (const { currentMa, resistanceOhm } of parts)
    if (!(currentMa >= 0 && resistanceOhm >= 0))
      throw new RangeError(`dcFeed: current and resistance from 0, got ${currentMa} mA, ${resistanceOhm} ohm`);
  const drawnMa = drawnTowardsAntenna(parts);
  const totalMa = parts.length === 0 ? 0 : drawnMa[parts.length - 1];
  const states: DcState[] = [];
  let volts: number | null = supply.volts - (totalMa * supply.sourceOhm) / 1000;
  for (let n = parts.length - 1; n >= 0; n--) {
    const part = parts[n];
    const through = volts === null ? 0 : drawnMa[n];
    states[n] = { currentMa: through, volts, fed: part.currentMa === 0 || (volts !== null && volts >= part.minimumV) };
    const onwardMa: number = through - (volts === null ? 0 : part.currentMa);
    volts = volts !== null && part.passesDc ? volts - (onwardMa * part.resistanceOhm) / 1000 : null;
  }
  return { parts: states, totalMa, withinLimit: totalMa <= supply.limitMa, allFed: states.every(({ fed }) => fed) };
}

/** Current that each part and those beyond it draw, as far as direct current gets. */
function drawnTowardsAntenna(parts: readonly DcPart[]): number[] {
  let beyondMa = 0;
  return parts.map((part) => {
    beyondMa = (part.passesDc ? beyondMa : 0) + part.currentMa;
    return beyondMa;
  });
}

/** Loop resistance in ohm of a run of cable, from its inner and outer conductors' resistance per 1000 m. */
export const loopResistanceOhm = (lengthM: number, innerOhmPerKm: number, outerOhmPerKm: number): number =>
  (lengthM * (innerOhmPerKm + outerOhmPerKm)) / 1000;

import { searchSignalOf } from "@/lib/gnss/search/searchSignal";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import type { SearchSignal } from "@/lib/gnss/search/searchSignal";
import type { SampledCapture } from "@/lib/gnss/search/sampledCapture";
import { seededRandom } from "@/lib/numeric/random";

const GPS_L1CA = searchSignalOf(gpsL1Ca);

export type RawSatellite = { prn: number; codePhaseChips: number; dopplerHz: number; cn0DbHz: number };

export type RawScene = {
  seed: string;
  rateHz: number;
  ifHz: number;
  complex: boolean;
  durationMs: number;
  satellites: readonly RawSatellite[];
  /** GPS L1 C/A when left out. */
  signal?: SearchSignal;
  /** Parts of alternating sign of a chip by its number, where not all chips of the signal have the same. */
  halvesOfChip?: (chip: number) => number;
  /** Unmodulated carrier: offset from the carrier, level over the strongest satellite. */
  tone?: { offsetHz: number; jamToSignalDb: number };
};

/**
 * A capture written down from the definition, with no function of the engine but the codes and the dice: hard chips,
 * unfiltered, sampled as they come, data bits of 20 ms, white noise of power 1 per complex sample, 1/2 per real one. Its density
 * is 1/rate in both cases; the power of a real carrier of amplitude A is half of A^2.
 */
export function rawCapture(scene: RawScene): SampledCapture {
  const { rateHz, ifHz, complex, durationMs, satellites, tone, signal = GPS_L1CA } = scene;
  const { chipRateHz, carrierHz, lengthChips, halvesPerChip } = signal;
  const halvesOfChip = scene.halvesOfChip ?? (() => halvesPerChip);
  const periodMs = (1000 * lengthChips) / chipRateHz;
  const symbolMs = Math.min(20, 1000 * signal.symbolS);
  const random = seededRandom(scene.seed, "raw");
  const count = Math.floor((rateHz * durationMs) / 1000);
  const samples = new Float32Array(complex ? 2 * count : count);
  const sources = satellites.map((satellite) => ({
    ...satellite,
    code: signal.chips(satellite.prn),
    phase: random.uniform(),
    bits: Array.from({ length: 200 }, () => (random.uniform() < 0.5 ? -1 : 1)),
    // Symbols change where a code period begins.
    edge: periodMs * (satellite.codePhaseChips / lengthChips + Math.floor((random.uniform() * symbolMs) / periodMs)),
    amplitude: Math.sqrt(((complex ? 1 : 2) * 10 ** (satellite.cn0DbHz / 10)) / rateHz),
  }));
  const strongest = Math.max(0, ...sources.map(({ amplitude }) => amplitude));
  const jam = tone ? { hz: tone.offsetHz, amplitude: strongest * 10 ** (tone.jamToSignalDb / 20) } : null;
  for (let n = 0; n < count; n++) {
    const t = n / rateHz;
    let [re, im] = [0, 0];
    const add = (amplitude: number, turns: number) => {
      re += amplitude * Math.cos(2 * Math.PI * (turns % 1));
      im += amplitude * Math.sin(2 * Math.PI * (turns % 1));
    };
    for (const { code, codePhaseChips, dopplerHz, phase, bits, edge, amplitude } of sources) {
      const chips = codePhaseChips + chipRateHz * (1 + dopplerHz / carrierHz) * t;
      const chip = Math.floor(chips) % lengthChips;
      const half = Math.floor((chips % 1) * halvesOfChip(chip)) % 2 ? -1 : 1;
      const bit = bits[Math.floor((t * 1000 + edge) / symbolMs)];
      add(amplitude * bit * half * code[chip], phase + (ifHz + dopplerHz) * t);
    }
    if (jam) add(jam.amplitude, (ifHz + jam.hz) * t);
    if (complex) {
      samples[2 * n] = re + Math.SQRT1_2 * random.gaussian();
      samples[2 * n + 1] = im + Math.SQRT1_2 * random.gaussian();
    } else samples[n] = re + Math.SQRT1_2 * random.gaussian();
  }
  return { samples, complex, rateHz, ifHz };
}

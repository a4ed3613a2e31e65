import { cosTurns, PI, sinTurns } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { bandLimitedCode, CODE_TABLE_POINTS, highestLineInBand, POINTS_PER_CHIP } from "../bandLimitedCode";
import { CA_CHIP_RATE_HZ, CA_LENGTH_CHIPS, L1_HZ } from "../constants";
import { samplesPerCodePeriod } from "../doppler";
import { createBandNoise } from "./bandNoise";
import { checkInterferer, type Interferer } from "./interferer";

/** Adds to complex samples, I and Q alternating, block after block. */
export type InterferenceSource = {
  /** Adds to a block, which goes on where the one before ended. */
  addTo(block: Float64Array): void;
};

/** Place on the carrier in turns, and whether it is on, at a sample. */
type Carrier = (sample: number) => { turns: number; isOn: boolean };

/**
 * An interference to add to a capture in blocks of any length: the sum does not depend on how the samples are cut. Bit
 * for bit the same everywhere.
 * @param rateHz of the complex samples; for a matched code a whole number of kHz from 2046
 * @param random drawn twice per sample by noise, not at all by the others
 */
export function createInterference(interferer: Interferer, rateHz: number, random: Random): InterferenceSource {
  checkInterferer(interferer);
  const amplitude = Math.sqrt(interferer.power);
  if (interferer.kind === "noise") return createNoiseSource(interferer, rateHz, amplitude, random);
  const levelAt = interferer.kind === "matched-code" ? codeLevel(interferer, rateHz) : () => 1;
  const carrierAt = carrierOf(interferer, rateHz);
  let sample = 0;
  return {
    addTo(block) {
      for (let n = 0; n < block.length; n += 2) {
        const { turns, isOn } = carrierAt(sample);
        if (isOn) {
          const level = amplitude * levelAt(sample);
          block[n] += level * cosTurns(turns);
          block[n + 1] += level * sinTurns(turns);
        }
        sample += 1;
      }
    },
  };
}

function carrierOf(interferer: Exclude<Interferer, { kind: "noise" }>, rateHz: number): Carrier {
  const passes = (frequencyHz: number) => Math.abs(frequencyHz) <= rateHz / 2;
  if (interferer.kind === "matched-code") {
    const { dopplerHz } = interferer;
    return (sample) => ({ turns: (sample * dopplerHz) / rateHz, isOn: passes(dopplerHz) });
  }
  const { offsetHz } = interferer;
  const plain = (sample: number) => (sample * offsetHz) / rateHz;
  switch (interferer.kind) {
    case "tone":
      return (sample) => ({ turns: interferer.phaseCycles + plain(sample), isOn: passes(offsetHz) });
    case "narrow-fm": {
      const { deviationHz, modulationHz } = interferer;
      const swing = deviationHz / (2 * PI * modulationHz); // turns, the integral of the deviation
      return (sample) => {
        const wave = (sample * modulationHz) / rateHz;
        return {
          turns: plain(sample) + swing * sinTurns(wave),
          isOn: passes(offsetHz + deviationHz * cosTurns(wave)),
        };
      };
    }
    case "sweep": {
      const { widthHz, periodS, shape } = interferer;
      return (sample) => {
        const place = sample / (rateHz * periodS);
        const part = place - Math.floor(place);
        const { frequency, phase } = shape === "saw" ? sawSweep(part) : triangleSweep(part);
        return { turns: plain(sample) + widthHz * periodS * phase, isOn: passes(offsetHz + widthHz * frequency) };
      };
    }
    case "pulse": {
      const { periodS, onShare } = interferer;
      return (sample) => {
        const place = sample / (rateHz * periodS);
        return { turns: plain(sample), isOn: passes(offsetHz) && place - Math.floor(place) < onShare };
      };
    }
  }
}

/** Frequency from -1/2 to 1/2 over a period and its integral, 0 at both ends so that periods join. */
const sawSweep = (part: number) => ({ frequency: part - 0.5, phase: (part * part - part) / 2 });

/** Up in the first half of a period and down in the second. */
function triangleSweep(part: number): { frequency: number; phase: number } {
  const half = part < 0.5 ? part : part - 0.5;
  const phase = half * half - half / 2;
  return part < 0.5 ? { frequency: 2 * half - 0.5, phase } : { frequency: 0.5 - 2 * half, phase: -phase };
}

function codeLevel(
  { prn, codePhaseChips, dopplerHz }: { prn: number; codePhaseChips: number; dopplerHz: number },
  rateHz: number,
): (sample: number) => number {
  const table = bandLimitedCode(prn, highestLineInBand(samplesPerCodePeriod(rateHz)));
  const chipsPerSample = (CA_CHIP_RATE_HZ / rateHz) * (1 + dopplerHz / L1_HZ);
  return (sample) => {
    const chips = codePhaseChips + sample * chipsPerSample;
    const point = (chips - CA_LENGTH_CHIPS * Math.floor(chips / CA_LENGTH_CHIPS)) * POINTS_PER_CHIP;
    const below = Math.min(CODE_TABLE_POINTS - 1, Math.floor(point));
    return table[below] + (point - below) * (table[below + 1] - table[below]);
  };
}

function createNoiseSource(
  { offsetHz, widthHz }: { offsetHz: number; widthHz: number },
  rateHz: number,
  amplitude: number,
  random: Random,
): InterferenceSource {
  const next = createBandNoise(widthHz, rateHz, random);
  let sample = 0;
  return {
    addTo(block) {
      for (let n = 0; n < block.length; n += 2) {
        const { i, q } = next();
        const turns = (sample * offsetHz) / rateHz;
        const [re, im] = [amplitude * cosTurns(turns), amplitude * sinTurns(turns)];
        block[n] += i * re - q * im;
        block[n + 1] += i * im + q * re;
        sample += 1;
      }
    },
  };
}

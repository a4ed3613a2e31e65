import type { Excision } from "@/lib/gnss/search/exciseNarrowband";
import { searchSignalOf, lineSpacingHz } from "@/lib/gnss/search/searchSignal";
import { searchSky, type SkyFinding, type SkySearch } from "@/lib/gnss/search/searchSky";
import { isSignalName, loadSignal, SIGNAL_NAMES } from "@/lib/gnss/signals/registry";
import { readArgs } from "./readArgs";
import { openRecording } from "./openRecording";
import { readNumber, readNumberList } from "./readNumbers";
import type { Print } from "./Subcommand";
import { UsageError } from "./UsageError";

const USAGE =
  "engine search FILE.sigmf-meta --signal GPS_L1CA [--prn 1-32] [--coherent-ms N] [--sums K] [--doppler HZ] [--pfa P] [--if HZ] [--bit-edges STEP_MS]";
const OPTIONS = {
  signal: { type: "string" },
  prn: { type: "string", default: "1-32" },
  "coherent-ms": { type: "string" },
  sums: { type: "string" },
  doppler: { type: "string" },
  pfa: { type: "string" },
  if: { type: "string" },
  "bit-edges": { type: "string" },
} as const;
const MOST_SUMS_UNASKED = 20;
const LONGEST_MS = 20;

/**
 * `search FILE.sigmf-meta`: one line per satellite whose peak passes the threshold. The false-alarm probability is that of
 * the whole search, all satellites together. What limited the search is said on standard error.
 */
export async function search(args: string[], print: Print): Promise<void> {
  const { positionals, values } = readArgs(USAGE, args, OPTIONS);
  const [file, ...more] = positionals;
  if (file === undefined || more.length > 0) throw new UsageError(`one recording, please; usage: ${USAGE}`);
  const name = values.signal ?? "GPS_L1CA";
  if (!isSignalName(name))
    throw new UsageError(`search: no codes of ${name} here; the signals are ${SIGNAL_NAMES.join(", ")}`);
  const definition = await loadSignal(name);
  const signal = searchSignalOf(definition);
  const prns = readNumberList("prn", values.prn).filter((prn) => definition.prns.includes(prn));
  if (prns.length === 0) throw new UsageError(`search: ${name} has no code for any of ${values.prn}`);
  const periodMs = 1000 / lineSpacingHz(signal);
  if (periodMs > LONGEST_MS)
    throw new UsageError(`search: ${name} repeats every ${periodMs} ms; codes of up to ${LONGEST_MS} ms are searched`);
  const coherentMs = readNumber("coherent-ms", values["coherent-ms"], periodMs, periodMs, LONGEST_MS);
  const perSearch = readNumber("pfa", values.pfa, 1e-3, 1e-12, 0.5);

  const { meta, sampleCount, read } = await openRecording(file);
  const rateHz = meta.sampleRateHz;
  const edgeStepMs = values["bit-edges"] && readNumber("bit-edges", values["bit-edges"], 0, 0.1, LONGEST_MS);
  const edges = edgeStepMs ? { bitEdgeStepMs: edgeStepMs } : {};
  const sparedMs = edgeStepMs ? coherentMs : 0; // the last start is almost a coherent time late
  const held = Math.floor(((1000 * (sampleCount + 1)) / rateHz - sparedMs) / coherentMs + 1e-9);
  const sums = readNumber("sums", values.sums, Math.min(MOST_SUMS_UNASKED, held), 1, 2000);
  const tunedHz = meta.captures[0]?.frequencyHz ?? null;
  const ifHz = readNumber("if", values.if, tunedHz === null ? 0 : signal.carrierHz - tunedHz, -1e12, 1e12);
  const samples = await read(Math.min(sampleCount, Math.ceil(((sums * coherentMs + sparedMs) * rateHz) / 1000)));
  const capture = { samples, complex: meta.format.complex, rateHz, ifHz };
  const parents = definition.prns.filter((prn) => prn <= 32);
  const request = {
    ...edges,
    coherentMs,
    sums,
    dopplerHalfWidthHz: readNumber("doppler", values.doppler, 7000, 0, 100_000),
    falseAlarmPerSearch: perSearch / new Set([...prns, ...parents]).size,
  };
  const found = searchSky(capture, signal, prns, parents, request);
  for (const line of limits(found)) process.stderr.write(`${line}\n`);
  for (const finding of found.findings) await print(lineOf(finding));
}

function lineOf(finding: SkyFinding): object {
  const { prn, codePhaseChips, dopplerHz, cn0DbHz, peakToThresholdDb, verdict } = finding;
  const place = {
    prn,
    codePhaseChips: rounded(codePhaseChips, 1000),
    dopplerHz: rounded(dopplerHz, 10),
    cn0DbHz: rounded(cn0DbHz, 100),
    peakToThresholdDb: rounded(peakToThresholdDb, 100),
    verdict,
  };
  if (finding.verdict === "genuine") return place;
  return {
    ...place,
    parentPrn: finding.parentPrn,
    dopplerDifferenceHz: rounded(finding.dopplerDifferenceHz, 10),
    lagChips: rounded(finding.lagChips, 1000),
    levelDb: rounded(finding.levelDb, 100),
    apparentCn0DbHz: rounded(finding.apparentCn0DbHz, 100),
  };
}

const rounded = (value: number, steps: number) => Math.round(value * steps) / steps;

/** What stands between the search and weaker satellites, in sentences. */
function limits({ sensitivityDbHz, mirrored, cancelledPrns, excision, blankedShare }: SkySearch): string[] {
  const lines = [`Nine in ten satellites of ${sensitivityDbHz.toFixed(1)} dB-Hz are found.`];
  if (mirrored) lines.push("Real samples with the carrier near 0 Hz: Dopplers of either sign look alike.");
  if (blankedShare > 0) lines.push(`Pulses took ${percent(blankedShare)} of the time, which was blanked.`);
  if (excision.share > 0) lines.push(...excised(excision));
  if (cancelledPrns.length > 0)
    lines.push(`The signals of PRN ${cancelledPrns.join(", ")} were taken out to see what they cover.`);
  return lines;
}

const excised = ({ share, bands }: Excision): string[] => [
  `Interference took ${percent(share)} of the time and band, which was excised.`,
  ...bands
    .slice(0, 5)
    .map(
      ({ fromHz, toHz, overNoiseDb }) =>
        `  ${(fromHz / 1e6).toFixed(4)} to ${(toHz / 1e6).toFixed(4)} MHz of the samples, ${overNoiseDb.toFixed(0)} dB above the noise.`,
    ),
];

const percent = (share: number) => `${(100 * share).toFixed(share < 0.01 ? 2 : 1)} %`;

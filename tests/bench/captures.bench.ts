import { spawnSync } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { pythonCommand } from "@/scripts/bench/python";
import { search } from "@/scripts/engine/search";
import type { TableBench } from "./bench";

type Satellite = { prn: number; codePhaseChips: number; dopplerHz: number; cn0DbHz: number };
type Made = { file: string; datatype: string; rateHz: number; ifHz: number; kind: string; satellites: Satellite[] };
type Line = Satellite & { verdict: "genuine" | "cross-correlation" };
type Tally = { captures: number; present: number; missed: number; invented: number; shadows: number; off: Satellite };

const CAPTURES = Number(process.env.BENCH_CAPTURES ?? 60);
const FIRST = Number(process.env.BENCH_FIRST_CAPTURE ?? 0);
const SCRIPT = path.resolve(import.meta.dirname, "reference/captures.py");

/** The search command on recordings that a generator of its own has made; counts of what it invents and what it misses. */
export const bench: TableBench = {
  title: `the search command on ${CAPTURES} recordings of 20 ms made in numpy, all satellites from 38 dB-Hz`,
  async table() {
    const tallies = new Map<string, Tally>();
    const folder = mkdtempSync(path.join(tmpdir(), "lagmark-captures-"));
    try {
      for (let number = FIRST; number < FIRST + CAPTURES; number++) {
        const made = makeCapture(folder, number);
        const lines: Line[] = [];
        await search([made.file, "--signal", "GPS_L1CA"], async (line) => void lines.push(line as Line));
        count(tallies, made, lines, number);
        rmSync(made.file.replace(/meta$/, "data"));
      }
    } finally {
      rmSync(folder, { recursive: true, force: true });
    }
    const heading = ["scene", "captures", "present", "missed", "invented", "named shadows", "chips", "Hz", "dB"];
    const rows = [...tallies].map(([kind, { captures, present, missed, invented, shadows, off }]) => [
      kind,
      ...[captures, present, missed, invented, shadows].map(String),
      off.codePhaseChips.toFixed(2),
      off.dopplerHz.toFixed(0),
      off.cn0DbHz.toFixed(1),
    ]);
    return [heading, ...rows];
  },
  notes: async () => [
    "The last three columns are the largest errors of all satellites found. Invented: called genuine and not there.",
  ],
};

function makeCapture(folder: string, number: number): Made {
  const made = spawnSync(pythonCommand(), [SCRIPT, folder, String(number), String(number + 1)], {
    encoding: "utf8",
    env: { ...process.env, PYTHONDONTWRITEBYTECODE: "1" },
  });
  if (made.status !== 0) throw new Error(made.stderr);
  return JSON.parse(made.stdout);
}

function count(tallies: Map<string, Tally>, made: Made, lines: readonly Line[], number: number): void {
  const none = { prn: 0, codePhaseChips: 0, dopplerHz: 0, cn0DbHz: 0 };
  const tally = tallies.get(made.kind) ?? { captures: 0, present: 0, missed: 0, invented: 0, shadows: 0, off: none };
  tallies.set(made.kind, tally);
  const genuine = lines.filter(({ verdict }) => verdict === "genuine");
  const tell = (what: string) =>
    process.stdout.write(
      `    capture ${number} (${made.datatype}, ${made.rateHz / 1e6} Msps, ${made.ifHz} Hz): ${what}\n`,
    );
  tally.captures++;
  tally.present += made.satellites.length;
  tally.shadows += lines.length - genuine.length;
  for (const line of genuine) {
    const truth = made.satellites.find(({ prn }) => prn === line.prn);
    const chips = truth ? line.codePhaseChips - truth.codePhaseChips : 0;
    const off = {
      prn: line.prn,
      codePhaseChips: Math.abs(chips - 1023 * Math.round(chips / 1023)),
      dopplerHz: Math.abs(line.dopplerHz - (truth?.dopplerHz ?? 0)),
      cn0DbHz: Math.abs(line.cn0DbHz - (truth?.cn0DbHz ?? 0)),
    };
    if (!truth || off.codePhaseChips > 1 || off.dopplerHz > 500) {
      tally.invented++;
      tell(`invented ${JSON.stringify(line)}`);
      continue;
    }
    tally.off = {
      prn: 0,
      codePhaseChips: Math.max(tally.off.codePhaseChips, off.codePhaseChips),
      dopplerHz: Math.max(tally.off.dopplerHz, off.dopplerHz),
      cn0DbHz: Math.max(tally.off.cn0DbHz, off.cn0DbHz),
    };
  }
  for (const truth of made.satellites) {
    if (genuine.some(({ prn }) => prn === truth.prn)) continue;
    tally.missed++;
    tell(`missed ${JSON.stringify(truth)}`);
  }
}

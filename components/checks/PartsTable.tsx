import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { formatQuantity } from "@/lib/checks/formatQuantity";
import type { FieldSpec } from "@/lib/checks/kind";

type Unit = NonNullable<FieldSpec["unit"]>;
type PartKind = "amplifier" | "cable" | "arrester" | "splitter";
export type ListedPart = { kind: PartKind; id: string } & Readonly<Record<string, number | string | boolean>>;

/** A figure with its unit and decimals, or what a word of the list means. */
type Column = { key: string; head: string } & (
  { unit: Unit; decimals: number } | { words: Readonly<Record<string, string>> }
);

const DELAY: Column = { key: "delayNs", head: "Delay", unit: "ns", decimals: 1 };
const LOSS: Column = { key: "lossDb", head: "Loss", unit: "dB", decimals: 2 };
const RESISTANCE: Column = { key: "ohm", head: "Resistance", unit: "ohm", decimals: 1 };

const LISTS: Readonly<Record<PartKind, { title: string; note?: string; columns: readonly Column[] }>> = {
  amplifier: {
    title: "Amplifiers",
    note: "1 dB point at the output",
    columns: [
      { key: "gainDb", head: "Gain", unit: "dB", decimals: 1 },
      { key: "noiseFigureDb", head: "Noise figure", unit: "dB", decimals: 1 },
      { key: "compressionDbm", head: "1 dB point", unit: "dBm", decimals: 0 },
      { key: "currentMa", head: "Draws", unit: "mA", decimals: 0 },
      { key: "minimumV", head: "Needs", unit: "V", decimals: 1 },
      { ...DELAY, decimals: 0 },
    ],
  },
  cable: {
    title: "Cables",
    note: "loss at 1 GHz, resistance of both conductors",
    columns: [
      { key: "dbPer100M", head: "Loss", unit: "dB/100m", decimals: 1 },
      { key: "loopOhmPerKm", head: "Resistance", unit: "ohm/km", decimals: 1 },
      { key: "velocityFactor", head: "Velocity factor", unit: "1", decimals: 2 },
    ],
  },
  arrester: {
    title: "Arresters",
    columns: [
      LOSS,
      RESISTANCE,
      { key: "passesDc", head: "Direct current", words: { true: "passes", false: "blocked" } },
      DELAY,
    ],
  },
  splitter: {
    title: "Splitters",
    note: "loss from the input to one port",
    columns: [
      { ...LOSS, decimals: 1 },
      RESISTANCE,
      {
        key: "feed",
        head: "Feed",
        words: { one: "passes from port 1", all: "passes from all ports", none: "blocked on all ports" },
      },
      DELAY,
    ],
  },
};

/** Parts of one kind with the figures of their sheets; nothing where the site has none. */
export function PartsTable({ kind, parts }: { kind: PartKind; parts: readonly ListedPart[] }) {
  const { title, note, columns } = LISTS[kind];
  const listed = parts.filter((part) => part.kind === kind);
  if (listed.length === 0) return null;
  return (
    <section>
      <SectionHead title={title} note={note} level={3} />
      <Table reflow caption={title}>
        <thead>
          <tr role="row">
            <Th>Part</Th>
            {columns.map(({ head }) => (
              <Th key={head} figure>
                {head}
              </Th>
            ))}
          </tr>
        </thead>
        <tbody>
          {listed.map((part) => (
            <Tr key={part.id}>
              <RowHead className="figures">{part.id}</RowHead>
              {columns.map((column) => (
                <Td key={column.key} figure label={column.head}>
                  {textOf(part[column.key], column)}
                </Td>
              ))}
            </Tr>
          ))}
        </tbody>
      </Table>
    </section>
  );
}

const textOf = (value: number | string | boolean, column: Column): string =>
  "words" in column ? column.words[String(value)] : formatQuantity(Number(value), column.unit, column.decimals);

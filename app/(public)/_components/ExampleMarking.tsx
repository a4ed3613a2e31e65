import { Gauge } from "@/components/ui/Gauge";
import { StatusWord } from "@/components/ui/StatusWord";
import { ReasonRow, RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { Value } from "@/components/ui/Value";

type Row = {
  label: string;
  handedIn: number;
  computed: number;
  tolerance: number;
  unit: string;
  decimals: number;
  signed: boolean;
};

const ROWS: Row[] = [
  {
    label: "Code phase, satellite 7",
    handedIn: 412.25,
    computed: 412,
    tolerance: 0.5,
    unit: "chip",
    decimals: 2,
    signed: false,
  },
  {
    label: "Doppler, satellite 19",
    handedIn: 2250,
    computed: -2250,
    tolerance: 250,
    unit: "Hz",
    decimals: 0,
    signed: true,
  },
];

/** Two rows of a marking record; which is within and how far off follows from the values. */
export function ExampleMarking() {
  return (
    <Table caption="Example of a marking record" className="max-tablet:-mx-3">
      <thead>
        <tr>
          <Th>Quantity</Th>
          <Th figure>Handed in</Th>
          <Th figure>Computed</Th>
          <Th className="max-tablet:hidden">Against tolerance</Th>
          <Th>Result</Th>
        </tr>
      </thead>
      <tbody>{ROWS.map(markedRow)}</tbody>
    </Table>
  );
}

function markedRow(row: Row) {
  const off = (row.handedIn - row.computed) / row.tolerance;
  const within = Math.abs(off) <= 1;
  const shown = (value: number) => <Value value={value} unit={row.unit} decimals={row.decimals} signed={row.signed} />;
  return [
    <Tr key={row.label} wash={within ? null : "minus"} joined={!within}>
      <RowHead>{row.label}</RowHead>
      <Td figure>{shown(row.handedIn)}</Td>
      <Td figure>{shown(row.computed)}</Td>
      <Td className="max-tablet:hidden">
        <Gauge offByTolerances={off} within={within} width={160} />
      </Td>
      <Td>
        <StatusWord glyph={within ? "within" : "outside"} strong={!within}>
          {within ? "Within" : "Outside"}
        </StatusWord>
      </Td>
    </Tr>,
    !within && (
      <ReasonRow key="reason" columns={5} wash="minus">
        The size agrees; the sign does not.
      </ReasonRow>
    ),
  ];
}

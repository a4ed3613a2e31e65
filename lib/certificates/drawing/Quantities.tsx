import { Text, View } from "@react-pdf/renderer";
import { PLATE_FACE } from "../pdfFonts";
import type { CertifiedQuantity } from "../record";
import { inPrint } from "./inPrint";
import { INK, type Density } from "./page";

type Line = { key: string; check: string } | { key: string; quantity: CertifiedQuantity };

/** The quantities with their tolerances in two columns, under the check they belong to; no values and no results. */
export function Quantities({ quantities, density }: { quantities: CertifiedQuantity[]; density: Density }) {
  return (
    <View>
      <View style={heading}>
        <Text style={{ fontFamily: PLATE_FACE, fontWeight: 700, fontSize: density.text + 1.5, letterSpacing: -0.2 }}>
          What was measured, and how closely
        </Text>
        <Text style={{ fontSize: density.small }}>Quantity and tolerance</Text>
      </View>
      <View style={{ flexDirection: "row", gap: 24 }}>
        {columns(quantities).map((lines, index) => (
          <View key={index} style={{ flex: 1 }}>
            {lines.map((line) =>
              "quantity" in line ? (
                <Quantity key={line.key} quantity={line.quantity} density={density} />
              ) : (
                <Check key={line.key} title={line.check} density={density} />
              ),
            )}
          </View>
        ))}
      </View>
    </View>
  );
}

function Check({ title, density }: { title: string; density: Density }) {
  return (
    <View style={{ ...row, minHeight: density.row, borderColor: INK.ink }}>
      <Text style={{ fontSize: density.small, fontWeight: 700 }}>{inPrint(title)}</Text>
    </View>
  );
}

function Quantity({ quantity, density }: { quantity: CertifiedQuantity; density: Density }) {
  return (
    <View style={{ ...row, minHeight: density.row }}>
      <Text style={{ fontSize: density.small, flex: 1 }}>
        {`${inPrint(quantity.label)}${quantity.critical ? ", critical" : ""}`}
      </Text>
      <Text style={{ fontSize: density.small, fontWeight: 600, marginLeft: 8, fontFeatureSettings: ["tnum"] }}>
        {inPrint(quantity.tolerance)}
      </Text>
    </View>
  );
}

const heading = {
  flexDirection: "row",
  justifyContent: "space-between",
  alignItems: "flex-end",
  borderBottomWidth: 1,
  borderColor: INK.ink,
  paddingBottom: 3,
} as const;
const row = {
  flexDirection: "row",
  justifyContent: "space-between",
  alignItems: "center",
  borderBottomWidth: 0.5,
  borderColor: INK.rule,
} as const;

/** Lines one column may be longer for the sake of not breaking a check. */
const PRICE_OF_BREAKING = 1.5;

/** Two columns nearly even; a check that runs over is named again at the head of the second. */
function columns(quantities: CertifiedQuantity[]): [Line[], Line[]] {
  const price = (split: number) => {
    const breaks = quantities[split]?.check === quantities[split - 1].check;
    return Math.max(...halves(quantities, split).map((half) => half.length)) + (breaks ? PRICE_OF_BREAKING : 0);
  };
  const splits = quantities.map((_, index) => index + 1);
  return halves(
    quantities,
    splits.reduce((best, split) => (price(split) < price(best) ? split : best)),
  );
}

const halves = (quantities: CertifiedQuantity[], split: number): [Line[], Line[]] => [
  withChecks(quantities.slice(0, split)),
  withChecks(quantities.slice(split)),
];

const withChecks = (quantities: CertifiedQuantity[]): Line[] =>
  quantities.flatMap((quantity, index): Line[] => {
    const key = `${quantity.check} ${index}`;
    const first = quantity.check !== quantities[index - 1]?.check;
    return first
      ? [
          { key: `${key} head`, check: quantity.title },
          { key, quantity },
        ]
      : [{ key, quantity }];
  });

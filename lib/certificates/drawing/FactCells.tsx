import { Text, View } from "@react-pdf/renderer";
import { INK, type Density } from "./page";

/** `share` of the width, against the others'. */
export type Fact = { label: string; value: string; note: string; share: number };

/** The facts asked first, side by side between two hairlines. */
export function FactCells({ facts, density }: { facts: Fact[]; density: Density }) {
  return (
    <View style={{ flexDirection: "row", borderTopWidth: 0.75, borderBottomWidth: 0.75, borderColor: INK.rule }}>
      {facts.map(({ label, value, note, share }, index) => (
        <View key={label} style={{ ...cell(index, density), flexGrow: share, flexBasis: 0 }}>
          <Text style={{ fontSize: density.small, color: INK.quiet }}>{label}</Text>
          <Text style={{ fontSize: density.text + 0.5, fontWeight: 600, marginTop: 1.5 }}>{value}</Text>
          <Text style={{ fontSize: density.small, color: INK.quiet, marginTop: 1.5 }}>{note}</Text>
        </View>
      ))}
    </View>
  );
}

const cell = (index: number, density: Density) => ({
  paddingVertical: density.panel - 2,
  paddingLeft: index === 0 ? 0 : 10,
  paddingRight: 8,
  borderLeftWidth: index === 0 ? 0 : 0.75,
  borderColor: INK.rule,
});

import { Text, View } from "@react-pdf/renderer";
import { PLATE_FACE } from "../pdfFonts";
import { INK, type Density } from "./page";

export type PanelCell = { title: string; rows: [label: string, value: string][] };

/** A framed panel of two cells, each a heading over labelled rows. */
export function Panel({ cells, density }: { cells: [PanelCell, PanelCell]; density: Density }) {
  return (
    <View style={{ flexDirection: "row", borderWidth: 1, borderColor: INK.ink }}>
      <Cell {...cells[0]} density={density} />
      <View style={{ width: 1, backgroundColor: INK.ink }} />
      <Cell {...cells[1]} density={density} />
    </View>
  );
}

function Cell({ title, rows, density }: PanelCell & { density: Density }) {
  return (
    <View style={{ flex: 1, paddingVertical: density.panel, paddingHorizontal: 11 }}>
      <Text
        style={{
          fontFamily: PLATE_FACE,
          fontWeight: 700,
          fontSize: density.text + 0.5,
          letterSpacing: -0.2,
          marginBottom: 3,
        }}
      >
        {title}
      </Text>
      {rows.map(([label, value]) => (
        <View key={label} style={{ flexDirection: "row", marginTop: 2 }}>
          <Text style={{ width: 78, fontSize: density.small, color: INK.quiet }}>{label}</Text>
          <Text style={{ flex: 1, fontSize: density.small, fontWeight: 600 }}>{value}</Text>
        </View>
      ))}
    </View>
  );
}

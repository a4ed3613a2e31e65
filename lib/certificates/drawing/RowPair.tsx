import { View } from "@react-pdf/renderer";
import type { Density } from "./page";
import { Row } from "./Row";

type Told = [label: string, text: string];

/** Two short rows side by side. */
export function RowPair({ rows, density }: { rows: [Told, Told]; density: Density }) {
  return (
    <View style={{ flexDirection: "row" }}>
      {rows.map(([label, text]) => (
        <View key={label} style={{ flexGrow: 1, flexBasis: 0, paddingRight: 8 }}>
          <Row label={label} text={text} density={density} />
        </View>
      ))}
    </View>
  );
}

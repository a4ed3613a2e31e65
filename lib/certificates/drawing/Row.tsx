import { Text, View } from "@react-pdf/renderer";
import { INK, type Density } from "./page";

const LABEL_PT = 66;

/** A label and what it says. */
export function Row({ label, text, density }: { label: string; text: string; density: Density }) {
  return (
    <View style={{ flexDirection: "row" }}>
      <Text style={{ width: LABEL_PT, fontSize: density.text, lineHeight: 1.3, color: INK.quiet }}>{label}</Text>
      <Text style={{ flex: 1, fontSize: density.text, lineHeight: 1.3 }}>{text}</Text>
    </View>
  );
}

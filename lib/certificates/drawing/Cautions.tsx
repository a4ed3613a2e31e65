import { Text } from "@react-pdf/renderer";
import { type Density } from "./page";

export function Cautions({ cautions, density }: { cautions: string[]; density: Density }) {
  return <Text style={{ fontSize: density.small, lineHeight: 1.3, fontWeight: 600 }}>{cautions.join(" ")}</Text>;
}

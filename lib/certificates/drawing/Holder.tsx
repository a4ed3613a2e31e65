import { Text, View } from "@react-pdf/renderer";
import { fitName } from "../fitName";
import { INK, PAGE, type Density } from "./page";

const LINE_PT = 5;
/** Keeps g, y and a cedilla clear of the line, in em. */
const DESCENDER_AIR = 0.05;

/** The holder's name as large as the page allows, standing on the line. Never in the plate face, which lacks letters. */
export function Holder({ name, density }: { name: string; density: Density }) {
  const { sizePt, lines } = fitName(name, PAGE.width, density.name);
  return (
    <View>
      <Text style={{ fontSize: density.text + 2 }}>This is to certify that</Text>
      {lines.map((line) => (
        <Text key={line} style={{ fontWeight: 700, fontSize: sizePt, lineHeight: 1.16 }}>
          {line}
        </Text>
      ))}
      <View style={{ height: LINE_PT, marginTop: DESCENDER_AIR * sizePt, backgroundColor: INK.ink }} />
    </View>
  );
}

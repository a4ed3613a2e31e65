import { Path, Svg } from "@react-pdf/renderer";
import { create } from "qrcode";

/** A QR code, error correction level M, without its quiet zone: the page keeps four modules clear around it. */
export function QrCode({ text, size }: { text: string; size: number }) {
  const { modules } = create(text, { errorCorrectionLevel: "M" });
  return (
    <Svg width={size} height={size} viewBox={`0 0 ${modules.size} ${modules.size}`}>
      <Path d={darkRuns(modules.data, modules.size)} fill="#000000" />
    </Svg>
  );
}

/** One path of all dark runs: separate rectangles would show hairlines between rows. */
function darkRuns(modules: Uint8Array, size: number): string {
  const runs: string[] = [];
  for (let y = 0; y < size; y += 1) {
    for (let x = 0; x < size;) {
      let end = x;
      while (end < size && modules[y * size + end]) end += 1;
      if (end > x) runs.push(`M${x} ${y}H${end}V${y + 1}H${x}Z`);
      x = end + 1;
    }
  }
  return runs.join("");
}

import { Rect, Svg, Text, View } from "@react-pdf/renderer";
import { chipStrip, type ChipLane } from "../chipStrip";
import { CODE_FACE } from "../pdfFonts";
import { INK } from "./page";

const LINE_PT = 1.1;
const LANE_NUMBER_PT = 14;
const HEX_PT = 9;

/** The strip on paper: two lanes, lane numbers at the left, the two hexadecimal figures of each group beneath it. */
export function ChipStripDrawing({ fingerprint, width }: { fingerprint: string; width: number }) {
  const strip = chipStrip(fingerprint);
  const u = (width - LANE_NUMBER_PT) / strip.width;
  return (
    <View style={{ width, gap: 5 }}>
      {strip.lanes.map((lane) => (
        <View key={lane.number} style={{ flexDirection: "row" }}>
          <Text style={{ width: LANE_NUMBER_PT, fontSize: 9, color: INK.quiet, marginTop: strip.line * u - 6 }}>
            {lane.number}
          </Text>
          <View>
            <Lane lane={lane} u={u} width={strip.width} height={strip.laneHeight} line={strip.line} />
            <Figures lane={lane} u={u} />
          </View>
        </View>
      ))}
    </View>
  );
}

function Lane({
  lane,
  u,
  width,
  height,
  line,
}: {
  lane: ChipLane;
  u: number;
  width: number;
  height: number;
  line: number;
}) {
  return (
    <Svg width={width * u} height={height * u} viewBox={`0 0 ${width * u} ${height * u}`}>
      {lane.groups.flatMap((group) =>
        group.chips.map((chip) => (
          <Rect
            key={chip.x}
            x={chip.x * u}
            y={chip.y * u}
            width={chip.width * u}
            height={chip.height * u}
            fill={chip.bit === 0 ? INK.plus : INK.minus}
          />
        )),
      )}
      {lane.groups.map((group) => (
        <Rect
          key={group.x}
          x={group.x * u}
          y={line * u - LINE_PT / 2}
          width={group.width * u}
          height={LINE_PT}
          fill={INK.ink}
        />
      ))}
    </Svg>
  );
}

function Figures({ lane, u }: { lane: ChipLane; u: number }) {
  return (
    <View style={{ flexDirection: "row", marginTop: 2 }}>
      {lane.groups.map((group, index) => (
        <Text key={group.x} style={{ ...figures, width: group.width * u, marginLeft: index === 0 ? 0 : u }}>
          {group.hex}
        </Text>
      ))}
    </View>
  );
}

const figures = {
  fontFamily: CODE_FACE,
  fontWeight: 600,
  fontSize: HEX_PT,
  letterSpacing: 0.06 * HEX_PT,
  textAlign: "center",
} as const;

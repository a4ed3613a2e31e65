import { SkyDial } from "@/components/plots/SkyDial";
import { skyPlace } from "@/components/plots/skyGeometry";
import { directionAt, type Pass, type ReceiverLog } from "@/lib/gnss/sky/receiverLog";

type SkyTracksProps = { log: Pick<ReceiverLog, "passes" | "trackEvery">; chosen: number; reading: number };

/** Ways of the satellites over the sky; the chosen one's is heavy, squares stand where they are at the cursor. */
export function SkyTracks({ log: { passes, trackEvery }, chosen, reading }: SkyTracksProps) {
  const up = passes.filter(({ first, cn0DbHz }) => reading >= first && reading < first + cn0DbHz.length);
  // The chosen one is drawn last, over the others.
  const ordered = [...passes].sort((a, b) => Number(a.prn === chosen) - Number(b.prn === chosen));
  return (
    <SkyDial summary={`Sky plot: ${up.length} satellites at the cursor, with the way of each through the log.`}>
      {ordered.map((pass) => (
        <path
          key={`${pass.prn} ${pass.first}`}
          d={trackPath(pass)}
          fill="none"
          stroke={pass.prn === chosen ? "var(--plus)" : "var(--ink-3)"}
          strokeWidth={pass.prn === chosen ? 2.5 : 0.75}
        />
      ))}
      {up.map((pass) => {
        const { azimuthDeg, elevationDeg } = directionAt(pass, trackEvery, reading);
        const [x, y] = skyPlace(azimuthDeg, elevationDeg);
        const own = pass.prn === chosen;
        return (
          <g key={pass.prn}>
            <rect x={x - 4} y={y - 4} width="8" height="8" fill={own ? "var(--plus)" : "var(--ink-2)"} />
            <text
              x={x + 7}
              y={y + 4}
              fontSize="12"
              fontWeight={own ? 700 : 500}
              fill="var(--ink)"
              stroke="var(--sheet)"
              strokeWidth="3"
              paintOrder="stroke"
            >
              {pass.prn}
            </text>
          </g>
        );
      })}
    </SkyDial>
  );
}

function trackPath({ azimuthDeg, elevationDeg }: Pass): string {
  const places = azimuthDeg.map((azimuth, n) => skyPlace(azimuth, elevationDeg[n]));
  return places.map(([x, y], n) => `${n ? "L" : "M"}${x.toFixed(1)} ${y.toFixed(1)}`).join("");
}

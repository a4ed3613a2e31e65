import { classNames } from "./classNames";

const INDEX_WIDTH = 18;
const LANE_CHIPS = 32;
const LINE = 1.5;
/** What a phone of 320 px has between its margins. */
const PHONE_WIDTH = 286;

/** First 64 bits of a fingerprint, most significant first, in two lanes of 32. */
export function stripLanes(fingerprint: string): (0 | 1)[][] {
  if (!/^[0-9a-f]{64}$/i.test(fingerprint))
    throw new RangeError(`stripLanes: not 64 hexadecimal figures: ${fingerprint}`);
  const bits = [...fingerprint.slice(0, 16)].flatMap((figure) => {
    const value = parseInt(figure, 16);
    return [8, 4, 2, 1].map((weight) => (value & weight ? 1 : 0) as 0 | 1);
  });
  return [bits.slice(0, LANE_CHIPS), bits.slice(LANE_CHIPS)];
}

/**
 * The chip strip of a release or certificate: bit 0 is +1 and stands above the line, bit 1 is -1 and hangs below it.
 * A help to the eye and no proof; say so where it is shown.
 * @param fingerprint 64 hexadecimal figures
 * @param width drawn width in px, at least 228 (chips of 6 px); on a phone a wider strip is drawn anew, so that its
 * figures stay legible
 */
export function ChipStrip({ fingerprint, width = 480 }: { fingerprint: string; width?: number }) {
  if (width <= PHONE_WIDTH) return <Strip fingerprint={fingerprint} width={width} />;
  return (
    <>
      <Strip fingerprint={fingerprint} width={width} className="max-tablet:hidden" />
      <Strip fingerprint={fingerprint} width={PHONE_WIDTH} className="tablet:hidden" />
    </>
  );
}

function Strip({ fingerprint, width, className }: { fingerprint: string; width: number; className?: string }) {
  const lanes = stripLanes(fingerprint);
  const hex = fingerprint.slice(0, 16).toLowerCase();
  const unit = (width - INDEX_WIDTH) / (LANE_CHIPS + 3);
  const height = 1.35 * unit;
  const lane = 2 * height + 18;
  const pitch = lane + unit / 2;
  const total = pitch + lane;
  return (
    <svg
      width={width}
      height={total}
      viewBox={`0 0 ${width} ${total.toFixed(2)}`}
      role="img"
      aria-label={`Chip strip ${hex}`}
      className={classNames("block h-auto max-w-full select-text", className)}
    >
      {lanes.map((bits, index) => (
        <Lane
          key={index}
          number={index + 1}
          top={index * pitch}
          bits={bits}
          hex={hex.slice(index * 8, index * 8 + 8)}
          unit={unit}
          height={height}
        />
      ))}
    </svg>
  );
}

type LaneProps = { number: number; top: number; bits: (0 | 1)[]; hex: string; unit: number; height: number };

function Lane({ number, top, bits, hex, unit, height }: LaneProps) {
  const inset = Math.min(1, 0.07 * unit);
  const chip = height - LINE / 2;
  return (
    <g>
      <text x="0" y={top + height + 4} fontSize="12" fontWeight="500" fill="var(--ink-3)">
        {number}
      </text>
      {[0, 1, 2, 3].map((group) => {
        const left = INDEX_WIDTH + group * 9 * unit;
        return (
          <g key={group}>
            <rect x={left} y={top + chip} width={8 * unit} height={LINE} fill="var(--ink)" />
            {bits.slice(group * 8, group * 8 + 8).map((bit, at) => (
              <rect
                key={at}
                data-bit={bit}
                x={left + at * unit + inset}
                y={bit ? top + chip + LINE : top}
                width={unit - 2 * inset}
                height={chip}
                fill={bit ? "var(--minus)" : "var(--plus)"}
              />
            ))}
            <text
              x={left + 4 * unit}
              y={top + 2 * height + 13}
              textAnchor="middle"
              fontSize="12"
              fontWeight="600"
              fill="var(--ink-2)"
              style={{ fontFamily: "var(--f-code)", letterSpacing: ".06em" }}
            >
              {hex.slice(group * 2, group * 2 + 2).toUpperCase()}
            </text>
          </g>
        );
      })}
    </g>
  );
}

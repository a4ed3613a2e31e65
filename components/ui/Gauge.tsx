const HEIGHT = 26;
const PAD = 6;
/** The drawing ends at this many tolerances; what lies beyond gets an arrow. */
const REACH = 2.5;
const BLOCK = 7;

/**
 * The handed-in value against the computed one: centre tick the computed value, band the tolerance, block above the
 * line when within and below when outside. Nothing is drawn where a difference has no meaning (words, unreadable).
 * @param offByTolerances signed difference in tolerances, null where there is none
 */
export function Gauge({
  offByTolerances,
  within,
  width = 180,
}: {
  offByTolerances: number | null;
  within: boolean;
  width?: number;
}) {
  if (offByTolerances === null || Number.isNaN(offByTolerances)) return null;
  const centre = width / 2;
  const half = (centre - PAD) / REACH;
  const far = Math.abs(offByTolerances) > REACH;
  const side = offByTolerances < 0 ? -1 : 1;
  const end = centre + side * (centre - PAD);
  const x = far ? (side > 0 ? end - BLOCK : end) : centre + offByTolerances * half - BLOCK / 2;
  const edges = [centre - half, centre + half];
  const fill = within ? "var(--plus)" : "var(--minus)";
  return (
    <svg width={width} height={HEIGHT} viewBox={`0 0 ${width} ${HEIGHT}`} aria-hidden className="block">
      <rect x={edges[0]} y="4" width={2 * half} height="9" fill="var(--plus)" opacity="var(--band-o)" />
      <path d={`M${PAD} 13H${width - PAD}`} stroke="var(--ink)" strokeWidth="1.5" />
      <path d={`M${edges[0]} 4v13M${edges[1]} 4v13`} stroke="var(--ink)" strokeWidth="1.25" />
      <path d={`M${centre} 9v8`} stroke="var(--ink)" strokeWidth="1.25" />
      <rect data-block x={x} y={within ? 2.5 : 13.75} width={BLOCK} height="10" fill={fill} />
      {far && <path data-arrow d={`M${end} 12.25${side > 0 ? "l6 6.2-6 6.2z" : "l-6 6.2 6 6.2z"}`} fill={fill} />}
    </svg>
  );
}

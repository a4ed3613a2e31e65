type Quantity = { of: string; label: string; within: boolean };

const WIDTH = 44;
const GAP = 6;

/** A block a quantity: above the line within, below it outside. The words beside it say the same. */
export function QuantityLine({ quantities }: { quantities: readonly Quantity[] }) {
  const width = quantities.length * (WIDTH + GAP) + GAP;
  const outside = quantities.filter((quantity) => !quantity.within).map((quantity) => quantity.label);
  const finding = outside.length === 0 ? "All quantities within" : `Outside: ${outside.join(", ")}`;
  return (
    <svg
      viewBox={`0 0 ${width} 44`}
      width={width}
      className="mt-1 block h-auto max-w-full"
      role="img"
      aria-label={finding}
    >
      {quantities.map((quantity, index) => (
        <rect
          key={quantity.of}
          x={GAP + index * (WIDTH + GAP)}
          y={quantity.within ? 2 : 23}
          width={WIDTH}
          height="19"
          fill={quantity.within ? "var(--plus)" : "var(--minus)"}
        />
      ))}
      <rect y="21" width={width} height="2" fill="var(--ink)" />
    </svg>
  );
}

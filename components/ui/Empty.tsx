import type { ReactNode } from "react";

/** Nothing here yet: the line with a broken outline where the first block would stand, what is missing, the one sensible key. */
export function Empty({
  title,
  children,
  action,
  level = 2,
}: {
  title: string;
  children?: ReactNode;
  action?: ReactNode;
  level?: 2 | 3;
}) {
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <div className="border-hair border-rule bg-sheet px-7 py-7">
      <svg width="100%" height="20" className="mb-8 block" aria-hidden>
        <rect
          x="18"
          y="3.75"
          width="54"
          height="15"
          fill="none"
          stroke="var(--ink)"
          strokeWidth="1.5"
          strokeDasharray="4 3"
        />
        <rect y="17.5" width="100%" height="2" fill="var(--ink)" />
      </svg>
      <Heading className="text-h3">{title}</Heading>
      {children && <div className="mt-1 max-w-measure text-dense text-ink-2">{children}</div>}
      {action && <div className="mt-4">{action}</div>}
    </div>
  );
}

import type { ReactNode } from "react";

type SectionHeadProps = {
  title: string;
  note?: ReactNode;
  level?: 2 | 3;
  id?: string;
  size?: "h2" | "h3";
  className?: string;
};

/** A section is its heading on an ink line, nothing around it. */
export function SectionHead({ title, note, level = 2, size = "h3", id, className }: SectionHeadProps) {
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <div className={`section-head ${className ?? ""}`}>
      <Heading id={id} className={size === "h2" ? "text-h2" : "text-h3"}>
        {title}
      </Heading>
      {note && <span className="text-label font-normal text-ink-2">{note}</span>}
    </div>
  );
}

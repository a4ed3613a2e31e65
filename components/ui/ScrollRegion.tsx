"use client";
import { useEffect, useRef, useState, type ReactNode } from "react";
import { classNames } from "./classNames";

type ScrollRegionProps = { label: string; fixedFirst?: boolean; className?: string; children: ReactNode };

/** Holds one thing that may be wider than its place. While it is, the keys reach it and it has a name; else it is no stop. */
export function ScrollRegion({ label, fixedFirst, className, children }: ScrollRegionProps) {
  const box = useRef<HTMLDivElement>(null);
  const [scrolls, setScrolls] = useState(false);
  useEffect(() => {
    const region = box.current;
    if (!region || typeof ResizeObserver === "undefined") return;
    const observer = new ResizeObserver(() => setScrolls(region.scrollWidth > region.clientWidth));
    observer.observe(region);
    // The content grows without the region growing.
    for (const content of region.children) observer.observe(content);
    return () => observer.disconnect();
  }, []);
  return (
    <div
      ref={box}
      className={classNames("table-region", className)}
      data-first={fixedFirst ? "fixed" : undefined}
      {...(scrolls && { tabIndex: 0, role: "region", "aria-label": label })}
    >
      {children}
    </div>
  );
}

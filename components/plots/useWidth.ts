"use client";
import { useLayoutEffect, useRef, useState, type RefObject } from "react";

/** Width of a box in whole px, followed as it changes; the given width stands until the first measure (and on the server). */
export function useWidth<T extends HTMLElement>(atFirst: number): [RefObject<T | null>, number] {
  const box = useRef<T>(null);
  const [width, setWidth] = useState(atFirst);
  useLayoutEffect(() => {
    const element = box.current;
    if (!element || typeof ResizeObserver === "undefined") return;
    const observer = new ResizeObserver(([entry]) => {
      const measured = Math.floor(entry.contentRect.width);
      if (measured > 0) setWidth(measured);
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [box, width];
}

"use client";
import { useEffect, useRef, type ReactNode } from "react";

/** Opens below its word; closes by Esc, by a click elsewhere and by going somewhere. Opens without script too. */
export function Menu({ label, look, children }: { label: ReactNode; look: "key" | "name"; children: ReactNode }) {
  const box = useRef<HTMLDetailsElement>(null);
  useEffect(() => {
    const close = (event: Event) => {
      const details = box.current;
      if (!details?.open) return;
      const inside = event.target instanceof Node && details.contains(event.target);
      if (event instanceof KeyboardEvent ? event.key !== "Escape" : inside && !followsLink(event)) return;
      details.open = false;
      if (event instanceof KeyboardEvent) details.querySelector("summary")?.focus();
    };
    document.addEventListener("click", close);
    document.addEventListener("keydown", close);
    return () => {
      document.removeEventListener("click", close);
      document.removeEventListener("keydown", close);
    };
  }, []);
  return (
    <details ref={box} className="tablet:relative">
      <summary className={`menu-summary ${look === "key" ? "key" : "flex min-h-[44px] items-center"}`}>{label}</summary>
      <div className="menu-sheet top-full right-0 min-w-[240px] max-tablet:inset-x-0">{children}</div>
    </details>
  );
}

const followsLink = (event: Event) => event.target instanceof Element && event.target.closest("a") !== null;

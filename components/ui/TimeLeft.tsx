"use client";
import { useEffect, useState } from "react";
import { clockText } from "./clockText";

type TimeLeftProps = {
  /** Both from the server, ISO: the device's own clock may be wrong. */
  endsAt: string;
  serverNow: string;
  minutes: number;
  /** As shown beside ("ends 15:12"). */
  ends?: string;
  onEnd?: () => void;
};

/** Time left; what is left is the block. Changes every ten seconds, in the last minute every second. */
export function TimeLeft({ endsAt, serverNow, minutes, ends, onEnd }: TimeLeftProps) {
  const atStart = (Date.parse(endsAt) - Date.parse(serverNow)) / 1000;
  const [leftS, setLeftS] = useState(atStart);

  useEffect(() => {
    const begun = performance.now();
    const timer = setInterval(() => {
      const left = Math.max(0, atStart - (performance.now() - begun) / 1000);
      setLeftS(left);
      if (left > 0) return;
      clearInterval(timer);
      onEnd?.();
    }, 500);
    return () => clearInterval(timer);
  }, [atStart, onEnd]);

  const last = leftS <= 60;
  const shown = last ? Math.ceil(leftS) : Math.ceil(leftS / 10) * 10;
  const part = Math.min(1, Math.max(0, leftS / (minutes * 60)));
  return (
    <div role="timer" aria-label="Time left" className="min-w-[120px]">
      <p className="figures whitespace-nowrap">
        <span className={last ? "text-readout text-minus-deep" : "text-readout"}>{clockText(shown)}</span>
        <span className="ml-2 text-label font-normal text-ink-2">{ends ? `left, ${ends}` : "left"}</span>
      </p>
      <div className="time-line" aria-hidden>
        <span style={{ width: `${100 * part}%` }} />
      </div>
      <span className="sr-only" aria-live="assertive">
        {last ? (shown > 0 ? "One minute left." : "The time is over.") : ""}
      </span>
    </div>
  );
}

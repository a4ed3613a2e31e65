"use client";
import Link from "next/link";
import { usePathname } from "next/navigation";
import type { Station } from "./Scale";

/** Stations as words on the line, or as rows of the phone's menu. */
export function Stations({
  stations,
  current,
  look,
}: {
  stations: readonly Station[];
  current?: string;
  look: "line" | "rows";
}) {
  const path = usePathname();
  const here = current ?? currentStation(stations, path ?? "");
  return stations.map((station) => {
    const mark = station.href === here ? ("page" as const) : undefined;
    if (look === "rows") {
      return (
        <Link key={station.href} href={station.href} className="menu-item" aria-current={mark}>
          {station.label}
        </Link>
      );
    }
    return (
      <Link key={station.href} href={station.href} className="station" aria-current={mark}>
        <span className="station-word" data-word={station.label}>
          {station.label}
        </span>
        {mark && <span className="station-block" aria-hidden />}
      </Link>
    );
  });
}

/** The station with the longest address that leads to this page, else one that covers it, or none. */
export function currentStation(stations: readonly Station[], path: string): string | undefined {
  const leadsHere = (address: string) => path === address || path.startsWith(`${address}/`);
  const leading = stations.filter(({ href }) => leadsHere(href)).sort((a, b) => b.href.length - a.href.length);
  return (leading[0] ?? stations.find(({ covers }) => covers?.some(leadsHere)))?.href;
}

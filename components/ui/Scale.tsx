import Link from "next/link";
import type { ReactNode } from "react";
import { Mark } from "./Mark";
import { Menu } from "./Menu";
import { Stations } from "./Stations";

/** `covers`: addresses of pages that belong to the station though they do not lie under its own. */
export type Station = { href: string; label: string; covers?: readonly string[] };

type ScaleProps = {
  /** At most five. */
  stations: readonly Station[];
  /** Address of the current one; left out, it follows the address of the page. */
  current?: string;
  home?: string;
  /** At the right end: name area, sign-in key, theme switch. */
  right?: ReactNode;
  /** On a phone, under the stations in the menu. */
  menu?: ReactNode;
};

/** The navigation: a ruled line across the top, stations on it, the current one with a solid block. */
export function Scale({ stations, current, home = "/", right, menu }: ScaleProps) {
  return (
    <header className="scale">
      <div className="page flex min-h-[62px] items-stretch gap-4 desk:gap-14">
        <Link href={home} className="flex items-center gap-[11px] no-underline" aria-label="Lagmark, start page">
          <Mark />
          <span className="plate text-[1.375rem] leading-none">Lagmark</span>
        </Link>
        <nav aria-label="Stations" className="hidden tablet:flex tablet:gap-2 desk:gap-6">
          <Stations stations={stations} current={current} look="line" />
        </nav>
        <div className="ml-auto hidden items-center gap-4 tablet:flex">{right}</div>
        <div className="ml-auto flex items-center tablet:hidden">
          <Menu label="Menu" look="key">
            <nav aria-label="Stations">
              <Stations stations={stations} current={current} look="rows" />
            </nav>
            {menu}
          </Menu>
        </div>
      </div>
    </header>
  );
}

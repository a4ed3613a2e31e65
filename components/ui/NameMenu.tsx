import Link from "next/link";
import type { ReactNode } from "react";
import { Menu } from "./Menu";

export type MenuLink = { href: string; label: string };

/** The name at the right end of the scale; what is needed less often hangs on it. `children` follow the links (sign out, theme). */
export function NameMenu({
  name,
  detail,
  links,
  children,
}: {
  name: string;
  detail?: string;
  links: readonly MenuLink[];
  children?: ReactNode;
}) {
  const label = (
    <span className="flex items-center gap-2.5">
      <span className="block text-right text-[0.875rem] leading-[1.125rem]">
        <span className="block font-semibold">{name}</span>
        {detail && <span className="block text-ink-2">{detail}</span>}
      </span>
      <svg width="12" height="8" viewBox="0 0 12 8" aria-hidden>
        <path d="M1 1l5 5 5-5" fill="none" stroke="currentColor" strokeWidth="2" />
      </svg>
    </span>
  );
  return (
    <Menu label={label} look="name">
      <MenuLinks links={links} />
      {children}
    </Menu>
  );
}

/** Rows of a menu, also for the phone's. */
export function MenuLinks({ links }: { links: readonly MenuLink[] }) {
  return (
    <ul>
      {links.map((link) => (
        <li key={link.href} className="border-t-hair border-rule first:border-t-0">
          <Link href={link.href} className="menu-item border-t-0">
            {link.label}
          </Link>
        </li>
      ))}
    </ul>
  );
}

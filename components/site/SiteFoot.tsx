import Link from "next/link";
import { Mark } from "@/components/ui/Mark";
import { ThemeSwitch } from "@/components/ui/ThemeSwitch";

const LINKS = [
  { href: "/trust", label: "Trust" },
  { href: "/privacy", label: "Privacy" },
  { href: "/impartiality", label: "Impartiality and appeals" },
  { href: "/cautions", label: "Cautions" },
  { href: "/sign-in", label: "Sign in" },
];

/** Foot of the pages that need no account. */
export function SiteFoot() {
  return (
    <footer className="site-foot no-print">
      <div className="page flex flex-wrap items-center gap-x-8 gap-y-4 py-6">
        <span className="flex items-center gap-3">
          <Mark tone="one-colour" size={26} />
          Lagmark
        </span>
        <ThemeSwitch />
        <nav aria-label="About the register" className="tablet:ml-auto">
          <ul className="flex flex-wrap gap-x-7 gap-y-1">
            {LINKS.map((link) => (
              <li key={link.href}>
                <Link href={link.href} className="foot-link">
                  {link.label}
                </Link>
              </li>
            ))}
          </ul>
        </nav>
      </div>
    </footer>
  );
}

import { LinkKey } from "@/components/ui/LinkKey";
import { MenuLinks } from "@/components/ui/NameMenu";
import { Scale } from "@/components/ui/Scale";

const STATIONS = [
  { href: "/verify", label: "Verify" },
  { href: "/employers", label: "Employers" },
  { href: "/technicians", label: "Technicians" },
  { href: "/bench", label: "Bench" },
  { href: "/prices", label: "Prices" },
];

const SIGN_IN = { href: "/sign-in", label: "Sign in" };

/** Head of the pages that need no account. */
export function SiteHead() {
  const signIn = (
    <LinkKey href={SIGN_IN.href} size="small">
      {SIGN_IN.label}
    </LinkKey>
  );
  return <Scale stations={STATIONS} right={signIn} menu={<MenuLinks links={[SIGN_IN]} />} />;
}

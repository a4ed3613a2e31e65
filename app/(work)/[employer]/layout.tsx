import type { ReactNode } from "react";

import { MenuLinks, NameMenu, type MenuLink } from "@/components/ui/NameMenu";
import { Scale } from "@/components/ui/Scale";
import { ThemeSwitch } from "@/components/ui/ThemeSwitch";
import { requireActor } from "@/lib/auth/requireActor";
import type { Actor } from "@/lib/policies/actor";
import { can } from "@/lib/policies/can";
import { coveredAddresses, homeOf, menuStationsOf, scaleStationsOf, stationAddress } from "@/lib/policies/stations";
import { SignOut } from "./_components/SignOut";

type Props = { children: ReactNode; params: Promise<{ employer: string }> };

/** Navigation of the signed-in pages. It shows and hides; every page and command asks for itself who may. */
export default async function WorkLayout({ children, params }: Props) {
  const actor = await requireActor((await params).employer);
  const link = (station: Parameters<typeof stationAddress>[1]) => ({
    href: stationAddress(actor.employerSlug, station),
    label: station.label,
    covers: coveredAddresses(actor.employerSlug, station),
  });
  const stations = scaleStationsOf(actor.roles).map(link);
  const links = [
    ...menuStationsOf(actor.roles).map(link),
    ...firmLinks(actor),
    { href: "/account", label: "Your account" },
  ];
  const closing = (
    <>
      <ThemeSwitch />
      <SignOut />
    </>
  );
  return (
    <>
      <Scale
        stations={stations}
        home={homeOf(actor)}
        right={
          <NameMenu name={actor.name} detail={actor.employerName} links={links}>
            {closing}
          </NameMenu>
        }
        menu={
          <>
            <MenuLinks links={links} />
            {closing}
          </>
        }
      />
      <main id="content" className="flex flex-1 flex-col">
        {children}
      </main>
    </>
  );
}

const firmLinks = (actor: Actor): MenuLink[] =>
  can.readTrail(actor, actor)
    ? [
        { href: `/${actor.employerSlug}/counter`, label: "Counter" },
        { href: `/${actor.employerSlug}/trail`, label: "Trail" },
      ]
    : [];

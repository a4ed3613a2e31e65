import { NameMenu } from "@/components/ui/NameMenu";
import { Scale } from "@/components/ui/Scale";
import { signOutAction } from "@/lib/auth/actions";
import { actorAt } from "@/lib/policies/actorAt";
import { homeOf, stationAddress, stationsOf } from "@/lib/policies/stations";
import type { SignedIn } from "@/lib/queries/getSignedIn";

/** Head of the pages about the account: the stations of the first employer, and the way out. */
export function AccountHead({ person }: { person: SignedIn }) {
  const actor = actorAt(person);
  const stations = actor
    ? stationsOf(actor.roles).map((station) => ({
        label: station.label,
        href: stationAddress(actor.employerSlug, station),
      }))
    : [];
  const links = person.employers.map(({ slug, name, roles }) => ({
    href: homeOf({ employerSlug: slug, roles }),
    label: name,
  }));
  const signOut = (
    <form action={signOutAction}>
      <button type="submit" className="menu-item w-full text-left">
        Sign out
      </button>
    </form>
  );
  const menu = (
    <NameMenu name={person.name} detail={person.email} links={[...links, { href: "/account", label: "Account" }]}>
      {signOut}
    </NameMenu>
  );
  return <Scale stations={stations} home={actor ? homeOf(actor) : "/account"} right={menu} menu={signOut} />;
}

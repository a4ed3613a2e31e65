import type { ReactNode } from "react";
import { SiteFoot } from "@/components/site/SiteFoot";
import { SiteHead } from "@/components/site/SiteHead";
import { signedIn } from "@/lib/auth/signedIn";
import { AccountHead } from "./_components/AccountHead";

export default async function AuthLayout({ children }: { children: ReactNode }) {
  const person = await signedIn();
  return (
    <>
      {person ? <AccountHead person={person} /> : <SiteHead />}
      <main id="content" className="flex-1">
        {children}
      </main>
      <SiteFoot />
    </>
  );
}

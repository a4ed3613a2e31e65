import type { ReactNode } from "react";
import { SiteFoot } from "@/components/site/SiteFoot";
import { SiteHead } from "@/components/site/SiteHead";

export default function PublicLayout({ children }: { children: ReactNode }) {
  return (
    <>
      <SiteHead />
      <main id="content" className="flex-1">
        {children}
      </main>
      <SiteFoot />
    </>
  );
}

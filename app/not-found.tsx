import { NothingHere } from "@/components/site/NothingHere";
import { SiteFoot } from "@/components/site/SiteFoot";
import { SiteHead } from "@/components/site/SiteHead";

/** For addresses outside every shell; the shells have their own. */
export default function NotFound() {
  return (
    <>
      <SiteHead />
      <main id="content" className="flex-1">
        <NothingHere />
      </main>
      <SiteFoot />
    </>
  );
}

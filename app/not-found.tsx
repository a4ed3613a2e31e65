import { SiteFoot } from "@/components/site/SiteFoot";
import { SiteHead } from "@/components/site/SiteHead";
import { LinkKey } from "@/components/ui/LinkKey";

export default function NotFound() {
  return (
    <>
      <SiteHead />
      <main id="content" className="page flex-1 py-14">
        <h1 className="text-h1">Nothing stands at this address</h1>
        <p className="mt-3 max-w-measure text-lead text-ink-2">
          It was mistyped, or what it named is not yours to see. A certificate is found by its number.
        </p>
        <p className="mt-6 flex flex-wrap gap-3">
          <LinkKey href="/verify" variant="filled">
            Verify a certificate
          </LinkKey>
          <LinkKey href="/">Start page</LinkKey>
        </p>
      </main>
      <SiteFoot />
    </>
  );
}

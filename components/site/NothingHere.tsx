import { LinkKey } from "@/components/ui/LinkKey";

/** What stands where nothing stands; says no more to one who may not see a record than to one who mistyped. */
export function NothingHere() {
  return (
    <div className="page py-14">
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
    </div>
  );
}

import { Key } from "@/components/ui/Key";
import { LinkKey } from "@/components/ui/LinkKey";
import { Notice } from "@/components/ui/Notice";
import type { PublicVerificationRecord } from "@/lib/queries/getPublicVerificationRecord";
import { RecordWaiting } from "./RecordWaiting";

type SaveRecordProps = { number: string; record: PublicVerificationRecord | null };

/** What the register says now as a signed file to keep. Works without script; the page itself waits when signing takes long. */
export function SaveRecord({ number, record }: SaveRecordProps) {
  if (record?.fault) {
    return (
      <Notice tone="caution" fact="The record could not be signed." reference={record.fault} live>
        The register&rsquo;s answer on this page stands all the same. The operator has been told.
      </Notice>
    );
  }
  if (record?.signed) {
    return (
      <Notice
        tone="plus"
        fact="The record is signed."
        live
        action={
          <LinkKey href={`/api/verify/records/${record.id}`} size="small">
            Download the record
          </LinkKey>
        }
      >
        It can be fetched for a day.
      </Notice>
    );
  }
  if (record) return <RecordWaiting />;
  return (
    <form method="post" action="/api/verify/records" className="grid justify-items-start gap-2">
      <input type="hidden" name="number" value={number} />
      <Key type="submit">Save a record of this verification</Key>
      <p className="text-label font-normal text-ink-2">
        A signed PDF of what the register says at this moment. Nothing in it is about you.
      </p>
    </form>
  );
}

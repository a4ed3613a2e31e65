/** One quiet line on every page of a demonstration installation. */
export function DemonstrationLine({ mailAddress }: { mailAddress?: string }) {
  return (
    <p className="border-b-hair border-rule bg-caution-wash text-label">
      <span className="page flex flex-wrap gap-x-4 py-1">
        <span>
          <strong className="font-semibold">Demonstration.</strong> No certificate here is real.
        </span>
        {mailAddress && (
          <a href={mailAddress} className="link">
            Mails sent
          </a>
        )}
      </span>
    </p>
  );
}

/** One quiet line on every page of a demonstration installation. */
export function DemonstrationLine({ mailAddress }: { mailAddress?: string }) {
  return (
    <p className="border-b-hair border-rule bg-caution-wash text-label">
      <span className="page block py-1">
        <strong className="font-semibold">Demonstration.</strong> No certificate here is real.{" "}
        {mailAddress && (
          <a href={mailAddress} className="link">
            Mails sent
          </a>
        )}
      </span>
    </p>
  );
}

import { formatDay } from "@/components/ui/formatDay";
import type { PublicVerification } from "@/lib/queries/getPublicVerification";

/** Who, what, until when, in one sentence; one that does not hold begins with what not to do. */
export function RegisterSentence({ entry }: { entry: PublicVerification }) {
  const who = <strong>{entry.holder}</strong>;
  const what = <strong>{entry.scheme.title}</strong>;
  const since = formatDay(entry.standingSince);
  const noReliance = <strong>Do not rely on this certificate.</strong>;
  const sentence = {
    Valid: (
      <>
        {who} is competent in {what}.
      </>
    ),
    "Not yet valid": (
      <>
        It will show competence of {who} in {what} from <strong>{formatDay(entry.effectiveOn)}</strong> on.
      </>
    ),
    Suspended: (
      <>
        {noReliance} It shows competence of {who} in {what} and is suspended since <strong>{since}</strong>. A
        suspension can be taken back.
      </>
    ),
    Withdrawn: (
      <>
        {noReliance} It showed competence of {who} in {what} and was withdrawn on <strong>{since}</strong>.
      </>
    ),
    Superseded: (
      <>
        {noReliance} A later certificate of {who} in {what} took its place on <strong>{since}</strong>.
      </>
    ),
    Expired: (
      <>
        {noReliance} It showed competence of {who} in {what} until <strong>{formatDay(entry.lastDay)}</strong>.
      </>
    ),
  }[entry.standing];
  return (
    <>
      <p className="mt-6 text-[1.25rem] leading-8 tablet:text-[1.625rem] tablet:leading-9">{sentence}</p>
      {entry.ground && <p className="mt-2 text-ink-2">Ground: {entry.ground}</p>}
    </>
  );
}

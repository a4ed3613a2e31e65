import { Key } from "@/components/ui/Key";
import { Notice } from "@/components/ui/Notice";

/** The capture of a case did not come; nothing is lost by asking again. */
export function CaptureFailed({ onAgain }: { onAgain: () => void }) {
  return (
    <Notice tone="minus" fact="The capture could not be loaded." live action={<Key onClick={onAgain}>Load again</Key>}>
      Your answers are kept.
    </Notice>
  );
}

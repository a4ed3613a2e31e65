import { Glyph } from "./Glyph";

const looks = {
  saved: { glyph: "done", word: "Saved" },
  saving: { glyph: "awaiting", word: "Saving" },
  kept: { glyph: "suspended", word: "Kept on this device" },
  "not-saved": { glyph: "outside", word: "Not saved" },
} as const;

type SavedStateProps = {
  state: keyof typeof looks;
  /** Time of the last save, as shown ("14:31:07"). */
  at?: string;
  /** Where it is ("On this tablet and at the server"), or why not and what happens next. */
  where?: string;
  /** Both on one line, for narrow heads. */
  inline?: boolean;
};

/** Saved when and where; always in the same place, announced politely. */
export function SavedState({ state, at, where, inline }: SavedStateProps) {
  const { glyph, word } = looks[state];
  return (
    <div className="flex items-start gap-3" role="status">
      <Glyph name={glyph} className="mt-px flex-none" />
      <p className={inline ? "flex flex-wrap gap-x-2 text-dense" : "text-dense"}>
        <strong
          className={state === "not-saved" ? "block font-bold text-minus-deep figures" : "block font-bold figures"}
        >
          {at ? `${word} ${at}` : word}
        </strong>
        {where && <span className="block text-[0.875rem] text-ink-2">{where}</span>}
      </p>
    </div>
  );
}

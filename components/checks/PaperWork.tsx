/** Where nothing is measured on screen: the givens stand beside it, and the work is done on paper. */
export const FormulaWork = () => (
  <p className="max-w-measure">
    Everything you need stands under Given. Work on paper or with your own calculator; the{" "}
    <a className="link" href="/bench" target="_blank" rel="noreferrer">
      bench
    </a>{" "}
    opens beside this page. A value may be typed in any unit that fits.
  </p>
);

export const WrittenWork = () => (
  <p className="max-w-measure">
    Nothing is computed here. Write your account under Answers; it is saved as you type, and an assessor reads it after
    you hand in.
  </p>
);

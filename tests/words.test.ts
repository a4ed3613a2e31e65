import { expect, test } from "vitest";
import { filesIn, read } from "./support/sourceFiles";

// Lagmark is a tool of a trade and teaches nothing: these are no names of its things, on screen or in code.
const COURSE_WORDS =
  /^(courses?|courseware|lessons?|quiz(zes)?|enroll?(s|ed|ing|ments?)?|attempt(s|ed|ing)?|grad(e|es|ed|ing|er)|gradebooks?|scor(e|es|ed|ing)|scoreboards?|learners?|students?|badges?)$/;

// Other people's words that only look like them.
const NOT_OURS = [
  /\bof course\b/gi,
  /student's t\b/gi,
  /oscillator('s)? grades?|grades? of (the |an )?oscillators?/gi,
  /delivery attempts?/gi,
];

// Lists of the words themselves.
const LISTS = ["tests/words.test.ts", "tests/mdx/trustedPages.test.ts"];
const TEXT = /(\.(ts|tsx|mts|mjs|js|css|mdx?|json|yml|svg|html)|\/run|^\.[\w.]+)$/;
const WRITTEN = filesIn("").filter((file) => TEXT.test(file) && !/^(public|fonts|package-lock)/.test(file));

/** Words of a text, `gradeBook`, `grade_book` and "grade book" alike. */
function wordsOf(text: string): string[] {
  const plain = NOT_OURS.reduce((rest, other) => rest.replace(other, " "), text);
  return plain
    .replace(/([a-z\d])([A-Z])/g, "$1 $2")
    .toLowerCase()
    .split(/[^a-z]+/);
}
const courseWordsIn = (text: string) => wordsOf(text).filter((word) => COURSE_WORDS.test(word));

test.each([
  ["const gradeBook = 1", ["grade"]],
  ["learner_id, attempt_2", ["learner", "attempt"]],
  ["/api/quiz-results", ["quiz"]],
  ["Your score", ["score"]],
  ["Enrol now", ["enrol"]],
  ["of course; Student's t; an oscillator grade; degrade, underscore, upgraded", []],
])("%j is seen for what it is", (text, words) => {
  expect(courseWordsIn(text)).toEqual(words);
});

test("no source, screen or content calls a thing by a word of course software", () => {
  expect(WRITTEN.length).toBeGreaterThan(300);
  const found = WRITTEN.filter((file) => !LISTS.includes(file)).flatMap((file) =>
    courseWordsIn(read(file)).map((word) => `${file}: ${word}`),
  );
  expect(found).toEqual([]);
});

test("nor does a file's name", () => {
  expect(filesIn("").filter((file) => courseWordsIn(file).length > 0)).toEqual([]);
});

// A check is a thing of ours; whoever holds a certificate against the register verifies it.
test("a certificate is verified and never checked", () => {
  const checked =
    /\bcheck(s|ed|ing)? (a|the|this|that|your|my|one|any)? ?certificates?\b|\bcertificates? (is|are|was|were|be) checked\b/i;
  const screens = WRITTEN.filter((file) => /^(app|components|content|lib|README|DEVELOPERS)/.test(file));
  expect(screens.filter((file) => checked.test(read(file)))).toEqual([]);
});

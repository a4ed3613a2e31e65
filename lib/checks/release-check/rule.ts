/** Raised when cases, hand-ins or bounds below change what the same plan would show. */
export const RELEASE_CHECK_VERSION = 1;

/** People who never existed: so many cases of each check, and of a search kind so many with all their samples. */
export const FULL_CASES = 1000;
export const WHOLE_CASES = 25;
/** A look before the whole: it permits no release. */
export const PREVIEW_CASES = 200;
export const GUESSES_PER_CASE = 10;

/** Of the bounds of each rate; both sides together. */
export const CONFIDENCE = 0.95;

/**
 * What a check has to keep so that it harms nobody. Common practice, no source: a careful person who fails one check in thirty
 * can sit a fresh case; a method known to be wrong, or a blind guess, must not be what is certified.
 */
export const LEAST_RIGHT = { rate: 0.97, lower: 0.955 } as const;
export const MOST_WRONG = 0.05;
export const MOST_GUESSED = 0.01;
/** Of a whole sitting, by blind guessing with every fresh case that the release allows. */
export const MOST_SITTINGS_GUESSED = 0.001;

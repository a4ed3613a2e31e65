/** How the checks were sat, in the same words on paper and on the public page. */
export const SUPERVISION_IN_WORDS = {
  open: "Open book, not supervised",
  remote: "Supervised from a distance",
  "on-site": "Supervised on site",
} as const;

/** Everybody who tries every entrance. All but the last two belong to the firm whose pages they ask for. */
export const VISITORS = [
  "signed out",
  "the technician",
  "another technician",
  "lead",
  "assessor",
  "decider",
  "administrator",
  "every role elsewhere",
  "operator",
] as const;
export type Visitor = (typeof VISITORS)[number];

/** What the addresses of the firm's records are made of. */
export type Ids = Readonly<
  Record<
    | "employer"
    | "module"
    | "triedModule"
    | "release"
    | "assignment"
    | "order"
    | "openCase"
    | "file"
    | "sitting"
    | "undecided"
    | "written"
    | "record"
    | "certificate"
    | "verification",
    string
  >
>;

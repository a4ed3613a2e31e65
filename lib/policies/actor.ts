export const ROLES = ["technician", "lead", "assessor", "decider", "administrator"] as const;
export type Role = (typeof ROLES)[number];

/** Who acts, for which employer, read from the database on every request. */
export type Actor = {
  personId: string;
  name: string;
  sessionId: string;
  employerId: string;
  employerSlug: string;
  employerName: string;
  roles: readonly Role[];
  /** For a decider: not in the line of the people decided on. */
  outsideLine: boolean;
  isOperator: boolean;
  /** When the password was last given in this session. */
  passwordAt: Date | null;
};

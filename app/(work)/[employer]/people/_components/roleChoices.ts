/** What each role gets done, in a line. */
export const ROLE_CHOICES = [
  { value: "technician", label: "Technician", detail: "sits practical checks" },
  { value: "lead", label: "Lead", detail: "writes, releases and assigns modules" },
  { value: "assessor", label: "Assessor", detail: "reads the records of the firm’s sittings" },
  { value: "decider", label: "Decider", detail: "decides, suspends and withdraws" },
  { value: "administrator", label: "Administrator", detail: "people, roles and fees" },
] as const;

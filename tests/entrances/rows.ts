import { VISITORS, type Ids, type Visitor } from "./visitors";

/** What each visitor is answered: an HTTP status, or "sign in" for the way to the sign-in page and back. */
export type Answers = Record<Visitor, number | "sign in">;
export type Addressed = { address: (ids: Ids) => string; answers: Answers };

const everybody = (status: number): Answers =>
  Object.fromEntries(VISITORS.map((visitor) => [visitor, status])) as Answers;
const OF_THE_FIRM = ["the technician", "another technician", "lead", "assessor", "decider", "administrator"] as const;
type Member = (typeof OF_THE_FIRM)[number];

/** A page of the employer: 200 for those named; for others it is not there, as for strangers. */
const pageFor = (...open: readonly Member[]): Answers => ({ ...to(200, open), "signed out": "sign in" });
/** The same for programs, which are told that they are signed out. */
const routeFor = (...open: readonly Member[]): Answers => ({ ...to(200, open), "signed out": 401 });
const to = (status: number, open: readonly Member[]): Answers => ({
  ...everybody(404),
  ...Object.fromEntries(open.map((visitor) => [visitor, status])),
});

const OFFICE = ["lead", "assessor", "decider", "administrator"] as const;
const READERS = ["the technician", "lead", "assessor", "decider"] as const;
const open = (path: string): Addressed => ({ address: () => path, answers: everybody(200) });
const own = (path: string, ...members: readonly Member[]): Addressed => ({
  address: ({ employer }) => `/${employer}/${path}`,
  answers: pageFor(...members),
});
const signedIn = (status: number): Answers => ({ ...everybody(status), "signed out": "sign in" });

export const PAGES: Readonly<Record<string, Addressed>> = {
  "/": open("/"),
  "/bench": open("/bench"),
  "/cautions": open("/cautions"),
  "/employers": open("/employers"),
  "/impartiality": open("/impartiality"),
  "/prices": open("/prices"),
  "/privacy": open("/privacy"),
  "/technicians": open("/technicians"),
  "/trust": open("/trust"),
  "/verify": open("/verify"),
  "/verify/[number]": { address: (ids) => `/verify/${ids.certificate}`, answers: everybody(200) },
  // Whoever is signed in already goes on to where the work is.
  "/sign-in": { address: () => "/sign-in", answers: { ...everybody(307), "signed out": 200 } },
  "/sign-in/sent": open("/sign-in/sent"),
  "/sign-in/link": open("/sign-in/link?email=nobody@example.test&token=none"),
  "/account": { address: () => "/account", answers: signedIn(200) },
  "/operator/stopped-jobs": {
    address: () => "/operator/stopped-jobs",
    answers: { ...everybody(404), "signed out": "sign in", operator: 200 },
  },
  "/[employer]": {
    address: ({ employer }) => `/${employer}`,
    answers: { ...to(307, OF_THE_FIRM), "signed out": "sign in" },
  },
  "/[employer]/desk": own("desk", ...OF_THE_FIRM),
  "/[employer]/checks": own("checks", ...OF_THE_FIRM),
  "/[employer]/certificates": own("certificates", ...OF_THE_FIRM),
  "/[employer]/certificates/[number]": {
    address: (ids) => `/${ids.employer}/certificates/${ids.certificate}`,
    answers: pageFor("the technician", ...OFFICE),
  },
  "/[employer]/assignments/[id]": {
    address: (ids) => `/${ids.employer}/assignments/${ids.assignment}`,
    answers: pageFor("the technician", ...OFFICE),
  },
  "/[employer]/sittings": own("sittings", ...OFFICE),
  "/[employer]/sittings/[id]": {
    address: (ids) => `/${ids.employer}/sittings/${ids.sitting}`,
    answers: pageFor("the technician", ...OFFICE),
  },
  // Nobody looks over a technician's shoulder while a case is open.
  "/[employer]/cases/[id]": {
    address: (ids) => `/${ids.employer}/cases/${ids.openCase}`,
    answers: pageFor("the technician"),
  },
  "/[employer]/records": own("records", "lead", "assessor", "decider"),
  "/[employer]/records/[id]": {
    address: (ids) => `/${ids.employer}/records/${ids.record}`,
    answers: pageFor(...READERS),
  },
  "/[employer]/modules": own("modules", "lead", "administrator"),
  "/[employer]/modules/[id]": {
    address: (ids) => `/${ids.employer}/modules/${ids.module}`,
    answers: pageFor("lead", "administrator"),
  },
  "/[employer]/modules/[id]/releases/[number]": {
    address: (ids) => `/${ids.employer}/modules/${ids.module}/releases/${ids.release}`,
    answers: pageFor("lead", "administrator"),
  },
  "/[employer]/modules/corrections": own("modules/corrections", "lead"),
  "/[employer]/modules/[id]/release-check": {
    address: (ids) => `/${ids.employer}/modules/${ids.module}/release-check`,
    answers: pageFor("lead"),
  },
  "/[employer]/modules/[id]/release-check/[check]": {
    address: (ids) => `/${ids.employer}/modules/${ids.triedModule}/release-check/list?line=read&n=0&hand=0`,
    answers: pageFor("lead"),
  },
  "/[employer]/people": own("people", "lead", "administrator"),
  "/[employer]/counter": own("counter", "administrator"),
  "/[employer]/counter/orders/[id]": {
    address: (ids) => `/${ids.employer}/counter/orders/${ids.order}`,
    answers: pageFor("administrator"),
  },
  "/[employer]/queue": own("queue", "assessor", "decider"),
  "/[employer]/queue/[sitting]": {
    address: (ids) => `/${ids.employer}/queue/${ids.undecided}`,
    answers: pageFor("assessor", "decider"),
  },
  "/[employer]/queue/judging/[case]": {
    address: (ids) => `/${ids.employer}/queue/judging/${ids.written}`,
    answers: pageFor("assessor"),
  },
  "/[employer]/register": own("register", "assessor", "decider"),
  "/[employer]/register/[number]": {
    address: (ids) => `/${ids.employer}/register/${ids.certificate}`,
    answers: pageFor("assessor", "decider"),
  },
  "/[employer]/trail": own("trail", "administrator"),
};

const firmRoute = (path: (ids: Ids) => string, answers: Answers): Addressed => ({
  address: (ids) => `/api/employers/${ids.employer}/${path(ids)}`,
  answers,
});

export const READING_ROUTES: Readonly<Record<string, Addressed>> = {
  "GET /api/trail/heads": open("/api/trail/heads"),
  // The holder's own alone, whatever roles are left.
  "GET /api/account/certificates/[number]/pdf": {
    address: (ids) => `/api/account/certificates/${ids.certificate}/pdf`,
    answers: { ...everybody(404), "the technician": 200, "signed out": 401 },
  },
  "GET /api/verify/records/[id]": {
    address: (ids) => `/api/verify/records/${ids.verification}`,
    answers: everybody(200),
  },
  "GET /issuer/[file]": open("/issuer/root.pem"),
  "GET /api/employers/[employer]/cases/[id]/files/[name]": firmRoute(
    (ids) => `cases/${ids.openCase}/files/${ids.file}`,
    routeFor("the technician"),
  ),
  "GET /api/employers/[employer]/cases/[id]/progress": firmRoute(
    (ids) => `cases/${ids.openCase}/progress`,
    routeFor(...READERS),
  ),
  "GET /api/employers/[employer]/modules/[id]/release-check": firmRoute(
    (ids) => `modules/${ids.module}/release-check`,
    routeFor("lead"),
  ),
  "GET /api/employers/[employer]/certificates/[number]/pdf": firmRoute(
    (ids) => `certificates/${ids.certificate}/pdf`,
    routeFor("the technician", ...OFFICE),
  ),
};

/** What writes: the test that tries it with every role, own and other employer, and the command or query it tries. */
export type Crossed = { crossedIn: string; tries: string };
const crossedIn = (test: string, tries: string): Crossed => ({ crossedIn: `tests/${test}.test.ts`, tries });

/** With an address, the closed ones are also tried signed out, from a stranger and from another site. */
export const WRITING_ROUTES: Readonly<Record<string, Crossed & { address?: (ids: Ids) => string }>> = {
  "PUT /api/employers/[employer]/cases/[id]/answers": {
    address: (ids) => `/api/employers/${ids.employer}/cases/${ids.openCase}/answers`,
    ...crossedIn("commands/saveAnswers", "saveAnswers"),
  },
  "POST /api/employers/[employer]/cases/[id]/hand-in": {
    address: (ids) => `/api/employers/${ids.employer}/cases/${ids.openCase}/hand-in`,
    ...crossedIn("commands/handIn", "handIn"),
  },
  "POST /api/employers/[employer]/modules/[id]/check": {
    address: (ids) => `/api/employers/${ids.employer}/modules/${ids.module}/check`,
    ...crossedIn("queries/tenants", "checkDraft"),
  },
  "PUT /api/employers/[employer]/modules/[id]/draft": {
    address: (ids) => `/api/employers/${ids.employer}/modules/${ids.module}/draft`,
    ...crossedIn("commands/saveDraft", "saveDraft"),
  },
  // Open to anyone: believed by its signature only; stores nothing; stores nothing of who asked.
  "POST /api/stripe/webhook": crossedIn("payments/webhook-signature", "POST"),
  "POST /api/verify/file": crossedIn("routes/verifyFile", "POST"),
  "POST /api/verify/records": crossedIn("routes/verificationRecords", "POST"),
};

export const ACTIONS: Readonly<Record<string, Crossed>> = {
  signInAction: crossedIn("auth/sign-in", "signInByPassword"),
  mailLinkAction: crossedIn("auth/sign-in", "askForLink"),
  followLinkAction: crossedIn("auth/sign-in", "signInByLink"),
  signOutAction: crossedIn("auth/sign-in", "signOut"),
  confirmPasswordAction: crossedIn("commands/people-accounts", "confirmPassword"),
  renamePersonAction: crossedIn("commands/people-accounts", "renamePerson"),
  setPasswordAction: crossedIn("commands/people-accounts", "setPassword"),
  endSessionAction: crossedIn("commands/people-accounts", "endSession"),
  actOnJobAction: crossedIn("commands/actOnJob", "actOnJob"),
  addPersonAction: crossedIn("commands/people-roles", "addPerson"),
  grantRoleAction: crossedIn("commands/people-roles", "grantRole"),
  endRoleAction: crossedIn("commands/people-roles", "endRole"),
  recordTrainingAction: crossedIn("commands/people-trainings", "recordTraining"),
  createModuleAction: crossedIn("commands/createModule", "createModule"),
  askReleaseCheckAction: crossedIn("commands/askReleaseCheck", "askReleaseCheck"),
  stopReleaseCheckAction: crossedIn("commands/askReleaseCheck", "stopReleaseCheck"),
  releaseModuleAction: crossedIn("commands/releaseModule", "releaseModule"),
  reviewMarkingAction: crossedIn("commands/reviewMarking", "reviewMarking"),
  actOnReviewAction: crossedIn("commands/actOnReview", "actOnReview"),
  assignReleaseAction: crossedIn("commands/assignRelease", "assignRelease"),
  orderFeesAction: crossedIn("commands/orderFees", "orderFees"),
  payOrderAction: crossedIn("payments/checkout", "startCheckout"),
  cancelOrderAction: crossedIn("payments/checkout", "cancelOrder"),
  startSittingAction: crossedIn("commands/startSitting", "startSitting"),
  openCaseAction: crossedIn("commands/openCase", "openCase"),
  askQuestionAction: crossedIn("commands/askQuestion", "askQuestion"),
  answerQuestionAction: crossedIn("commands/answerQuestion", "answerQuestion"),
  judgeWrittenAction: crossedIn("commands/judgeWritten", "judgeWritten"),
  decideAction: crossedIn("commands/decide", "decide"),
  setStandingAction: crossedIn("commands/setStanding", "setStanding"),
};

/** Jobs have no visitor; the test of the task shows that it does its work once. */
export const JOB_ROWS: Readonly<Record<string, Crossed>> = {
  "build-case": crossedIn("worker/buildCase", "buildCase"),
  "close-case": crossedIn("worker/closeCase", "closeCase"),
  "mark-case": crossedIn("worker/markCase", "markCase"),
  "review-case": crossedIn("worker/reviewCase", "reviewCase"),
  "mark-again": crossedIn("worker/markAgain", "markAgain"),
  "check-release": crossedIn("worker/checkRelease", "checkRelease"),
  "issue-certificate": crossedIn("worker/issueCertificate", "issueCertificate"),
  "sign-verification": crossedIn("worker/signVerification", "signVerification"),
  "send-mail": crossedIn("worker/sendMail", "sendMail"),
};

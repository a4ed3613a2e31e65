import { expect, test } from "vitest";
import { JOB_NAMES } from "@/lib/jobs/jobs";
import { actions, exists, hiddenActions, pages, read, routes } from "@/tests/support/entrances";
import { ACTIONS, JOB_ROWS, PAGES, READING_ROUTES, WRITING_ROUTES, type Crossed } from "./rows";

// A new entrance without a row fails here, and so does a row whose entrance is gone.
test("every page has its row", () => expect(Object.keys(PAGES).sort()).toEqual(pages().sort()));

test("every route handler has its row", () =>
  expect([...Object.keys(READING_ROUTES), ...Object.keys(WRITING_ROUTES)].sort()).toEqual(routes().sort()));

test("every server action has its row", () =>
  expect(Object.keys(ACTIONS).sort()).toEqual(
    actions()
      .map(({ name }) => name)
      .sort(),
  ));

test("every job has its row", () => expect(Object.keys(JOB_ROWS).sort()).toEqual([...JOB_NAMES].sort()));

test("what a file of actions gives away is an action and says so in its name", () =>
  expect(actions().filter(({ name }) => !name.endsWith("Action"))).toEqual([]));

test("no action hides inside a component", () => expect(hiddenActions()).toEqual([]));

test("only what reads is a row of those tried over HTTP for every visitor", () => {
  expect(Object.keys(READING_ROUTES).filter((name) => !name.startsWith("GET "))).toEqual([]);
  expect(Object.keys(WRITING_ROUTES).filter((name) => name.startsWith("GET "))).toEqual([]);
});

const crossed = { ...WRITING_ROUTES, ...ACTIONS, ...JOB_ROWS } as Record<string, Crossed>;
test.each(Object.entries(crossed))("%s is tried in a test of its own", (_name, { crossedIn, tries }) => {
  expect(exists(crossedIn), `${crossedIn} exists`).toBe(true);
  expect(read(crossedIn)).toMatch(new RegExp(`\\b${tries}\\b`));
});

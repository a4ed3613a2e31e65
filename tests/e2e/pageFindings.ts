import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import type { AxeResults, RunOptions } from "axe-core";
import type { Page } from "playwright-core";

// Run in the page itself: the builder around it opens a second page for each look, which takes ten times as long.
const AXE = readFileSync(
  createRequire(import.meta.resolve("@axe-core/playwright")).resolve("axe-core/axe.min.js"),
  "utf8",
);
const WCAG_22_AA = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"];
/** Smallest side of a target under a finger: WCAG 2.2, 2.5.5 (inline links excepted). */
const TARGET_PX = 44;

/** The themes differ in colours alone: what else there is to find is looked for once. */
const LOOKS = [
  { colorScheme: "dark", runOnly: { type: "rule", values: ["color-contrast", "link-in-text-block"] } },
  { colorScheme: "light", runOnly: { type: "tag", values: WCAG_22_AA } },
] as const;

type WithAxe = { axe?: { run(options: RunOptions): Promise<AxeResults> } };

/** What of WCAG 2.2 AA a machine finds broken on the page as it stands, in the light theme and in the dark. */
export async function brokenRules(page: Page): Promise<string[]> {
  // The title of a page comes behind its body, late on a busy machine; one that never comes is found below.
  await page.waitForFunction(() => document.title !== "", null, { timeout: 20_000 }).catch(() => undefined);
  if (!(await page.evaluate(() => "axe" in window))) await page.evaluate(AXE);
  const found: string[] = [];
  for (const { colorScheme, runOnly } of LOOKS) {
    await page.emulateMedia({ colorScheme });
    const { violations } = await page.evaluate(
      (only) =>
        (window as WithAxe).axe!.run({ runOnly: { ...only, values: [...only.values] }, resultTypes: ["violations"] }),
      runOnly,
    );
    for (const { id, nodes } of violations) {
      const where = nodes.map(({ target, failureSummary }) => `${target.join(" ")} (${failureSummary})`);
      found.push(`${at(page)}, ${colorScheme}: ${id}: ${where.join("; ")}`);
    }
  }
  return found;
}

/** What does not fit a phone: a page wider than its window, targets smaller than a finger; and every broken rule. */
export async function phoneFindings(page: Page): Promise<string[]> {
  const found = await page.evaluate((smallestPx) => {
    const { scrollWidth, clientWidth } = document.documentElement;
    const wide =
      scrollWidth > clientWidth ? [`the page is ${scrollWidth} px wide in a window of ${clientWidth} px`] : [];
    const targets = document.querySelectorAll<HTMLElement>("a[href], button, input, select, textarea, summary");
    const small = [...targets].flatMap((element) => {
      const inline = element.tagName === "A" && getComputedStyle(element).display === "inline";
      if (inline || element.tabIndex < 0 || !element.checkVisibility({ visibilityProperty: true })) return [];
      // A box or a whole row takes the finger for what stands in it.
      const { width, height, bottom } = (element.closest("label, .field-box") ?? element).getBoundingClientRect();
      // Layout ends on fractions of a px. What stands above the page comes down when it has the focus.
      if (Math.min(width, height) >= smallestPx - 0.5 || bottom + scrollY <= 0) return [];
      const name = element.getAttribute("aria-label") ?? element.textContent.trim().slice(0, 40);
      return [`${element.tagName} "${name}" is ${Math.round(width)} x ${Math.round(height)} px`];
    });
    return [...wide, ...small];
  }, TARGET_PX);
  return [...found.map((one) => `${at(page)}: ${one}`), ...(await brokenRules(page))];
}

const at = (page: Page) => new URL(page.url()).pathname;

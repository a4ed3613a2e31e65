// @vitest-environment jsdom
import { readFile } from "node:fs/promises";
import { renderToStaticMarkup } from "react-dom/server";
import { expect, test } from "vitest";
import { ModuleTree } from "@/components/mdx/ModuleTree";
import { checkCards } from "@/lib/mdx/checkCards";
import { readModule } from "@/lib/mdx/readModule";
import { moduleOf } from "./moduleText";

async function pageOf(text: string): Promise<string> {
  const { tree } = await readModule(moduleOf(text));
  return tree ? renderToStaticMarkup(<ModuleTree tree={tree} />) : "";
}

/** What a browser would find in the page that could run, load or send something. */
function dangers(page: string): string[] {
  const document = new DOMParser().parseFromString(page, "text/html");
  return [...document.body.querySelectorAll("*")].flatMap((element) => [
    ...(/^(script|iframe|style|object|embed|form|img|link|meta|base)$/i.test(element.tagName) ? [element.tagName] : []),
    ...[...element.attributes]
      .filter(
        ({ name, value }) =>
          /^on|^srcdoc$|^formaction$/i.test(name) || (/href|src|action/i.test(name) && !isHarmless(value)),
      )
      .map(({ name, value }) => `${name}=${value}`),
  ]);
}

const isHarmless = (address: string) => /^(https:\/\/|mailto:|#|\/(?!\/))/.test(address) || address === "";

test.each([
  "<script>alert(1)</script>",
  '<img src="x" onerror="alert(1)" />',
  "[x](javascript:alert(1))",
  "[x](java&#x0A;script:alert(1))",
  "[x]: javascript:alert(1)\n\n[x] ![x]",
  "[x](data:text/html,%3Cscript%3E)",
  '<Caution about="rf" onClick="alert(1)">\nText.\n</Caution>',
  '<TwoCodes dangerouslySetInnerHTML={{ html: "<script>" }} a={5} />',
  "$\\href{javascript:alert(1)}{x}$",
  "$\\htmlStyle{position:fixed}{x}$",
  "$\\includegraphics{https://a.example/x.png}$",
  "{<script>x</script>}",
  "```html\n<script>alert(1)</script>\n```",
  "`<img onerror=x>`",
  '[x](https://a.example "\\" onmouseover=\\"alert(1)")',
  '![" onerror="x](https://a.example)',
])("nothing in the page of %s can run", async (text) => {
  const page = await pageOf(text);
  expect(page).toContain("Read the trace.");
  expect(dangers(page)).toEqual([]);
});

test("the look for dangers finds them", () => {
  const page =
    '<p onclick="x"><a href="javascript:x">x</a><img src="//a.example"></p><svg><a xlink:href="data:x"></a></svg>';
  expect(dangers(page)).toEqual(["onclick=x", "href=javascript:x", "IMG", "src=//a.example", "xlink:href=data:x"]);
});

test("the demonstration's module renders whole, with its calculators, formulas and cautions", async () => {
  const { module } = await readModule(await readFile("content/modules/sbw-r2.mdx", "utf8"));
  if (!module) throw new Error("The module has a fault");
  const cards = checkCards(module.checks);
  const page = renderToStaticMarkup(<ModuleTree tree={module.tree} checkCards={cards} />);
  expect(page).toContain("code 5 against code 4");
  expect(page).toContain("False alarms per cell");
  expect(page).toContain("Receive only.");
  expect(page).toContain("On Carrow Quay nobody climbs a boom");
  expect(page).toContain("<math");
  expect(page).toContain("Read the correlator");
  expect(dangers(page)).toEqual([]);
});

test("the page keeps its one h1: headings of a module begin at h2", async () => {
  const page = await pageOf("# One\n\n## Two\n\n### Three");
  expect(page).not.toContain("<h1");
  expect(page).toMatch(/<h2[^>]*>One<\/h2>[\s\S]*<h3[^>]*>Two<\/h3>[\s\S]*<h4[^>]*>Three<\/h4>/);
});

test("links to elsewhere say nothing of this page; links within do", async () => {
  const page = await pageOf("[out](https://a.example) and [in](/bench)");
  expect(page).toMatch(/<a href="https:\/\/a\.example"[^>]*rel="noopener noreferrer"/);
  expect(page).toMatch(/<a href="\/bench"(?![^>]*rel=)/);
});

test("a check is a card with what is judged, the brief, and what the page adds", async () => {
  const { tree, checks } = await readModule(moduleOf(""));
  if (!tree) throw new Error("The module cannot be shown");
  const { reading } = checkCards(checks);
  const card = { ...reading!, action: <em>Open the case</em> };
  const page = renderToStaticMarkup(<ModuleTree tree={tree} checkCards={{ reading: card }} />);
  expect(page).toMatch(/<section aria-label="Practical check reading"/);
  expect(page).toContain("Read the trace.");
  expect(page).toContain("15 min");
  expect(page).toContain("Lag of the highest cell");
  expect(page).toContain("±0.2\u00a0chip");
  expect(page).toContain("<em>Open the case</em>");
});

test("a card that nobody passed is still the brief", async () => {
  expect(await pageOf("")).toMatch(/Practical check<[\s\S]*Read the trace\./);
});

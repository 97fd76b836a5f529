import { catalogue } from "../../src/cells/generated/catalogue";
import { CAUTIONS } from "../../src/cells/cautions";
import { helpPage } from "../../src/help/help-page";

const page = helpPage(catalogue);

test("every function has its card with units, limits, sources and example", () => {
  for (const entry of catalogue) expect(page).toContain(`<article id="${entry.name}">`);
  expect(page.match(/<h3>Valid range and error<\/h3>/g)).toHaveLength(catalogue.length);
});

test("every link on the page leads to a place on it", () => {
  const ids = new Set([...page.matchAll(/\sid="([^"]+)"/g)].map((m) => m[1]));
  const links = [...page.matchAll(/href="([^"]+)"/g)].map((m) => m[1]!);
  expect(links.length).toBeGreaterThan(catalogue.length);
  for (const link of links) expect(ids.has(link.slice(1)) && link.startsWith("#")).toBe(true);
});

test("the cautions stand on it, and text is never taken for markup", () => {
  for (const caution of CAUTIONS) expect(page).toContain(caution);
  expect(helpPage([{ ...catalogue[0]!, purpose: "a <b> & c" }])).toContain("a &lt;b&gt; &amp; c");
});

import { SaxesParser } from "saxes";
import { catalogue } from "../../src/cells/generated/catalogue";
import { CAUTIONS } from "../../src/cells/cautions";
import { FUNCTION_EQUATIONS } from "../../src/help/equations/function-equations";
import { functionPage } from "../../src/help/function-page";
import { helpPage } from "../../src/help/help-page";

/** Every page by its path. */
const pages = new Map<string, string>([["help.html", helpPage(catalogue)], ...catalogue.map((e) => [`help/${e.name}.html`, functionPage(e, catalogue)] as const)]);
const idsOf = (page: string) => new Set([...page.matchAll(/\sid="([^"]+)"/g)].map((m) => m[1]!));

test("every function has a page of its own with units, limits, sources and example, and an anchor on the index", () => {
  const anchors = idsOf(pages.get("help.html")!);
  for (const entry of catalogue) {
    expect(anchors.has(entry.name)).toBe(true);
    const page = pages.get(`help/${entry.name}.html`)!;
    expect(page).toContain(`<h1>${entry.name}</h1>`);
    for (const heading of ["Gives", "Valid range and error", "Source", "Example"]) expect(page).toContain(`<h2>${heading}</h2>`);
    expect(page.match(/<tr><th scope="row">/g)?.length ?? 0).toBe(entry.parameters.length);
  }
});

test("every link of every page leads to a page and a place on it", () => {
  let links = 0;
  for (const [from, page] of pages) {
    for (const [, link] of page.matchAll(/href="([^"]+)"/g)) {
      const { pathname, hash } = new URL(link!, `http://here/${from}`);
      const target = pages.get(pathname.slice(1));
      expect(target === undefined ? `${from}: ${link}` : "").toBe("");
      if (hash !== "") expect(idsOf(target!).has(hash.slice(1)) ? "" : `${from}: ${link}`).toBe("");
      links += 1;
    }
  }
  expect(links).toBeGreaterThan(3 * catalogue.length);
});

test("the cautions stand on every page; there is no script and nothing from elsewhere; titles differ", () => {
  const titles = new Set<string>();
  for (const page of pages.values()) {
    for (const caution of CAUTIONS) expect(page).toContain(caution);
    expect(page).not.toMatch(/<script|\ssrc=|@import|url\(/i);
    expect(page).not.toMatch(/(?:href|src)="https?:/i);
    titles.add(/<title>([^<]*)<\/title>/.exec(page)![1]!);
  }
  expect(titles.size).toBe(pages.size);
});

test("equations are MathML: well-formed, without an error in them, on the pages of the marches and drag functions", () => {
  for (const name of ["THWAITES_MARCH", "ENERGY_MARCH", "FIELD_MARCH", "ENTRAINMENT_MARCH", "LAG_MARCH", "LAYER_MARCH", "SEPARATION_MARGIN", "WAKE_DRAG", "RAKE_DRAG"]) expect(FUNCTION_EQUATIONS[name]!.length).toBeGreaterThan(0);
  const known = new Set(catalogue.map((e) => e.name));
  for (const name of Object.keys(FUNCTION_EQUATIONS)) {
    expect(known.has(name)).toBe(true);
    const maths = pages.get(`help/${name}.html`)!.match(/<math[\s\S]*?<\/math>/g)!;
    expect(maths).toHaveLength(FUNCTION_EQUATIONS[name]!.length);
    for (const math of maths) {
      expect(math).not.toMatch(/temml-error|merror/);
      const parser = new SaxesParser();
      parser.on("error", (error) => {
        throw error;
      });
      parser.write(math).close();
    }
  }
});

test("text is never taken for markup", () => {
  expect(helpPage([{ ...catalogue[0]!, purpose: "a <b> & c" }])).toContain("a &lt;b&gt; &amp; c");
  expect(functionPage({ ...catalogue[0]!, purpose: "a <b> & c" }, catalogue)).toContain("a &lt;b&gt; &amp; c");
});

import assert from "node:assert/strict";
import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import path from "node:path";
import { after, before, test } from "node:test";
import type { Browser } from "playwright-core";
import { openBench, OUTPUT, startServer, type BenchPage, type BenchServer } from "./bench-page.mjs";
import { launch } from "./chromium.mjs";

const AXE = readFileSync(createRequire(import.meta.url).resolve("axe-core/axe.min.js"), "utf8");

let server: BenchServer;
let browser: Browser;
let bench: BenchPage;

before(async () => {
  server = await startServer();
  browser = await launch();
  bench = await openBench(browser, server.address);
});

after(async () => {
  await browser?.close();
  await server?.stop();
});

const pane = () => bench.page.getByRole("region", { name: "Functions", exact: true });
const tab = (name: string) => pane().getByRole("navigation").getByRole("button", { name, exact: true });
const shot = (name: string) => bench.page.screenshot({ path: path.join(OUTPUT, `${name}.png`) });

/** Tabs on until a button of this name has the focus. */
async function tabTo(name: RegExp): Promise<void> {
  for (let i = 0; i < 80; i += 1) {
    await bench.page.keyboard.press("Tab");
    if (name.test((await bench.page.evaluate(() => document.activeElement?.textContent)) ?? "")) return;
  }
  assert.fail(`no control ${name} within 80 steps of Tab`);
}

/** axe is run in the page's own world, where its policy lets no injected script element in. */
async function axe(): Promise<void> {
  await bench.page.evaluate(AXE);
  const found = await bench.page.evaluate(async () => {
    const { axe: run } = globalThis as unknown as { axe: { run(root: object, options: object): Promise<{ violations: { id: string; nodes: { html: string; failureSummary: string }[] }[] }> } };
    const { violations } = await run.run({ include: ["#pane", "#bench-bar"] }, { resultTypes: ["violations"] });
    return violations.flatMap((v) => v.nodes.map((n) => `${v.id}: ${n.html} ${n.failureSummary}`));
  });
  assert.deepEqual(found, []);
}

test("Check goes through every WALL cell of the book, the bubble of the glider among what is to be looked at, and leads to its cell", async () => {
  await tab("Check").click();
  await pane().getByText(/^\d+ WALL cells: 0 with an error, \d+ to look at, \d+ fine\.$/).waitFor();
  const bubble = pane().locator("li", { hasText: "WARNING bubble" }).first();
  await bubble.waitFor();
  await bubble.getByRole("button").click();
  assert.equal(await bench.page.evaluate(() => globalThis.wallsheetBench!.model.getters.getSheetName(globalThis.wallsheetBench!.model.getters.getActiveSheetId())), "Glider drag");
  await shot("pane-check");
  await axe();
});

test("Check by keyboard alone", async () => {
  await tab("Find").click();
  await tab("Find").focus();
  await tabTo(/^Check$/);
  await bench.page.keyboard.press("Enter");
  await pane().getByText(/WALL cells: /).waitFor();
  await tabTo(/^Check again$/);
  await bench.page.keyboard.press("Enter");
  await pane().getByText(/WALL cells: .*fine\./).waitFor();
  await tabTo(/Look here/);
  await bench.page.keyboard.press("Enter");
});

test("Start writes a template by keyboard, it computes, and undo takes it away", async () => {
  await bench.page.getByRole("banner").getByRole("button", { name: "Empty book" }).click();
  await bench.page.getByRole("banner").getByText("book.xlsx", { exact: true }).waitFor();
  await tab("Start").focus();
  await bench.page.keyboard.press("Enter");
  await pane().getByRole("heading", { name: "Begin" }).waitFor();
  await axe();
  await tabTo(/^Layer from an edge-speed column/);
  await bench.page.keyboard.press("Enter");
  await pane().getByRole("status").filter({ hasText: "Layer from an edge-speed column stands in A1:" }).waitFor();
  const heading = () => bench.page.evaluate(() => {
    const { getters } = globalThis.wallsheetBench!.model;
    return [getters.getEvaluatedCell({ sheetId: getters.getActiveSheetId(), col: 3, row: 5 }).value, getters.getEvaluatedCell({ sheetId: getters.getActiveSheetId(), col: 5, row: 12 }).value];
  });
  const [first, theta] = await heading();
  assert.equal(first, "station x");
  assert.ok(typeof theta === "number" && theta > 0, String(theta));
  await shot("pane-start");
});

test("Build previews the formula while it is being formed, writes a settings block, and inserts a table with its chart", async () => {
  await tab("Find").click();
  await pane().getByRole("searchbox").fill("LAYER_MARCH");
  await pane().getByRole("button", { name: /^LAYER_MARCH/ }).click();
  const argument = (name: string) => pane().getByLabel(new RegExp(`^${name}\\b`));
  await argument("x").fill("A7:A18");
  await argument("ue").fill("B7:B18");
  await argument("nu").fill("B2");
  await argument("options").fill(""); // the worked example's own
  const preview = pane().getByRole("region", { name: "Preview" });
  await preview.getByText("Preview: first 6 of 13 rows").waitFor();
  await shot("pane-build-preview");
  await preview.getByRole("cell", { name: "station x" }).waitFor();
  await argument("nu").fill("-1");
  await preview.getByText(/LAYER_MARCH needs nu above 0/).waitFor();
  await argument("nu").fill("B2");
  await pane().getByLabel("into cell").fill("A30");
  await pane().getByRole("button", { name: "Write a settings block into the sheet" }).click();
  await pane().getByRole("status").filter({ hasText: "The options stand in A30:B4" }).waitFor();
  assert.match(await argument("options").inputValue(), /^A30:B4\d$/);
  assert.equal(await pane().getByLabel("into cell").inputValue(), "D30");
  await pane().getByLabel("with a chart beside its table").check();
  const charts = () => bench.page.evaluate(() => {
    const { getters } = globalThis.wallsheetBench!.model as unknown as { getters: { getActiveSheetId(): string; getChartIds(sheet: string): string[] } };
    return getters.getChartIds(getters.getActiveSheetId()).length;
  });
  const before = await charts();
  await pane().getByRole("button", { name: "Insert", exact: true }).click();
  await pane().getByRole("status").filter({ hasText: "LAYER_MARCH stands in D30." }).waitFor();
  assert.equal(await charts(), before + 1);
  await shot("pane-build");
  await axe();
});

test("Share writes method notes, and saves a plain copy as a file", async () => {
  await tab("Share").click();
  const [file] = await Promise.all([bench.page.waitForEvent("download"), pane().getByRole("button", { name: "Save a plain copy" }).click()]);
  assert.equal(file.suggestedFilename(), "book-plain.xlsx");
  await pane().getByRole("button", { name: "Write method notes" }).click();
  await pane().getByRole("status").filter({ hasText: /method notes stand from|need empty cells/ }).waitFor();
  await pane().getByRole("button", { name: "Enter lost formulas again" }).click();
  await pane().getByRole("status").filter({ hasText: "No WALL cell shows #NAME?." }).waitFor();
  await shot("pane-share");
  await axe();
});

test("Share by keyboard alone; Start by mouse, on a new sheet place", async () => {
  await tab("Find").focus();
  await tabTo(/^Share$/);
  await bench.page.keyboard.press("Enter");
  await tabTo(/^Write method notes$/);
  await bench.page.keyboard.press("Enter");
  await pane().getByRole("status").filter({ hasText: /method notes stand from|need empty cells/ }).waitFor();
  await bench.page.evaluate(() => globalThis.wallsheetBench!.model.selection.selectZone({ cell: { col: 0, row: 60 }, zone: { left: 0, right: 0, top: 60, bottom: 60 } }));
  await tab("Start").click();
  await pane().getByRole("button", { name: /^Drag from a wake rake/ }).click();
  await pane().getByRole("status").filter({ hasText: "Drag from a wake rake stands in A61:" }).waitFor();
  const value = await bench.page.evaluate(() => {
    const { getters } = globalThis.wallsheetBench!.model;
    return getters.getEvaluatedCell({ sheetId: getters.getActiveSheetId(), col: 4, row: 66 }).value;
  });
  // The template's own wake, 1 − 0.22 exp(−(y∕11 mm)²): 2∕c ∫ u (1 − u) dy = 2∕0.6·0.011·√π·(0.22 − 0.22²∕√2).
  const exact = (2 / 0.6) * 0.011 * Math.sqrt(Math.PI) * (0.22 - 0.22 ** 2 / Math.SQRT2);
  assert.ok(Math.abs(Number(value) / exact - 1) < 0.01, `${value} for ${exact}`);
});

test("dark: axe finds nothing on any page; at 200 % zoom of 1280 × 720 nothing scrolls sideways and every tab can be reached", async () => {
  await bench.page.emulateMedia({ colorScheme: "dark" });
  for (const name of ["Find", "Look", "Check", "Share", "Start"]) {
    await tab(name).click();
    if (name === "Check") await pane().getByText(/WALL cells: (nothing|.*fine)/).waitFor();
    await axe();
    if (name !== "Find") await shot(`pane-dark-${name.toLowerCase()}`);
  }
  await bench.page.emulateMedia({ colorScheme: "light" });
  await bench.page.setViewportSize({ width: 640, height: 360 });
  for (const name of ["Find", "Look", "Check", "Share", "Start"]) {
    await tab(name).scrollIntoViewIfNeeded();
    await tab(name).click();
    assert.equal(await bench.page.evaluate(() => document.querySelector("#pane")!.scrollWidth <= document.querySelector("#pane")!.clientWidth), true, name);
  }
  await shot("pane-zoomed");
  await bench.page.setViewportSize({ width: 820, height: 1180 });
  await shot("bench-tablet");
  await bench.page.setViewportSize({ width: 1280, height: 720 });
});

test("all pages hold at 320 px and in forced colours", async () => {
  await bench.page.setViewportSize({ width: 320, height: 800 });
  for (const name of ["Find", "Look", "Check", "Share", "Start"]) {
    await tab(name).click();
    await bench.page.waitForTimeout(150);
    const wide = await bench.page.evaluate(() => document.querySelector("#pane")!.scrollWidth - document.querySelector("#pane")!.clientWidth);
    assert.ok(wide <= 0, `${name} is ${wide} px too wide`);
    const page = await bench.page.evaluate(() => [document.documentElement.scrollWidth, document.documentElement.scrollLeft, document.body.scrollLeft]);
    assert.deepEqual(page, [320, 0, 0], `${name} scrolls the page sideways`);
  }
  await bench.page.emulateMedia({ forcedColors: "active" });
  await shot("pane-narrow-forced");
  await bench.page.emulateMedia({ forcedColors: "none" });
  await bench.page.setViewportSize({ width: 1280, height: 720 });
});

test("no request went to any other host, and the console is quiet", () => {
  assert.deepEqual(bench.elsewhere, []);
  assert.deepEqual(bench.troubles, []);
});

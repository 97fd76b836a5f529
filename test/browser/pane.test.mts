import assert from "node:assert/strict";
import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import path from "node:path";
import { after, before, test } from "node:test";
import type { Browser, Page } from "playwright-core";
import { cells, openBench, OUTPUT, startServer, type BenchPage, type BenchServer } from "./bench-page.mjs";
import { launch } from "./chromium.mjs";

const AXE = readFileSync(createRequire(import.meta.url).resolve("axe-core/axe.min.js"), "utf8");
/** The starter book's blank place for trials: below and beside everything. */
const FREE = { col: 14, row: 40 };

let server: BenchServer;
let browser: Browser;
let bench: BenchPage;
let page: Page;

before(async () => {
  server = await startServer();
  browser = await launch();
  bench = await openBench(browser, server.address);
  page = bench.page;
});

after(async () => {
  await browser?.close();
  await server?.stop();
});

const select = (left: number, top: number, right = left, bottom = top) =>
  page.evaluate(
    ([l, t, r, b]) => {
      globalThis.wallsheetBench!.model.selection.selectZone({ cell: { col: l!, row: t! }, zone: { left: l!, top: t!, right: r!, bottom: b! } });
    },
    [left, top, right, bottom],
  );
const pane = () => page.getByRole("region", { name: "Functions", exact: true });
const status = () => pane().getByRole("status");
const focusedName = () => page.evaluate(() => document.activeElement?.getAttribute("aria-label") ?? (document.activeElement as HTMLInputElement | null)?.labels?.[0]?.textContent ?? document.activeElement?.textContent ?? "");

/** axe is run in the page's own world, where its policy lets no injected script element in. */
async function violations(): Promise<string[]> {
  await page.evaluate(AXE);
  return page.evaluate(async () => {
    const { axe } = globalThis as unknown as { axe: { run(root: object, options: object): Promise<{ violations: { id: string; nodes: { html: string; failureSummary: string }[] }[] }> } };
    const found = await axe.run({ include: ["#pane"] }, { resultTypes: ["violations"] });
    return found.violations.flatMap((v) => v.nodes.map((n) => `${v.id}: ${n.html} ${n.failureSummary}`));
  });
}

test("text has a height with no font but the browser package's own", async () => {
  const box = await pane().getByRole("heading", { name: "Wallsheet" }).boundingBox();
  assert.ok(box !== null && box.height >= 16 && box.width >= 60, JSON.stringify(box));
});

test("searching by word, symbol and source narrows the list and says how many are left", async () => {
  const search = pane().getByRole("searchbox");
  const all = await pane().locator(".wl-entry").count();
  assert.ok(all >= 15, `${all} functions are listed`);
  await search.fill("thwaites");
  assert.match(await status().innerText(), /^\d+ functions?$/);
  assert.equal(await pane().locator(".wl-entry .wl-name").first().innerText(), "THWAITES_MARCH");
  await search.fill("δ*");
  assert.ok((await pane().locator(".wl-entry .wl-name").allInnerTexts()).includes("DEFECT_THICKNESS"));
  await search.fill("umbrella");
  await pane().getByText("No function has all of these words.").waitFor();
  await search.fill("");
  assert.equal(await pane().locator(".wl-entry").count(), all);
});

test("a card states purpose, arguments with units, result, range, source and example, and the cautions stay in view", async () => {
  await pane().getByRole("button", { name: /^THWAITES_MARCH/ }).click();
  const card = pane().getByRole("article", { name: "THWAITES_MARCH" });
  const words = await card.innerText();
  for (const part of ["WALL.THWAITES_MARCH(x, ue, nu", "Gives", "Valid range and error", "Source", "Thwaites", "Example", "gives"]) assert.ok(words.includes(part), `the card says ${part}`);
  assert.match(words, /ue\s*\[speed\]/);
  await pane().getByText("Airworthiness, pressure equipment").waitFor();
  assert.deepEqual(await violations(), []);
  await page.screenshot({ path: path.join(OUTPUT, "pane-card.png") });
});

test("the worked example is inserted by mouse at the selected cell, computes at once, and one undo takes it away", async () => {
  await pane().getByRole("button", { name: "‹ All functions" }).click();
  await select(FREE.col, FREE.row);
  await pane().getByRole("button", { name: /^THWAITES_MARCH/ }).click();
  await pane().getByText("Filled with a worked example").waitFor();
  assert.equal(await pane().getByLabel("into cell").inputValue(), "O41");
  await pane().getByRole("button", { name: "Insert", exact: true }).click();
  await status().getByText("THWAITES_MARCH stands in O41.").waitFor();
  assert.equal((await cells(page, FREE.col, FREE.row, FREE.col, FREE.row))[0]![0], "station x");
  await pane().getByRole("region", { name: "Selected cell" }).getByText("O41").waitFor();
  await page.evaluate(() => globalThis.wallsheetBench!.model.dispatch("REQUEST_UNDO"));
  assert.equal((await cells(page, FREE.col, FREE.row, FREE.col, FREE.row))[0]![0], null);
});

test("selected columns go into the first arguments; what is missing is asked for; filled cells are never overwritten", async () => {
  await pane().getByRole("button", { name: "‹ All functions" }).click();
  await select(0, 17, 1, 32);
  await pane().getByRole("button", { name: /^THWAITES_MARCH/ }).click();
  await pane().getByText("Filled from the selected columns").waitFor();
  assert.equal(await pane().getByLabel(/^x\b/).inputValue(), "A19:A33");
  assert.equal(await pane().getByLabel(/^ue\b/).inputValue(), "B19:B33");
  assert.equal(await pane().getByLabel(/^nu\b/).inputValue(), "");
  await pane().getByRole("button", { name: "Insert", exact: true }).click();
  await status().getByText("nu is still empty").waitFor();
  assert.match(await focusedName(), /^nu/);
  await pane().getByLabel(/^nu\b/).fill("B6");
  const place = pane().getByLabel("into cell");
  await place.fill("A1");
  await pane().getByRole("button", { name: "Insert", exact: true }).click();
  await status().getByText("A1 is not empty: choose an empty cell.").waitFor();
  await place.fill("here");
  await pane().getByRole("button", { name: "Insert", exact: true }).click();
  await status().getByText('"here" is not a cell: write one such as F4.').waitFor();
  await place.fill("o41");
  await pane().getByRole("button", { name: "Insert", exact: true }).click();
  await status().getByText("THWAITES_MARCH stands in O41.").waitFor();
  // The same march as the book's own: θ of the last station.
  const [[own]] = (await cells(page, 5, 32, 5, 32)) as [[number]];
  const inserted = await cells(page, 14, 40, 20, 55);
  assert.ok(inserted.at(-1)!.includes(own!), `${own} is among ${inserted.at(-1)}`);
  await page.evaluate(() => globalThis.wallsheetBench!.model.dispatch("REQUEST_UNDO"));
});

test("an inserted formula that cannot compute shows its sentence in words", async () => {
  await pane().getByLabel(/^nu\b/).fill("-1");
  await pane().getByLabel("into cell").fill("O41");
  await pane().getByRole("button", { name: "Insert", exact: true }).click();
  await status().getByText(/^O41 shows #VALUE!: THWAITES_MARCH needs nu/).waitFor();
  await page.screenshot({ path: path.join(OUTPUT, "pane-error.png") });
  await page.evaluate(() => globalThis.wallsheetBench!.model.dispatch("REQUEST_UNDO"));
});

test("everything works by keyboard alone: search, open, fill, insert, back", async () => {
  await pane().getByRole("button", { name: "‹ All functions" }).click();
  await select(FREE.col, FREE.row);
  await pane().getByRole("searchbox").focus();
  await page.keyboard.type("blow velocity");
  await page.keyboard.press("ArrowDown");
  assert.match(await focusedName(), /^WALL_BLOW_VELOCITY/);
  await page.keyboard.press("ArrowUp");
  assert.match(await focusedName(), /^Find a function/);
  await page.keyboard.press("Enter");
  assert.equal(await focusedName(), "WALL_BLOW_VELOCITY");
  await pane().getByText("Filled with a worked example").waitFor();
  const visited: string[] = [];
  for (let i = 0; i < 30 && !visited.includes("Insert"); i++) {
    await page.keyboard.press("Tab");
    visited.push(await focusedName());
  }
  assert.equal(visited.at(-1), "Insert", visited.join(" | "));
  await page.keyboard.press("Enter");
  await status().getByText("WALL_BLOW_VELOCITY stands in O41.").waitFor();
  assert.equal(typeof (await cells(page, FREE.col, FREE.row, FREE.col, FREE.row))[0]![0], "number");
  await page.keyboard.press("Escape");
  assert.match(await focusedName(), /^WALL_BLOW_VELOCITY/, "back on the list, focus on the function it came from");
  await page.evaluate(() => globalThis.wallsheetBench!.model.dispatch("REQUEST_UNDO"));
});

test("Tab visits every control of a card in reading order, and the focus is always to be seen", async () => {
  await pane().getByRole("searchbox").fill("");
  await pane().getByRole("button", { name: /^THWAITES_MARCH/ }).click();
  await pane().getByRole("region", { name: "Preview" }).waitFor(); // the worked example's own
  const expected = await pane().locator(".wl-card button, .wl-card input, .wl-card a, .wl-card .wl-preview").count();
  const marks = new Set<string>();
  let lastTop = -1;
  for (let i = 0; i < expected; i++) {
    await page.keyboard.press("Tab");
    const seen = await page.evaluate(() => {
      const control = document.activeElement as HTMLElement;
      const style = getComputedStyle(control);
      const box = control.getBoundingClientRect();
      const body = document.querySelector(".wl-body")!;
      return { inCard: control.closest(".wl-card") !== null, outline: style.outlineStyle !== "none" && parseFloat(style.outlineWidth) >= 2, key: control.id || control.getAttribute("aria-label") || control.textContent || "", top: box.top + body.scrollTop, height: box.height, inView: box.bottom > 0 && box.top < innerHeight };
    });
    // The title takes the focus first when a card opens; "back" stands before it, so it is reached from the other side.
    assert.ok(seen.inCard || i === expected - 1, `${seen.key} is in the card`);
    if (!seen.inCard) break;
    assert.ok(seen.outline, `${seen.key} shows its focus`);
    assert.ok(seen.inView, `${seen.key} is in view when focused`);
    assert.ok(seen.height >= 24, `${seen.key} is ${seen.height} px high`);
    assert.ok(seen.top >= lastTop - 40, `${seen.key} follows the reading order`);
    lastTop = seen.top;
    marks.add(seen.key);
  }
  assert.equal(marks.size, expected - 1, [...marks].join(" | "));
  await pane().getByRole("article").locator("h2").focus();
  await page.keyboard.press("Shift+Tab");
  assert.equal(await focusedName(), "‹ All functions");
});

test("the list has no accessibility violations either, light and dark", async () => {
  await page.keyboard.press("Enter");
  await pane().getByRole("searchbox").waitFor();
  assert.deepEqual(await violations(), []);
  await page.emulateMedia({ colorScheme: "dark" });
  assert.deepEqual(await violations(), []);
  await pane().getByRole("button", { name: /^THWAITES_MARCH/ }).click();
  assert.deepEqual(await violations(), []);
  await page.screenshot({ path: path.join(OUTPUT, "pane-dark.png") });
  await page.emulateMedia({ colorScheme: "light", forcedColors: "active" });
  await page.screenshot({ path: path.join(OUTPUT, "pane-forced-colors.png") });
  await page.emulateMedia({ colorScheme: "light", forcedColors: "none" });
});

test("at 320 px nothing is cut off or scrolls sideways", async () => {
  await page.setViewportSize({ width: 320, height: 1100 });
  for (const view of ["card", "list"]) {
    if (view === "list") await pane().getByRole("button", { name: "‹ All functions" }).click();
    const wide = await page.evaluate(() =>
      // A table of data may scroll inside a box of its own; the box itself must fit.
      [...document.querySelectorAll<HTMLElement>("#pane *")].filter((e) => !e.matches(".wl-preview *") && (!e.matches(".wl-preview") || e.getBoundingClientRect().right > innerWidth + 0.5)).filter((e) => e.getBoundingClientRect().right > innerWidth + 0.5 || (e.scrollWidth > e.clientWidth + 1 && !e.matches(".wl-preview"))).filter((e) => e.clientWidth > 0 && !(e instanceof HTMLInputElement)).map((e) => `${e.tagName}.${e.className}`),
    );
    assert.deepEqual(wide, [], view);
    await page.screenshot({ path: path.join(OUTPUT, `pane-320-${view}.png`) });
  }
  await page.setViewportSize({ width: 1280, height: 720 });
});

test("a cell that holds markup is shown as text", async () => {
  await select(FREE.col, FREE.row);
  await page.evaluate(([col, row]) => {
    const { model } = globalThis.wallsheetBench!;
    model.dispatch("UPDATE_CELL", { sheetId: model.getters.getActiveSheetId(), col, row, content: "<img src=x onerror=alert(1)><b>θ</b>" });
  }, [FREE.col, FREE.row] as const);
  await pane().getByText("<img src=x onerror=alert(1)><b>θ</b>").waitFor();
  assert.equal(await page.locator("#pane img, #pane b").count(), 0);
  await page.evaluate(() => globalThis.wallsheetBench!.model.dispatch("REQUEST_UNDO"));
});

test("no request went to any other host, nothing failed, and the console is quiet", () => {
  assert.deepEqual(bench.elsewhere, []);
  assert.deepEqual(bench.troubles, []);
});

// The pane's Look page in the real bench: charts of the starter book's march, read by pointer and keyboard, saved and copied.
import assert from "node:assert/strict";
import { readFileSync, writeFileSync } from "node:fs";
import { createRequire } from "node:module";
import path from "node:path";
import { after, before, test } from "node:test";
import type { Browser, Page } from "playwright-core";
import { cells, openBench, OUTPUT, startServer, type BenchPage, type BenchServer } from "./bench-page.mjs";
import { launch } from "./chromium.mjs";

const AXE = readFileSync(createRequire(import.meta.url).resolve("axe-core/axe.min.js"), "utf8");
/** The march of the starter book: D18 spills nine columns over a heading row and 15 stations. */
const MARCH = { col: 3, row: 17, rows: 15 };

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

const pane = () => page.getByRole("region", { name: "Functions", exact: true });
const status = () => pane().getByRole("status");
const slider = () => pane().getByRole("slider", { name: "Station" });
const said = async () => ((await slider().getAttribute("aria-valuetext")) ?? "").replaceAll("\u00a0", " ");
const select = (col: number, row: number) =>
  page.evaluate(([c, r]) => globalThis.wallsheetBench!.model.selection.selectZone({ cell: { col: c!, row: r! }, zone: { left: c!, top: r!, right: c!, bottom: r! } }), [col, row]);
const write = (col: number, row: number, content: string) =>
  page.evaluate(([c, r, text]) => {
    const { model } = globalThis.wallsheetBench!;
    model.dispatch("UPDATE_CELL", { sheetId: model.getters.getActiveSheetId(), col: c, row: r, content: text });
  }, [col, row, content] as const);

async function violations(): Promise<string[]> {
  await page.evaluate(AXE);
  return page.evaluate(async () => {
    const { axe } = globalThis as unknown as { axe: { run(root: object, options: object): Promise<{ violations: { id: string; nodes: { html: string; failureSummary: string }[] }[] }> } };
    const found = await axe.run({ include: ["#pane"] }, { resultTypes: ["violations"] });
    return found.violations.flatMap((v) => v.nodes.map((n) => `${v.id}: ${n.html} ${n.failureSummary}`));
  });
}
async function picture(name: string): Promise<void> {
  await page.screenshot({ path: path.join(OUTPUT, `look-${name}.png`) });
}

test("without a table selected the page offers the book's tables, and one click looks at one", async () => {
  await pane().getByRole("button", { name: "Look", exact: true }).click();
  assert.equal(await pane().getByRole("button", { name: "Look", exact: true }).getAttribute("aria-current"), "page");
  await pane().getByText("Select a cell of a WALL table, or choose one of this book:").waitFor();
  await picture("start");
  assert.deepEqual(await violations(), []);
  await pane().getByRole("button", { name: /^THWAITES_MARCH 'Wing section'!D18/ }).click();
  await pane().getByText(/^15 rows \(laminar 15\), station x from 0 to 0\.385\sm\./).waitFor();
});

test("the march is drawn with the sheet's own units, its charts named and told in words", async () => {
  assert.deepEqual(
    await pane().getByRole("img").evaluateAll((all) => all.map((svg) => svg.querySelector("title")!.textContent)),
    ["edge speed ue over station x", "momentum loss θ and defect thickness δ* over station x", "shape factor H over station x", "wall friction cf over station x", "mass defect m over station x"],
  );
  const drawn = await pane().locator("svg.wall-chart").allTextContents();
  for (const words of ["thickness [m]", "mass defect m [m²/s]", "edge speed ue [m/s]", "station x [m]"]) assert.ok(drawn.some((text) => text.includes(words)), words);
  // Every station of the table has its place on the line: 15 rows, no blank.
  const described = (await pane().locator("svg.wall-chart desc").nth(1).textContent())!.replaceAll("\u00a0", " ");
  const table = await cells(page, MARCH.col, MARCH.row + 1, MARCH.col + 8, MARCH.row + MARCH.rows);
  const last = (table.at(-1)![2] as number).toPrecision(4).replace(/0+$/, "");
  assert.ok(described.startsWith("Momentum loss θ: first"), described);
  assert.ok(described.includes(`last ${Number(last)} m at station x 0.385 m`), described);
  await picture("march");
  assert.deepEqual(await violations(), []);
});

test("values are read by arrow keys, Home and End, and spoken as the slider's value", async () => {
  await slider().focus();
  await page.keyboard.press("End");
  assert.match(await said(), /^station x 0\.385 m, row 15 of 15, laminar: edge speed ue 27\.28 m\/s; momentum loss θ 0\.000\d+ m; defect thickness δ\* 0\.00\d+ m; shape factor H \d\.\d+; /);
  await page.keyboard.press("ArrowLeft");
  await page.keyboard.press("ArrowLeft");
  assert.match(await said(), /^station x 0\.305 m, row 13 of 15/);
  const [[theta]] = (await cells(page, MARCH.col + 2, MARCH.row + 13, MARCH.col + 2, MARCH.row + 13)) as [[number]];
  await pane().getByText(`momentum loss θ ${Number(theta.toPrecision(4))} m`, { exact: true }).waitFor();
  await page.keyboard.press("Home");
  assert.match(await said(), /^station x 0 m, row 1 of 15/);
});

test("the pointer over a chart reads the nearest station", async () => {
  const chart = pane().getByRole("img").first();
  await chart.scrollIntoViewIfNeeded();
  const box = (await chart.boundingBox())!;
  await page.mouse.move(box.x + box.width - 14, box.y + box.height / 2);
  assert.match(await said(), /^station x 0\.385 m, row 15/);
  await page.mouse.move(box.x + box.width / 2 + 20, box.y + box.height / 2);
  assert.match(await said(), /^station x 0\.(185|225) m/);
  assert.ok((await pane().locator(".wl-cursor path").count()) >= 5);
});

test("one chart alone, log axes in plain numbers, its summary said", async () => {
  await pane().getByLabel("Show").selectOption({ label: "momentum loss θ, defect thickness δ*" });
  assert.equal(await pane().getByRole("img").count(), 1);
  await pane().getByRole("listitem").filter({ hasText: /^Momentum loss θ: first .*Defect thickness δ\*: first/ }).waitFor();
  await pane().getByLabel("log stations").check();
  await pane().getByLabel("log values").check();
  const marks = await pane().locator("svg.wall-chart text.wc-soft").allTextContents();
  assert.ok(marks.includes("0.0001") && marks.includes("0.1"), marks.join(" "));
  assert.ok(!marks.some((m) => /e/i.test(m) && m !== "station x [m]"), marks.join(" "));
  assert.match((await pane().locator("svg.wall-chart desc").textContent())!, /1 of 0 or less not drawn on the log axis/);
  await picture("log");
  await pane().getByLabel("log stations").uncheck();
  await pane().getByLabel("log values").uncheck();
});

test("the table is saved as CSV with full digits, the charts as SVG and PNG", async () => {
  const save = async (name: string) => {
    const [download] = await Promise.all([page.waitForEvent("download"), pane().getByRole("button", { name }).click()]);
    await status().getByText("is handed to the browser").waitFor();
    return { name: download.suggestedFilename(), content: readFileSync(await download.path()) };
  };
  const csv = await save("Save CSV");
  assert.equal(csv.name, "thwaites-march-D18.csv");
  const lines = csv.content.toString("utf8").split("\r\n");
  assert.equal(lines[0], "station x [m],edge speed ue [m/s],momentum loss θ [m],defect thickness δ* [m],shape factor H,wall friction cf,mass defect m [m²/s],state,note");
  const table = await cells(page, MARCH.col, MARCH.row + 1, MARCH.col + 8, MARCH.row + MARCH.rows);
  lines.slice(1, 16).forEach((line, i) => assert.deepEqual(line.split(",").slice(0, 7).map((v) => (v === "" ? "" : Number(v))), table[i]!.slice(0, 7)));
  assert.equal(lines.length, 17);
  const svg = (await save("Save SVG")).content.toString("utf8");
  assert.match(svg, /^<svg xmlns="http:\/\/www\.w3\.org\/2000\/svg"/);
  writeFileSync(path.join(OUTPUT, "look-saved.svg"), svg);
  const png = (await save("Save PNG")).content;
  assert.equal(png.subarray(1, 4).toString("latin1"), "PNG");
  assert.equal(png.readUInt32BE(16), 1440, "twice as sharp as its 720 px");
  writeFileSync(path.join(OUTPUT, "look-saved.png"), png);
  // The SVG is a picture on its own, in a page without our styles.
  const alone = await browser.newPage();
  await alone.setContent(`<body style="margin:0">${svg}</body>`);
  assert.ok((await alone.locator("svg svg").first().boundingBox())!.height > 200);
  await alone.close();
});

test("where copying is refused the text stands selected in the page; where it is allowed it is copied", async () => {
  await pane().getByRole("button", { name: "Copy CSV" }).click();
  const field = pane().getByLabel("The CSV as text");
  await field.waitFor();
  assert.match(await status().innerText(), /Copying was refused .* press Ctrl\+C/s);
  assert.equal(await page.evaluate(() => (document.activeElement as HTMLTextAreaElement).selectionEnd), (await field.inputValue()).length);
  await page.context().grantPermissions(["clipboard-read", "clipboard-write"]);
  await pane().getByRole("button", { name: "Copy CSV" }).click();
  await status().getByText("The CSV is copied.").waitFor();
  assert.match(await page.evaluate(() => navigator.clipboard.readText()), /^station x \[m\],/);
  assert.equal(await field.count(), 0);
  await pane().getByRole("button", { name: "Copy PNG" }).click();
  await status().getByText("The PNG is copied.").waitFor();
});

test("the table stays while an input is changed, and separation is marked where the march's note tells it", async () => {
  await pane().getByLabel("Show").selectOption({ index: 0 });
  await select(1, 32);
  for (const [row, ue] of [[29, 27], [30, 25.5], [31, 23.5], [32, 21]] as const) await write(1, row, String(ue));
  await pane().getByText(/Marked: laminar separation 0\.\d+\./).waitFor();
  const note = (await cells(page, MARCH.col + 8, MARCH.row + 1, MARCH.col + 8, MARCH.row + MARCH.rows)).flat().find((n) => /separation at x/.test(String(n))) as string;
  const x = Number(/at x = ([\d.]+),/.exec(note)![1]);
  await pane().getByRole("region", { name: "Notes of the table" }).getByText(`Row 12 (station x 0.265 m): ${note}`).waitFor();
  const words = `laminar separation ${Number(x.toPrecision(4))}`;
  assert.equal(await pane().locator("svg.wall-chart text", { hasText: words }).count(), 5, words);
  await slider().focus();
  await page.keyboard.press("End");
  assert.match(await said(), /row 15 of 15, separated: edge speed ue 21 m\/s; .*shape factor H blank/);
  await picture("separation");
  assert.deepEqual(await violations(), []);
});

test("dark, forced colours and print keep every line and word to be seen", async () => {
  await page.setViewportSize({ width: 1280, height: 1400 });
  await page.emulateMedia({ colorScheme: "dark" });
  await page.waitForTimeout(300); // the buttons' grounds fade over
  assert.deepEqual(await violations(), []);
  await picture("dark");
  const dark = await pane().locator(".wall-chart .wc-s0 .wc-line").first().evaluate((line) => getComputedStyle(line).stroke);
  await page.emulateMedia({ colorScheme: "light", forcedColors: "active" });
  await picture("forced-colors");
  const forced = await pane().locator(".wall-chart .wc-s0 .wc-line").first().evaluate((line) => [getComputedStyle(line).stroke, getComputedStyle(document.querySelector(".wl-pane")!).color]);
  assert.equal(forced[0], forced[1], "lines take the system's text colour");
  await page.emulateMedia({ colorScheme: "light", forcedColors: "none" });
  const light = await pane().locator(".wall-chart .wc-s0 .wc-line").first().evaluate((line) => getComputedStyle(line).stroke);
  assert.notEqual(dark, light);
  await picture("light");
  await page.setViewportSize({ width: 1280, height: 720 });
});

test("an error is told in words, a list of results is not drawn, and a bare column is", async () => {
  await write(14, 40, "=WALL.THWAITES_MARCH(A19:A33,B19:B33,-1)");
  await select(14, 40);
  await pane().locator(".wl-headline").getByText(/^#VALUE!: THWAITES_MARCH needs nu/).waitFor();
  assert.equal(await pane().locator(".wl-look h2").innerText(), "THWAITES_MARCH in O41");
  assert.equal(await pane().getByRole("img").count(), 0);
  await write(14, 40, "=WALL.SIMILAR_LAYER(0)");
  await pane().getByText("A value or a list of results: there are no columns to draw.").waitFor();
  await write(14, 40, "=WALL.EDGE_SPEED(B19:B33/100,22)");
  await pane().getByRole("heading", { name: "EDGE_SPEED in O41" }).waitFor();
  await write(14, 40, "=WALL.GRADIENT_OF(A19:A33,B19:B33)");
  await pane().getByRole("heading", { name: "GRADIENT_OF in O41" }).waitFor();
  await pane().getByText(/^15 rows, station x from 0 to 0\.385\./).waitFor();
  await write(14, 40, "");
  // The book's own column of blow velocities, made of two functions and a filter that drops nothing once the wall is attached again.
  await page.evaluate(() => {
    for (let i = 0; i < 12; i++) globalThis.wallsheetBench!.model.dispatch("REQUEST_UNDO");
  });
  await select(13, 20);
  await pane().getByRole("heading", { name: "COLUMN_OF and WALL_BLOW_VELOCITY in N19" }).waitFor();
  assert.equal(await pane().getByRole("img").first().locator("title").textContent(), "blow velocity dm/dx over station x");
  await pane().getByRole("button", { name: "About WALL_BLOW_VELOCITY" }).click();
  await pane().getByRole("article", { name: "WALL_BLOW_VELOCITY" }).waitFor();
  await pane().getByRole("button", { name: "Look", exact: true }).click();
  await pane().getByRole("heading", { name: "COLUMN_OF and WALL_BLOW_VELOCITY in N19" }).waitFor();
});

test("onset, bubble and separation of a whole layer are marked, its warnings stand above the charts, and their words keep apart", async () => {
  for (const [formula, marked, warned] of [
    ["=WALL.LAYER_MARCH(A19:A33,B19:B33,0.000001)", /Marked: .*onset 0\.\d+/, undefined],
    ["=WALL.LAYER_MARCH({0;0.1;0.2;0.3;0.4;0.5;0.6;0.8;1},{10;10;10;9.6;9.2;8.9;8.7;8.5;8.4},0.00001)", /Marked: laminar separation 0\.\d+; reattachment 0\.\d+; onset 0\.\d+/, /Warning: bubble/],
  ] as const) {
    await write(14, 40, formula);
    await select(14, 40);
    await pane().locator(".wl-headline").getByText(marked).waitFor();
    assert.equal(await pane().locator(".wl-look > div[aria-live] .wl-warning").filter({ hasText: warned ?? /./ }).count(), warned ? 1 : 0);
    await picture(warned ? "bubble" : "onset");
    assert.deepEqual(await wordFaults(), []);
    assert.deepEqual(await violations(), []);
  }
  await write(14, 40, "");
});

test("every control is reached by Tab in reading order, with its focus to be seen", async () => {
  await select(MARCH.col, MARCH.row);
  await pane().getByRole("heading", { name: "THWAITES_MARCH in D18" }).waitFor();
  await pane().getByRole("button", { name: "Look", exact: true }).focus();
  const visited: string[] = [];
  for (let i = 0; i < 30 && visited.at(-1) !== "About THWAITES_MARCH"; i++) {
    await page.keyboard.press("Tab");
    const seen = await page.evaluate(() => {
      const control = document.activeElement as HTMLElement;
      const style = getComputedStyle(control);
      const box = control.getBoundingClientRect();
      const label = (control as HTMLInputElement).labels?.[0]?.textContent ?? control.getAttribute("aria-label") ?? control.textContent ?? "";
      return { label: label.trim(), outline: style.outlineStyle !== "none" && parseFloat(style.outlineWidth) >= 2, inView: box.bottom > 0 && box.top < innerHeight };
    });
    assert.ok(seen.outline && seen.inView, `${seen.label} shows its focus`);
    visited.push(seen.label);
  }
  const controls = ["Show", "log stations", "log values", "Station", "The charts in words", "The table", "Save CSV", "Save SVG", "Save PNG", "Copy CSV", "Copy SVG", "Copy PNG", "About THWAITES_MARCH"];
  assert.deepEqual(visited.filter((label) => controls.includes(label)), controls, visited.join(" | "));
  await pane().getByText("The table", { exact: true }).focus();
  await page.keyboard.press("Enter");
  assert.equal(await pane().getByRole("region", { name: "Values of the table" }).getByRole("row").count(), MARCH.rows + 1);
  assert.deepEqual(await violations(), []);
});

test("at 320 px and at twice the zoom nothing is cut off or scrolls sideways", async () => {
  for (const [width, height] of [[320, 1100], [640, 360]] as const) {
    await page.setViewportSize({ width, height });
    await page.waitForTimeout(200);
    const wide = await page.evaluate(() =>
      [...document.querySelectorAll<Element>("#pane *")].filter((e) => e.closest(".wl-values") === null && e.closest("svg svg, g, text") === null && (e.getBoundingClientRect().right > innerWidth + 0.5 || e.scrollWidth > e.clientWidth + 1) && e.clientWidth > 0 && !(e instanceof HTMLInputElement)).map((e) => `${e.tagName}.${e.getAttribute("class")}`),
    );
    assert.deepEqual(wide, [], `${width} px`);
    await picture(`${width}`);
  }
  await page.setViewportSize({ width: 1280, height: 720 });
});

function wordFaults(): Promise<string[]> {
  return page.evaluate(() =>
    [...document.querySelectorAll(".wall-chart")].flatMap((chart) => {
      const frame = chart.getBoundingClientRect();
      const words = [...chart.querySelectorAll("text")].map((t) => ({ text: t.textContent, box: t.getBoundingClientRect() }));
      const outside = words.filter(({ box }) => box.left < frame.left - 1 || box.right > frame.right + 1 || box.top < frame.top - 1 || box.bottom > frame.bottom + 1).map((w) => `outside: ${w.text}`);
      const over = words.flatMap((a, i) => words.slice(i + 1).filter((b) => a.box.left < b.box.right - 1 && b.box.left < a.box.right - 1 && a.box.top < b.box.bottom - 3 && b.box.top < a.box.bottom - 3).map((b) => `over: ${a.text} / ${b.text}`));
      return [...outside, ...over];
    }),
  );
}

test("words stand inside every chart and no two words of a chart overlap", async () => {
  assert.deepEqual(await wordFaults(), []);
});

test("no request went to any other host, nothing failed, and the console is quiet", () => {
  assert.deepEqual(bench.elsewhere, []);
  assert.deepEqual(bench.troubles, []);
});

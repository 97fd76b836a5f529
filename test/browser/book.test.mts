import assert from "node:assert/strict";
import { execFileSync, spawnSync } from "node:child_process";
import { copyFileSync, readFileSync } from "node:fs";
import path from "node:path";
import { after, before, test } from "node:test";
import ExcelJS from "exceljs";
import type { Browser } from "playwright-core";
import { DIST, openBench, OUTPUT, startServer, TOP, type BenchPage, type BenchServer } from "./bench-page.mjs";
import { launch } from "./chromium.mjs";

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

const bar = () => bench.page.getByRole("banner");

/** Presses a button of the bar and keeps the file it gives. */
async function download(words: string, name: string): Promise<string> {
  const [given] = await Promise.all([bench.page.waitForEvent("download"), bar().getByRole("button", { name: words, exact: true }).click()]);
  const file = path.join(OUTPUT, name);
  await given.saveAs(file);
  return file;
}

/** Changes a cell of the shown book as an edit does. */
const edit = (sheetId: string, col: number, row: number, content: string) =>
  bench.page.evaluate(([s, c, r, text]) => void globalThis.wallsheetBench!.model.dispatch("UPDATE_CELL", { sheetId: s, col: c, row: r, content: text }), [sheetId, col, row, content] as const);

const valueAt = (sheet: string, col: number, row: number) =>
  bench.page.evaluate(
    ([name, c, r]) => {
      const { getters } = globalThis.wallsheetBench!.model;
      const sheetId = getters.getSheetIds().find((id) => getters.getSheetName(id) === name)!;
      return getters.getEvaluatedCell({ sheetId, col: c, row: r }).value;
    },
    [sheet, col, row] as const,
  );

const recalc = (...args: string[]) => execFileSync(process.execPath, [path.join(DIST, "wallsheet.js"), "recalc", ...args], { encoding: "utf8", stdio: ["ignore", "pipe", "pipe"] });

test("the starter book is saved as a workbook whose stored values are those a recalculation gives", async () => {
  const file = await download("Save", "saved-starter.xlsx");
  const book = new ExcelJS.Workbook();
  await book.xlsx.readFile(file);
  assert.deepEqual(book.worksheets.map((s) => s.name), ["Wing section", "Three marches", "Glider drag", "Hull plate"]);
  const glider = book.getWorksheet("Glider drag")!;
  assert.ok(Math.abs(Number(glider.getCell("D22").result) - 0.0068) < 5e-4, String(glider.getCell("D22").result));
  // A spilled cell holds its value for readers without the add-in.
  assert.equal(typeof book.getWorksheet("Wing section")!.getCell("F25").value, "number");
  assert.equal(book.getWorksheet("Wing section")!.getCell("B6").numFmt, "0.00E+00");
  const again = path.join(OUTPUT, "saved-starter-again.xlsx");
  recalc(file, "-o", again, "-q");
  const [a, b] = [new ExcelJS.Workbook(), new ExcelJS.Workbook()];
  await a.xlsx.readFile(file);
  await b.xlsx.readFile(again);
  for (const sheet of a.worksheets) {
    sheet.eachRow((row) =>
      row.eachCell((cell) => {
        const other = b.getWorksheet(sheet.name)!.getCell(cell.address);
        const plain = (c: ExcelJS.Cell) => (c.formula === undefined ? c.value : c.result);
        const [one, two] = [plain(cell), plain(other)];
        // The browser's exp and pow may differ from Node's in the last digit, and a march's step choice with it.
        if (typeof one === "number" && typeof two === "number") assert.ok(Math.abs(one - two) <= 1e-8 * Math.abs(one), `${sheet.name}!${cell.address}: ${one} and ${two}`);
      }),
    );
  }
});

test("the audit of the saved book finds every WALL cell calculated", () => {
  const ran = spawnSync(process.execPath, [path.join(DIST, "wallsheet.js"), "audit", path.join(OUTPUT, "saved-starter.xlsx"), "--format", "json", "-q"], { encoding: "utf8" });
  assert.equal(ran.status, 1); // the glider's bubble is a finding
  const cells = JSON.parse(ran.stdout) as { state: string; cell: string }[];
  assert.ok(cells.length >= 29, String(cells.length));
  assert.deepEqual(cells.filter((c) => c.state !== "calculated"), []);
});

test("a saved book opens again with the same formulas and numbers", async () => {
  const before = [await valueAt("Glider drag", 3, 21), await valueAt("Hull plate", 1, 14), await valueAt("Wing section", 13, 20)];
  await bar().locator("input[type=file]").setInputFiles(path.join(OUTPUT, "saved-starter.xlsx"));
  await bench.page.getByText("saved-starter.xlsx is open.").waitFor();
  const after = [await valueAt("Glider drag", 3, 21), await valueAt("Hull plate", 1, 14), await valueAt("Wing section", 13, 20)];
  assert.deepEqual(after, before);
  assert.match(String(await bench.page.evaluate(() => {
    const { getters } = globalThis.wallsheetBench!.model;
    return getters.getCell({ sheetId: getters.getSheetIds()[0]!, col: 3, row: 17 })?.compiledFormula?.toFormulaString(getters);
  })), /^=WALL\.THWAITES_MARCH\(A19:A33,B19:B33,B6,A9:B10\)$/);
});

test("a workbook of another program opens, computes, and what cannot be kept is said", async () => {
  await bar().locator("input[type=file]").setInputFiles(path.join(TOP, "test/references/third-party-book.xlsx"));
  await bench.page.getByRole("status").filter({ hasText: "third-party-book.xlsx is open." }).waitFor();
  assert.match(await bench.page.locator("#notice").innerText(), /When it is saved here it will be without: .*Keep the original\./);
  const errors = await bench.page.evaluate(() => {
    const { getters } = globalThis.wallsheetBench!.model;
    const found: string[] = [];
    for (const id of getters.getSheetIds()) {
      for (const cell of getters.getCells(id)) {
        const at = getters.getCellPosition(cell.id);
        const value = getters.getEvaluatedCell(at);
        if (cell.isFormula && value.type === "error" && /WALL\./.test(cell.content)) found.push(`${getters.getSheetName(id)} ${at.col},${at.row} ${cell.content} ${value.message}`);
      }
    }
    return found;
  });
  assert.deepEqual(errors, []);
});

test("a plain copy holds values in place of WALL cells and tells how they came about", async () => {
  await bar().getByRole("button", { name: "Starter book" }).click();
  await bar().getByText("starter.xlsx").waitFor();
  const file = await download("Plain copy", "starter-plain.xlsx");
  const book = new ExcelJS.Workbook();
  await book.xlsx.readFile(file);
  const notes = book.getWorksheet("method notes")!;
  assert.ok(notes.rowCount > 20);
  book.eachSheet((sheet) => sheet.eachRow((row) => row.eachCell((cell) => assert.ok(!/WALL/.test(cell.formula ?? ""), `${sheet.name}!${cell.address}`))));
  assert.ok(Math.abs(Number(book.getWorksheet("Hull plate")!.getCell("B17").result) - 1) < 0.12);
});

test("changes are marked, kept in the browser over a reload, and asked about before another book takes their place", async () => {
  await edit("glider", 1, 5, "25");
  await bar().getByText("starter.xlsx (changed)").waitFor();
  await bench.page.waitForTimeout(1900);
  await bench.page.reload();
  await bench.page.waitForFunction(() => globalThis.wallsheetBench !== undefined);
  await bar().getByText("starter.xlsx (changed)").waitFor();
  assert.equal(await valueAt("Glider drag", 1, 5), 25);
  await bar().getByRole("button", { name: "Starter book" }).click();
  const dialog = bench.page.getByRole("dialog");
  await dialog.getByText("starter.xlsx has changes that no file holds. Go on without them?").waitFor();
  await dialog.getByRole("button", { name: "Cancel" }).click();
  assert.equal(await valueAt("Glider drag", 1, 5), 25);
  await bar().getByRole("button", { name: "Starter book" }).click();
  await bench.page.getByRole("dialog").getByRole("button", { name: "OK" }).click();
  await bar().getByText("starter.xlsx", { exact: true }).waitFor();
  assert.equal(await valueAt("Glider drag", 1, 5), 22);
});

test("a file that is no workbook is refused with the reason, and the book stays", async () => {
  const file = path.join(OUTPUT, "no-book.xlsx");
  copyFileSync(path.join(TOP, "LICENSE"), file);
  await bar().locator("input[type=file]").setInputFiles(file);
  const dialog = bench.page.getByRole("dialog");
  await dialog.getByText("no-book.xlsx could not be opened. The file is not an .xlsx book: it is not a zip package.").waitFor();
  await dialog.getByRole("button", { name: "OK" }).click();
  assert.equal(await valueAt("Glider drag", 1, 5), 22);
});

test("a file dropped on the page is opened", async () => {
  const bytes = readFileSync(path.join(OUTPUT, "saved-starter.xlsx")).toString("base64");
  const transfer = await bench.page.evaluateHandle((text) => {
    const data = new DataTransfer();
    data.items.add(new File([Uint8Array.from(atob(text), (c) => c.charCodeAt(0))], "dropped.xlsx"));
    return data;
  }, bytes);
  await bench.page.dispatchEvent("body", "drop", { dataTransfer: transfer });
  await bar().getByText("dropped.xlsx").waitFor();
});

test("an empty book can be begun and computes", async () => {
  await bar().getByRole("button", { name: "Empty book" }).click();
  await bar().getByText("book.xlsx", { exact: true }).waitFor();
  const sheet = await bench.page.evaluate(() => globalThis.wallsheetBench!.model.getters.getSheetIds()[0]!);
  await edit(sheet, 0, 0, "=WALL.EDGE_SPEED(0,10)");
  assert.equal(await bench.page.evaluate((sheetId) => globalThis.wallsheetBench!.model.getters.getEvaluatedCell({ sheetId, col: 0, row: 0 }).value, sheet), 10);
});

test("no request went to any other host, and the console is quiet", () => {
  assert.deepEqual(bench.elsewhere, []);
  assert.deepEqual(bench.troubles, []);
});

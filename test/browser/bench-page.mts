// The built bench served by its own server on a free port, and a page of it in which every request and every message is noted.
import { spawn, type ChildProcess } from "node:child_process";
import { mkdirSync } from "node:fs";
import path from "node:path";
import { fileURLToPath } from "node:url";
import type { Browser, BrowserContextOptions, Page } from "playwright-core";

export const TOP = fileURLToPath(new URL("../..", import.meta.url));
/** Built by `npm run build`. */
export const DIST = process.env.WALLSHEET_DIST ?? path.join(TOP, "dist");
export const OUTPUT = path.join(TOP, "test/output");
mkdirSync(OUTPUT, { recursive: true });

export interface BenchServer {
  readonly address: string;
  readonly process: ChildProcess;
  stop(): Promise<number | null>;
}

export function startServer(...args: string[]): Promise<BenchServer> {
  const started = spawn(process.execPath, [path.join(DIST, "bench-server.js"), ...args], { stdio: ["ignore", "pipe", "pipe"] });
  const ended = new Promise<number | null>((resolve) => started.on("exit", resolve));
  return new Promise((resolve, reject) => {
    let said = "";
    const take = (data: Buffer) => {
      said += data.toString();
      const address = /http:\/\/\S+/.exec(said)?.[0];
      if (address) resolve({ address, process: started, stop: () => (started.kill("SIGINT"), ended) });
    };
    started.stdout.on("data", take);
    started.stderr.on("data", take);
    void ended.then((code) => reject(new Error(`the bench server ended with ${code}: ${said}`)));
  });
}

export interface BenchPage {
  readonly page: Page;
  /** Everything asked of any other address. */
  readonly elsewhere: string[];
  /** Errors and warnings of the console, and uncaught exceptions. */
  readonly troubles: string[];
  /** Milliseconds from navigation to a usable page. */
  readonly ready: number;
}

export async function openBench(browser: Browser, address: string, options: BrowserContextOptions = {}): Promise<BenchPage> {
  const context = await browser.newContext({ viewport: { width: 1280, height: 720 }, ...options });
  const page = await context.newPage();
  page.setDefaultTimeout(8000);
  const elsewhere: string[] = [];
  const troubles: string[] = [];
  page.on("request", (request) => {
    if (!request.url().startsWith(address) && !/^(data|blob):/.test(request.url())) elsewhere.push(request.url());
  });
  page.on("console", (message) => {
    if (["error", "warning"].includes(message.type())) troubles.push(`${message.type()}: ${message.text()}`);
  });
  page.on("pageerror", (error) => troubles.push(`exception: ${error.message}`));
  page.on("requestfailed", (request) => troubles.push(`failed: ${request.url()}`));
  const from = Date.now();
  await page.goto(address);
  await page.waitForFunction(() => globalThis.wallsheetBench !== undefined, undefined, { timeout: 20_000 });
  return { page, elsewhere, troubles, ready: Date.now() - from };
}

/** Evaluated cells of the model, rows × columns; an error is its sentence. */
export function cells(page: Page, left: number, top: number, right: number, bottom: number): Promise<(number | string | boolean | null)[][]> {
  return page.evaluate(
    ([l, t, r, b]) => {
      const { getters } = globalThis.wallsheetBench!.model;
      const sheetId = getters.getActiveSheetId();
      return Array.from({ length: b! - t! + 1 }, (_, i) =>
        Array.from({ length: r! - l! + 1 }, (_, j) => {
          const cell = getters.getEvaluatedCell({ sheetId, col: l! + j, row: t! + i });
          return cell.type === "error" ? (cell.message ?? "error") : cell.value;
        }),
      );
    },
    [left, top, right, bottom],
  );
}

/** The y values of every line drawn on the page now, by the line's label, read from the drawing library itself. */
export function chartLines(page: Page): Promise<Record<string, number[]>> {
  return page.evaluate(() => {
    const { Chart } = globalThis as unknown as { Chart: { instances: Record<string, { data: { datasets: { label: string; data: { y: number }[] }[] } }> } };
    const sets = Object.values(Chart.instances).flatMap((chart) => chart.data.datasets);
    return Object.fromEntries(sets.map((set) => [set.label, set.data.map((point) => point.y)]));
  });
}

/** Selects a cell as a keyboard user does: from A1 with the arrow keys; the grid must have the focus. */
export async function goToCell(page: Page, column: number, row: number): Promise<void> {
  await page.keyboard.press("Control+Home");
  for (let i = 0; i < row; i++) await page.keyboard.press("ArrowDown");
  for (let i = 0; i < column; i++) await page.keyboard.press("ArrowRight");
  await page.waitForFunction(
    ([col, row]) => {
      const at = (globalThis.wallsheetBench!.model.getters.getActivePosition as () => { col: number; row: number })();
      return at.col === col && at.row === row;
    },
    [column, row],
  );
}

/** Types at a human pace: the grid opens its editing line a frame after the first letter. */
export async function typeIntoCell(page: Page, text: string, end = "Enter"): Promise<void> {
  await page.keyboard.type(text, { delay: 40 });
  await page.keyboard.press(end);
}

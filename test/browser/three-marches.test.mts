// The starter book's second sheet: one edge-speed column by three laminar methods, in the real page.
import assert from "node:assert/strict";
import path from "node:path";
import { after, before, test } from "node:test";
import type { Browser } from "playwright-core";
import { launch } from "./chromium.mjs";
import { cells, openBench, OUTPUT, startServer, type BenchServer } from "./bench-page.mjs";

let browser: Browser;
let server: BenchServer;
before(async () => {
  server = await startServer();
  browser = await launch();
});
after(async () => {
  await browser.close();
  await server.stop();
});

test("the sheet of three marches shows all three tables and both charts", async () => {
  const { page, troubles } = await openBench(browser, server.address);
  await page.getByText("Three marches", { exact: true }).click();
  await page.waitForFunction(() => globalThis.wallsheetBench!.model.getters.getActiveSheetId() === "marches");
  const rows = await cells(page, 0, 22, 12, 36);
  for (const row of rows) for (const column of [2, 6, 10]) assert.ok((row[column] as number) > 0, `no momentum loss in ${JSON.stringify(row)}`);
  await page.waitForTimeout(600); // the charts draw themselves in
  await page.screenshot({ path: path.join(OUTPUT, "three-marches.png") });
  // Three lines told apart without colour, and plain numbers where the cells have exponents.
  const drawn = await page.evaluate(() => {
    const { Chart } = globalThis as unknown as { Chart: { instances: Record<string, { data: { datasets: { borderDash: number[]; pointStyle: string }[] }; scales: { y: { ticks: { label: string }[] } }; legend: { legendItems: { lineDash: number[] }[] } }> } };
    return Object.values(Chart.instances).map((chart) => ({
      looks: chart.data.datasets.map((line) => `${line.borderDash.join(" ")} ${line.pointStyle}`),
      legend: chart.legend.legendItems.map((item) => item.lineDash.join(" ")),
      marks: chart.scales.y.ticks.map((tick) => tick.label),
    }));
  });
  assert.ok(drawn.some((chart) => chart.looks.length === 3));
  for (const chart of drawn.filter((c) => c.looks.length === 3)) {
    assert.equal(new Set(chart.looks.map((look) => look.split(" ").at(-1))).size, 3, chart.looks.join(" | "));
    assert.equal(new Set(chart.legend).size, 3, chart.legend.join(" | "));
    assert.ok(chart.marks.length >= 3 && chart.marks.every((mark) => /^−?[\d.\u202f]+$/.test(mark)), chart.marks.join(" "));
  }
  assert.deepEqual(troubles, []);
  await page.close();
});

// The page Excel shows as the pane, in a real browser with a stand-in for Office's script; and the help page.
import assert from "node:assert/strict";
import path from "node:path";
import { after, before, test } from "node:test";
import type { Browser } from "playwright-core";
import { OUTPUT, startServer, type BenchServer } from "./bench-page.mjs";
import { launch } from "./chromium.mjs";

const OFFICE_SCRIPT = "https://appsforoffice.microsoft.com/lib/1/hosted/office.js";
const STAND_IN = `
  window.CustomFunctions = { associated: {}, associate(id, f) { this.associated[id] = f; }, Error: class { constructor(code, message) { this.code = code; this.message = message; } }, ErrorCode: { invalidValue: "#VALUE!", notAvailable: "#N/A" } };
  window.Office = { HostType: { Excel: "Excel" }, onReady: (then) => Promise.resolve({ host: "Excel" }).then((info) => (then && then(info), info)) };
  window.Excel = { run: async () => { throw Object.assign(new Error("several"), { code: "InvalidSelection" }); } };
`;

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

test("Excel's pane page loads functions and pane, asks only for Office's own script, and says Excel's refusals in words", async () => {
  const page = await (await browser.newContext({ viewport: { width: 320, height: 640 } })).newPage();
  const elsewhere: string[] = [];
  const troubles: string[] = [];
  page.on("pageerror", (error) => troubles.push(error.message));
  // The bench's own policy rightly forbids Office's address; Excel serves the page under its own.
  await page.route("**/*", async (route) => {
    const url = route.request().url();
    if (url === OFFICE_SCRIPT) return route.fulfill({ contentType: "text/javascript", body: STAND_IN });
    if (!url.startsWith(server.address)) elsewhere.push(url);
    const response = await route.fetch();
    const headers = response.headers();
    delete headers["content-security-policy"];
    return route.fulfill({ response, headers });
  });
  await page.goto(new URL("taskpane.html", server.address).href);
  await page.getByRole("button", { name: /^THWAITES_MARCH/ }).waitFor();
  await page.getByText("Select one block of cells").waitFor();
  await page.getByRole("button", { name: "Look", exact: true }).click();
  await page.getByRole("status").getByText("Select one block of cells").waitFor();
  assert.equal(await page.getByRole("button", { name: /^Save / }).count(), 0, "Excel's page gives out no files; copying is offered instead");
  assert.equal(await page.getByText("Copy what is shown").count(), 1);
  assert.equal(await page.evaluate(() => Object.keys((globalThis as unknown as { CustomFunctions: { associated: object } }).CustomFunctions.associated).includes("THWAITES_MARCH")), true);
  assert.equal(await page.evaluate(() => document.documentElement.scrollWidth <= 320), true);
  await page.screenshot({ path: path.join(OUTPUT, "excel-pane.png") });
  assert.deepEqual([elsewhere, troubles], [[], []]);
});

test("the help page opens at a function's card", async () => {
  const page = await (await browser.newContext({ viewport: { width: 1000, height: 720 } })).newPage();
  await page.goto(new URL("help.html#laminar-methods", server.address).href);
  await page.getByRole("heading", { name: "Which laminar march?" }).waitFor();
  await page.screenshot({ path: path.join(OUTPUT, "help.png") });
  await page.locator("#LAG_MARCH").getByRole("link", { name: "LAG_MARCH" }).click();
  await page.getByRole("heading", { name: "Equations" }).waitFor();
  assert.equal(await page.locator("math").count(), 4);
  await page.screenshot({ path: path.join(OUTPUT, "help-function.png"), fullPage: true });
});

import assert from "node:assert/strict";
import { spawnSync } from "node:child_process";
import { readFileSync } from "node:fs";
import { createServer, type AddressInfo } from "node:net";
import path from "node:path";
import { test } from "node:test";
import { DIST, startServer, TOP } from "./bench-page.mjs";

const run = (...args: string[]) => spawnSync(process.execPath, [path.join(DIST, "bench-server.js"), ...args], { encoding: "utf8", timeout: 10_000 });

test("the server prints its address, answers there and ends cleanly on Ctrl-C", async () => {
  const server = await startServer();
  const answer = await fetch(server.address);
  assert.equal(answer.status, 200);
  assert.match(answer.headers.get("content-security-policy") ?? "", /script-src 'self';/);
  assert.match(await answer.text(), /<title>Wallsheet bench<\/title>/);
  assert.equal(await server.stop(), 0);
});

test("a port in use gives one sentence and exit 1", async () => {
  const holder = createServer();
  await new Promise<void>((resolve) => holder.listen(0, "127.0.0.1", resolve));
  const { port } = holder.address() as AddressInfo;
  const { status, stderr, stdout } = run("--port", String(port));
  holder.close();
  assert.equal(status, 1);
  assert.equal(stderr, `Port ${port} is in use; choose another with --port, or leave it out for a free one.\n`);
  assert.equal(stdout, "");
});

test("a given port is used, and the server is not reachable by another address of this machine", async () => {
  const holder = createServer();
  await new Promise<void>((resolve) => holder.listen(0, "127.0.0.1", resolve));
  const { port } = holder.address() as AddressInfo;
  await new Promise((resolve) => holder.close(resolve));
  const server = await startServer("--port", String(port));
  assert.equal(server.address, `http://127.0.0.1:${port}/`);
  // 127.0.0.2 is this machine too; a server on all addresses would answer there.
  await assert.rejects(fetch(`http://127.0.0.2:${port}/`));
  await server.stop();
});

test("--help and misspelt options end as a Unix user expects", () => {
  assert.equal(run("--help").status, 0);
  assert.match(run("--help").stdout, /^Usage: npm start/);
  const wrong = run("--prot", "1");
  assert.equal(wrong.status, 2);
  assert.equal(wrong.stderr, 'The bench server does not know "--prot"; --help lists what it knows.\n');
});

test("the libraries reach dist byte for byte, with their licence texts", () => {
  const pairs = [
    ["@odoo/owl/dist/owl.iife.min.js", "owl.iife.min.js"],
    ["@odoo/owl/LICENSE", "LICENSE.owl.txt"],
    ["@odoo/o-spreadsheet/dist/o_spreadsheet.min.iife.js", "o_spreadsheet.min.iife.js"],
    ["@odoo/o-spreadsheet/dist/o_spreadsheet.css", "o_spreadsheet.css"],
    ["@odoo/o-spreadsheet/LICENSE", "LICENSE.o-spreadsheet.txt"],
    ["chart.js/dist/chart.umd.min.js", "chart.umd.min.js"],
    ["luxon/build/global/luxon.min.js", "luxon.min.js"],
    ["chartjs-adapter-luxon/dist/chartjs-adapter-luxon.umd.min.js", "chartjs-adapter-luxon.umd.min.js"],
  ];
  for (const [from, to] of pairs) assert.ok(readFileSync(path.join(TOP, "node_modules", from!)).equals(readFileSync(path.join(DIST, "engine", to!))), `${to} was changed`);
  assert.match(readFileSync(path.join(DIST, "engine/LICENSE.o-spreadsheet.txt"), "utf8"), /GNU LESSER GENERAL PUBLIC LICENSE[\s\S]*GNU GENERAL PUBLIC LICENSE/);
});

test("our scripts contain neither library", () => {
  const bench = readFileSync(path.join(DIST, "bench.js"), "utf8");
  assert.ok(!bench.includes("__template__") && !bench.includes("o-spreadsheet-Grid"), "a library was bundled");
});

/**
 * Seam: loading the grid library without a page (Node only). Pinned: @odoo/owl 2.8.3, @odoo/o-spreadsheet 19.3.7.
 *
 * Relies on: both files being plain scripts that end in `(this.owl = this.owl || {})` and
 * `(this.o_spreadsheet = this.o_spreadsheet || {}, owl)`, and on the second one planting stand-ins for `document`,
 * `OffscreenCanvas` and `DOMParser` on `globalThis` where there is no page. Each file is compiled, unmodified, as the body of a
 * function whose `this`, `globalThis`, `document`, `OffscreenCanvas`, `DOMParser` and `console` are ours, so that nothing is
 * planted on the real `globalThis` (`typeof document` goes on telling the truth) and the library's timing messages do not end
 * up on a command's output.
 *
 * The library copies what it is given and refuses objects whose prototype is not its own realm's `Object.prototype`. It must
 * therefore run in the caller's realm: jest gives each test file a realm of its own, where `vm.compileFunction` (and
 * `vm.runInThisContext`) would still compile in Node's main one; there the caller's own `Function` compiles the file instead.
 *
 * How it would break: a file that is a module, or that reads another global, fails at once with the message below.
 */
import fs from "node:fs";
import path from "node:path";
import vm from "node:vm";
import type { EngineLibrary } from "./types";

const OWL_FILE = "owl.iife.min.js";
const SHEET_FILE = "o_spreadsheet.min.iife.js";

/** All that owl asks of a page before anything is mounted: that it is ready, and an empty document to build text in. */
const PAGE_OF_OWL = { readyState: "complete", implementation: { createDocument: () => ({}) } };

/** Runs the two library files found in `folder` (side by side, or below its node_modules) and gives the library. */
export function loadHeadless(folder: string): EngineLibrary {
  const owlFile = locate(folder, OWL_FILE, "node_modules/@odoo/owl/dist");
  const sheetFile = locate(folder, SHEET_FILE, "node_modules/@odoo/o-spreadsheet/dist");
  const exported: { owl?: unknown; o_spreadsheet?: EngineLibrary } = {};
  runScript(owlFile, exported, { document: PAGE_OF_OWL });
  runScript(sheetFile, exported, { owl: exported.owl, ...pageStandIns() });
  if (!exported.o_spreadsheet?.Model) throw new Error(`The grid library in ${sheetFile} did not load: it defines no o_spreadsheet.Model.`);
  return exported.o_spreadsheet;
}

function locate(folder: string, file: string, below: string): string {
  const candidates = [path.join(folder, file), path.join(folder, below, file)];
  const found = candidates.find((candidate) => fs.existsSync(candidate));
  if (!found) throw new Error(`The grid library's file ${file} is neither in ${folder} nor in ${path.join(folder, below)}.`);
  return found;
}

function runScript(file: string, exported: object, scope: Record<string, unknown>): void {
  const code = fs.readFileSync(file, "utf8");
  const names = Object.keys(scope);
  const inMainRealm = vm.runInThisContext("Object") === Object;
  const run: (...args: unknown[]) => unknown = inMainRealm ? (vm.compileFunction(code, names, { filename: file }) as (...args: unknown[]) => unknown) : (globalThis.Function(...names, code) as (...args: unknown[]) => unknown);
  run.apply(exported, Object.values(scope));
}

/** A `globalThis` that keeps what is written to it, and names that read what the library has put there. */
function pageStandIns(): Record<string, unknown> {
  const planted: Record<PropertyKey, unknown> = {};
  const real = globalThis as unknown as Record<PropertyKey, unknown>;
  const forward = (name: string) => new Proxy(function () {}, {
    get: (_, key) => (planted[name] as Record<PropertyKey, unknown>)[key],
    construct: (_, args: unknown[]) => new (planted[name] as new (...rest: unknown[]) => object)(...args),
  });
  const quietConsole = Object.assign(Object.create(console) as Console, { debug: () => undefined });
  return {
    globalThis: new Proxy(planted, { get: (_, key) => (key in planted ? planted[key] : real[key]) }),
    document: forward("document"),
    OffscreenCanvas: forward("OffscreenCanvas"),
    DOMParser: forward("DOMParser"),
    console: quietConsole,
  };
}

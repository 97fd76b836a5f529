import { spawnSync } from "node:child_process";
import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from "node:fs";
import os from "node:os";
import path from "node:path";

let top: string;
beforeEach(() => {
  top = mkdtempSync(path.join(os.tmpdir(), "wallsheet-layers-"));
  symlinkSync(path.resolve("node_modules"), path.join(top, "node_modules"));
  plant("tsconfig.json", '{"compilerOptions":{"module":"ESNext","moduleResolution":"bundler"}}');
  plant("src/numerics/root.ts", "export const root = 1;");
  plant("src/cells/speed.ts", 'import { root } from "../numerics/root"; export const speed = root;');
});
afterEach(() => rmSync(top, { recursive: true, force: true }));

function plant(name: string, text: string): void {
  mkdirSync(path.dirname(path.join(top, name)), { recursive: true });
  writeFileSync(path.join(top, name), text);
}

function cruise(): { code: number | null; output: string } {
  const run = spawnSync(process.execPath, [path.resolve("node_modules/dependency-cruiser/bin/dependency-cruise.mjs"), "--config", path.resolve(".config/layers.cjs"), "src"], { cwd: top, encoding: "utf8" });
  return { code: run.status, output: run.stdout + run.stderr };
}

test("imports in the agreed direction pass", () => {
  plant("src/chart/frame.ts", 'import { scaleLog } from "d3-scale"; import { line } from "d3-shape"; export const frame = [scaleLog, line];');
  expect(cruise().code).toBe(0);
});

test.each([
  ["physics importing cells", "src/physics/march.ts", 'import { speed } from "../cells/speed"; export const march = speed;', "physics uses only"],
  ["numerics importing a package", "src/numerics/zip.ts", 'import { zipSync } from "fflate"; export const zip = zipSync;', "use no package"],
  ["cells reading files", "src/cells/files.ts", 'import { readFileSync } from "node:fs"; export const read = readFileSync;', "use no package"],
  ["chart importing cells", "src/chart/line.ts", 'import { speed } from "../cells/speed"; export const line = speed;', "chart uses only itself"],
  ["chart importing a package that is not its own", "src/chart/zip.ts", 'import { zipSync } from "fflate"; export const zip = zipSync;', "chart takes plain data"],
  ["chart reading files", "src/chart/files.ts", 'import { readFileSync } from "node:fs"; export const read = readFileSync;', "chart takes plain data"],
  ["the pane drawing by itself", "src/pane/draw.ts", 'import { scaleLog } from "d3-scale"; export const draw = scaleLog;', "only chart draws"],
  ["a circle", "src/numerics/root.ts", 'import { other } from "./other"; export const root = other;', "no circles"],
  ["a room outside the plan", "src/utils/any.ts", 'import { root } from "../numerics/root"; export const any = root;', "no room outside the plan"],
])("a planted wrong import fails: %s", (_what, file, text, rule) => {
  plant("src/numerics/other.ts", 'import { root } from "./root"; export const other = root;');
  plant(file, text);
  const { code, output } = cruise();
  expect(output).toContain(rule);
  expect(code).not.toBe(0);
});

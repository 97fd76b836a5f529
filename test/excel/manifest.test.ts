import { spawnSync } from "node:child_process";
import { existsSync, readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { validateXML } from "xmllint-wasm";

const SCHEMAS = "test/references/schemas/manifest-xsd";
const ENTRY = "OfficeAppManifestV1_1.xsd";
const xml = readFileSync("manifest.xml", "utf8");
const read = (name: string) => ({ fileName: name, contents: readFileSync(path.join(SCHEMAS, name), "utf8") });

async function schemaErrors(contents: string): Promise<string[]> {
  const preload = readdirSync(SCHEMAS).filter((n) => n.endsWith(".xsd") && n !== ENTRY);
  const result = await validateXML({ xml: [{ fileName: "manifest.xml", contents }], schema: [read(ENTRY)], preload: preload.map(read) });
  return result.errors.map((e) => e.message);
}

test("the manifest is valid against the published schemas", async () => {
  expect(await schemaErrors(xml)).toEqual([]);
});

test("the schema check finds a planted fault", async () => {
  expect(await schemaErrors(xml.replace("<Permissions>ReadWriteDocument", "<Permissions>Everything"))).not.toEqual([]);
});

test("Microsoft's manifest reader finds name, version and host", () => {
  const tool = "node_modules/office-addin-manifest/cli.js";
  const run = spawnSync(process.execPath, [tool, "info", "manifest.xml"], { encoding: "utf8" });
  for (const line of ["Name: Wallsheet", "Hosts: Workbook", "Permissions: ReadWriteDocument"]) expect(run.stdout).toContain(line);
});

test("every resource is defined once, used, https, and no longer than 32 characters", () => {
  const defined = [...xml.matchAll(/<bt:(Image|Url|String)\s+id="([^"]+)"\s+DefaultValue="([^"]*)"/g)];
  const ids = defined.map((m) => m[2]!);
  const used = [...xml.matchAll(/\bresid="([^"]+)"/g)].map((m) => m[1]!);
  expect(new Set(ids).size).toBe(ids.length);
  expect([...new Set(used)].sort()).toEqual([...ids].sort());
  for (const [, kind, id, value] of defined) {
    expect(id!.length).toBeLessThanOrEqual(32);
    if (kind !== "String") expect(value).toMatch(/^https:\/\//);
  }
});

test("runtime, function page, function file and pane are one page, in namespace WALL", () => {
  const runtime = /<Runtime\s+resid="([^"]+)"\s+lifetime="long"/.exec(xml)?.[1];
  expect(runtime).toBe("Pane.Url");
  for (const part of [/<Page>\s*<SourceLocation\s+resid="([^"]+)"/, /<FunctionFile\s+resid="([^"]+)"/, /ShowTaskpane">\s*<SourceLocation\s+resid="([^"]+)"/]) {
    expect(part.exec(xml)?.[1]).toBe(runtime);
  }
  expect(xml).toMatch(/id="Functions\.Namespace" DefaultValue="WALL"/);
});

test("every file the manifest names is built", () => {
  const named = [...xml.matchAll(/https:\/\/localhost:3000(\/[^"]+)"/g)].map((m) => m[1]!);
  expect(named.length).toBeGreaterThan(5);
  expect(named.filter((file) => !existsSync("dist" + file))).toEqual([]); // `npm test` builds before it comes here
});

// Compiles the grid library's page templates at build time, so that the bench's page runs without evaluating text as code.
// Prints one script, to be loaded after owl and before the grid library. Run in a process of its own: owl's compiler plants a
// document and a window on globalThis.
//
// The library's own template file is compiled as it is. A few templates stand inside the library's script as owl.xml`…`; owl
// would compile those in the browser. The script printed here therefore answers owl.xml with the compiled template where the text
// is one of them, and leaves every other text to owl.
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { createRequire } from "node:module";
import os from "node:os";
import path from "node:path";
import { compileTemplates } from "@odoo/owl/dist/compile_templates.mjs";

const require = createRequire(import.meta.url);
const packageFolder = path.join(path.dirname(require.resolve("@odoo/owl/package.json")), "../o-spreadsheet");
const { version } = JSON.parse(readFileSync(path.join(packageFolder, "package.json"), "utf8"));
const script = readFileSync(path.join(packageFolder, "dist/o_spreadsheet.min.iife.js"), "utf8");
const templateFile = path.join(packageFolder, "dist/o_spreadsheet.xml");

/** Templates inside the script: each begins with an element after white space. */
const inline = [...script.matchAll(/\.xml\)?`(\s*<[^`]*)`/g)].map((match) => match[1]);
const EXPECTED_INLINE = 4;
if (inline.length !== EXPECTED_INLINE) throw new Error(`${inline.length} inline templates found in o-spreadsheet ${version}, ${EXPECTED_INLINE} expected; look at them before changing the number`);

const folder = mkdtempSync(path.join(os.tmpdir(), "engine-templates-"));
const print = process.stdout.write;
let compiled;
try {
  const wrapped = inline.map((text, i) => text.trim().replace(/^<([\w:-]+)/, `<t t-name="inline${i}"><$1`) + "</t>");
  writeFileSync(path.join(folder, "inline.xml"), `<templates>${wrapped.join("\n")}</templates>`);
  process.stdout.write = () => true; // the compiler reports its progress there
  compiled = await compileTemplates([templateFile, path.join(folder, "inline.xml")]);
} finally {
  process.stdout.write = print;
  rmSync(folder, { recursive: true, force: true });
}

const compact = (text) => text.replace(/\s+/g, " ").trim();
const result = `// Templates of @odoo/o-spreadsheet ${version} (LGPL-3.0-or-later, see LICENSE.o-spreadsheet.txt), compiled from o_spreadsheet.xml
// by the compiler of @odoo/owl (LGPL-3.0-only, see LICENSE.owl.txt).
(function () {
"use strict";
${compiled.replace("export const templates =", "const templates =")};
const inline = ${JSON.stringify(inline.map(compact))};
for (const name in templates) if (!/^inline\\d+$/.test(name)) owl.App.registerTemplate(name, templates[name]);
const xml = owl.xml;
owl.xml = function () {
  const name = xml.apply(this, arguments);
  const known = inline.indexOf(String.raw.apply(null, arguments).replace(/\\s+/g, " ").trim());
  if (known >= 0) owl.App.registerTemplate(name, templates["inline" + known]);
  return name;
};
Object.assign(owl.xml, xml);
})();
`;
process.stdout.write(result);

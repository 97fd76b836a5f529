import { existsSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { cellFunctionFiles } from "./cell-function-files";
import { generatedText } from "./generated-text";
import { withFunctionTable } from "./readme-table";

// `npm run record`: writes the catalogue, the function map and the README table from the comments.
const top = process.cwd();
const made = generatedText(cellFunctionFiles(top));
for (const fault of made.faults) console.error(fault);
writeFileSync(path.join(top, "src/cells/generated/catalogue.ts"), made.catalogueText);
writeFileSync(path.join(top, "src/cells/generated/functions.ts"), made.functionsText);
const readme = path.join(top, "README.md");
if (existsSync(readme)) writeFileSync(readme, withFunctionTable(readFileSync(readme, "utf8"), made.entries));
console.log(`${made.entries.length} functions, ${made.faults.length} faults`);
process.exitCode = made.faults.length > 0 ? 1 : 0;

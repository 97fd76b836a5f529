import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";

/** A source file that declares cell functions. */
export interface CellFunctionFile {
  /** Path from the project's top, with forward slashes. */
  path: string;
  text: string;
}

/** All files below src/cells that carry the customfunction tag, in a fixed order. */
export function cellFunctionFiles(top: string): CellFunctionFile[] {
  return readdirSync(path.join(top, "src/cells"), { recursive: true, encoding: "utf8" })
    .map((name) => "src/cells/" + name.split(path.sep).join("/"))
    .filter((name) => name.endsWith(".ts"))
    .sort()
    .map((name) => ({ path: name, text: readFileSync(path.join(top, name), "utf8") }))
    .filter((file) => /^ \* @customfunction\b/m.test(file.text));
}

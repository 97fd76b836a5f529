import type { EngineLibrary } from "./types";
export function installExcelFunctions(library: EngineLibrary): void {
  library.addFunction("SIGN", { description: "Sign.", args: [library.helpers.arg("x (number)", "x")], compute: (x) => ({ value: Math.sign(Number((x as { value: unknown }).value)) }) });
  library.addFunction("LOG.10", { description: "Log.", args: [library.helpers.arg("x (number)", "x")], compute: (x) => ({ value: Math.log10(Number((x as { value: unknown }).value)) }) });
}

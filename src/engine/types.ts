/**
 * The parts of @odoo/o-spreadsheet 19.3.7 that we use, typed by hand. Its own typings describe internals we must not lean on;
 * what stands here is the whole surface an upgrade has to be checked against.
 */

/** One value inside the engine. Blank is null; an error is a string such as `#ERROR` in `value` with a sentence in `message`. */
export interface EngineValue {
  value: number | string | boolean | null;
  message?: string;
  format?: string;
  /** The cell the value was read from; the engine adds it to every cell it hands to a formula. */
  position?: EnginePosition;
}

export interface EnginePosition {
  sheetId: string;
  col: number;
  row: number;
}

/** Indexed [column][row]. */
export type EngineMatrix = EngineValue[][];
/** An argument or a result: undefined stands for an omitted argument. */
export type EngineArgument = EngineValue | EngineMatrix | undefined;

export interface EngineZone {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

export interface EngineArgumentDefinition {
  name: string;
  description: string;
  type: string[];
  optional?: boolean;
  repeating?: boolean;
  default?: boolean;
  acceptErrors?: boolean;
  acceptMatrix?: boolean;
  acceptMatrixOnly?: boolean;
}

/** `this` inside a running function. */
export interface EngineContext {
  getters: EngineGetters;
  __originCellPosition?: EnginePosition;
  __originSheetId?: string;
}

export type EngineCompute = (this: EngineContext, ...args: EngineArgument[]) => EngineArgument | EngineError;

export interface EngineFunctionDescription {
  description: string;
  category?: string;
  args: EngineArgumentDefinition[];
  compute: EngineCompute;
  isExported?: boolean;
  hidden?: boolean;
}

/** What the registry holds after it has added counts to a description. */
export interface EngineFunctionEntry extends EngineFunctionDescription {
  name: string;
  minArgRequired: number;
  maxArgPossible: number;
  nbrArgRepeating: number;
  nbrOptionalNonRepeatingArgs: number;
}

export interface EngineFunctionRegistry {
  content: Record<string, EngineFunctionEntry>;
  get(key: string): EngineFunctionEntry;
  replace(key: string, description: EngineFunctionDescription): unknown;
}

export interface EngineError {
  message: string;
  value: string;
}

export interface EngineRange {
  sheetId: string;
  zone: EngineZone;
}

export interface EngineToken {
  type: string;
  value: string;
}

export interface EngineCompiledFormula {
  isBadExpression: boolean;
  normalizedFormula: string;
  tokens: EngineToken[];
  symbols: string[];
  literalValues: { numbers: EngineValue[]; strings: EngineValue[] };
  rangeDependencies: EngineRange[];
  getTokens(getters: EngineGetters, ...options: unknown[]): EngineToken[];
  toFormulaString(getters: EngineGetters, ...options: unknown[]): string;
}

/** What the engine keeps per formula shape: called with the compiled formula as `this`. */
export type EngineExecutable = (
  this: EngineCompiledFormula,
  dependencies: EngineRange[],
  reference: (range: EngineRange) => EngineValue,
  range: (range: EngineRange) => EngineMatrix,
  symbolValue: (name: string, wantRange: boolean) => EngineArgument,
  context: EngineContext,
) => EngineArgument;

export interface EngineCompiledFormulaClass {
  prototype: EngineCompiledFormula;
  Compile(formula: string, sheetId: string, getters: EngineGetters): EngineCompiledFormula;
  IsBadExpression(formula: string): boolean;
}

/** A cell as the model holds it. */
export interface EngineCell {
  id: number;
  content: string;
  isFormula: boolean;
  compiledFormula?: EngineCompiledFormula;
  format?: string;
}

export interface EngineEvaluatedCell {
  type: "empty" | "number" | "text" | "boolean" | "error";
  value: number | string | boolean | null;
  formattedValue: string;
  format?: string;
  message?: string;
}

export interface EngineGetters {
  getSheetIds(): string[];
  getSheetName(sheetId: string): string;
  getActiveSheetId(): string;
  getNumberRows(sheetId: string): number;
  getNumberCols(sheetId: string): number;
  getCell(position: EnginePosition): EngineCell | undefined;
  getEvaluatedCell(position: EnginePosition): EngineEvaluatedCell;
  /** The whole zone of a spill, given its first cell; undefined where the cell does not spill. */
  getSpreadZone(position: EnginePosition, options?: { ignoreSpillError: boolean }): EngineZone | undefined;
  /** The first cell of the spill that covers a cell. */
  getArrayFormulaSpreadingOn(position: EnginePosition): EnginePosition | undefined;
  evaluateFormulaResult(sheetId: string, formula: string): EngineValue | EngineMatrix;
  getRangeFromSheetXC(sheetId: string, xc: string): EngineRange;
  getRangeString(range: EngineRange, forSheetId: string): string;
  [other: string]: unknown;
}

export interface EngineCommandResult {
  isSuccessful: boolean;
  reasons: string[];
}

export interface EngineModel {
  getters: EngineGetters;
  dispatch(command: string, payload?: Record<string, unknown>): EngineCommandResult;
  exportData(): Record<string, unknown>;
  exportXLSX(): Promise<{ name: string; files: { path: string; content?: string; imageSrc?: string }[] }>;
  updateMode(mode: string): void;
  leaveSession?(): void;
  [other: string]: unknown;
}

/** `globalThis.o_spreadsheet` after the library's own file has run. */
export interface EngineLibrary {
  __info__: { version: string };
  Model: new (data?: unknown, config?: unknown) => EngineModel;
  EvaluationError: new (message?: string, value?: string) => EngineError;
  CompiledFormula: EngineCompiledFormulaClass;
  functionCache: Record<string, EngineExecutable>;
  registries: { functionRegistry: EngineFunctionRegistry; [other: string]: unknown };
  stores: {
    CellComposerStore: { prototype: { getPrettifiedFormula(this: { getters: EngineGetters }, cell: EngineCell): string } };
    [other: string]: unknown;
  };
  helpers: { arg(definition: string, description: string): EngineArgumentDefinition; [other: string]: unknown };
  addFunction(name: string, description: EngineFunctionDescription): unknown;
  parse(formula: string): unknown;
  tokenize(formula: string): EngineToken[];
  load(parts: Record<string, unknown>, verbose?: boolean): Record<string, unknown>;
  [other: string]: unknown;
}

/** A library whose seams are installed and tested. */
export interface Engine {
  readonly library: EngineLibrary;
  /** Names of our own functions with their namespace, as written in cells. */
  readonly functionNames: readonly string[];
  /** Formula text as typed, pasted or stored in a file → the text the engine holds. */
  readonly normalise: (formula: string) => string;
  /** The text the engine holds → the text Excel shows. */
  readonly excelText: (formula: string) => string;
}

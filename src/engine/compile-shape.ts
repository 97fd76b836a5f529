/**
 * A formula's expression → a function of the cell it stands in, without evaluating text as code (the bench's page forbids that).
 *
 * Relies on how the engine (19.3.7) runs a compiled formula: `execute.call(compiledFormula, dependencies, reference, range,
 * symbolValue, context)`, where `context[NAME]` is the function of that name, `reference` reads one cell and `range` a block.
 */
import { argumentCountFault, argumentPlaces } from "./argument-places";
import { isEngineError } from "./engine-values";
import { JOIN_PAIR } from "./excel-functions/text-and-kind";
import { FormulaError, parseShape, type Expression } from "./formula-shape";
import { LAMBDA_FUNCTIONS, callLambda, isLambda, lambdaValue } from "./lambda";
import { CALL_LAMBDA } from "./normalise-formula";
import type { EngineArgument, EngineExecutable, EngineFunctionEntry, EngineValue } from "./types";

/** Everything a running formula reads; `slots` holds what LET and LAMBDA have bound so far. */
interface Frame {
  formula: ThisParameterType<EngineExecutable>;
  dependencies: Parameters<EngineExecutable>[0];
  reference: Parameters<EngineExecutable>[1];
  range: Parameters<EngineExecutable>[2];
  symbolValue: Parameters<EngineExecutable>[3];
  functions: Readonly<Record<string, (...args: EngineArgument[]) => EngineArgument>>;
  slots: readonly EngineArgument[];
}

type Run = (frame: Frame) => EngineArgument;
/** Bound names in upper case → their slot, and the next free slot (an inner name may hide an outer one). */
interface Bound {
  readonly slotOf: ReadonlyMap<string, number>;
  readonly next: number;
}

const BINARY_FUNCTIONS = { "=": "EQ", "<>": "NE", "<": "LT", ">": "GT", "<=": "LTE", ">=": "GTE", "&": JOIN_PAIR, "+": "ADD", "-": "MINUS", "*": "MULTIPLY", "/": "DIVIDE", "^": "POWER" } as const;
const UNARY_FUNCTIONS = { "-": "UMINUS", "+": "UPLUS", "%": "UNARY.PERCENT", "#": "SPILLED.RANGE" } as const;
const NOTHING_BOUND: Bound = { slotOf: new Map(), next: 0 };

/** Names the compiler itself understands; the registry lists them for help only. */
export const COMPILED_NAMES: readonly string[] = ["LET", "LAMBDA", CALL_LAMBDA, ...Object.keys(LAMBDA_FUNCTIONS)];

/** Compiles one shape; throws a FormulaError when it cannot be a formula. */
export function compileShape(shape: string, registry: Readonly<Record<string, EngineFunctionEntry>>): EngineExecutable {
  const run = compile(parseShape(shape), false, NOTHING_BOUND, registry);
  return function (dependencies, reference, range, symbolValue, context) {
    const functions = context as unknown as Frame["functions"];
    return run({ formula: this, dependencies, reference, range, symbolValue, functions, slots: [] });
  };
}

/** `asRange`: whoever takes the value wants a single cell as a block of one. */
function compile(expression: Expression, asRange: boolean, bound: Bound, registry: Readonly<Record<string, EngineFunctionEntry>>): Run {
  const inner = (e: Expression, range = false) => compile(e, range, bound, registry);
  switch (expression.kind) {
    case "reference": {
      const { index, isRange } = expression;
      return isRange || asRange ? (f) => f.range(f.dependencies[index]!) : (f) => f.reference(f.dependencies[index]!);
    }
    case "number":
      return (f) => f.formula.literalValues.numbers[expression.index];
    case "string":
      return (f) => f.formula.literalValues.strings[expression.index];
    case "boolean":
      return () => ({ value: expression.value });
    case "omitted":
      return () => undefined;
    case "name": {
      const slot = bound.slotOf.get(expression.name.toUpperCase());
      if (slot !== undefined) return (f) => f.slots[slot];
      // Read through the formula's own list: the engine rewrites it when a name is renamed.
      return (f) => f.symbolValue(f.formula.symbols[expression.symbol]!.replace(/^'|'$/g, ""), asRange);
    }
    case "unary": {
      const name = UNARY_FUNCTIONS[expression.operator];
      const operand = inner(expression.operand, expression.operator === "#");
      return (f) => f.functions[name]!(operand(f));
    }
    case "binary": {
      const name = BINARY_FUNCTIONS[expression.operator];
      const [left, right] = [inner(expression.left), inner(expression.right)];
      return (f) => f.functions[name]!(left(f), right(f));
    }
    case "array": {
      const rows = expression.rows.map((row) => row.map((e) => inner(e)));
      return (f) => f.functions["ARRAY.LITERAL"]!(...rows.map((row) => f.functions["ARRAY.ROW"]!(...row.map((run) => run(f)))));
    }
    case "call":
      return compileCall(expression, asRange, bound, registry);
  }
}

function compileCall({ name, args }: Expression & { kind: "call" }, asRange: boolean, bound: Bound, registry: Readonly<Record<string, EngineFunctionEntry>>): Run {
  const slot = bound.slotOf.get(name);
  if (slot !== undefined) {
    const runs = args.map((e) => compile(e, false, bound, registry));
    return (f) => callLambda(f.slots[slot], runs.map((run) => run(f)));
  }
  if (name === "LET") return compileLet(args, asRange, bound, registry);
  if (name === "LAMBDA") return compileLambda(args, bound, registry);
  if (name === CALL_LAMBDA) {
    const [called, ...runs] = args.map((e) => compile(e, false, bound, registry));
    return (f) => callLambda(called!(f), runs.map((run) => run(f)));
  }
  if (name in LAMBDA_FUNCTIONS) return compileLambdaFunction(name, args, bound, registry);
  const entry = Object.hasOwn(registry, name) ? registry[name]! : undefined;
  if (!entry) return () => ({ value: "#NAME?", message: `There is no function ${name}.` });
  const fault = argumentCountFault(entry, args.length);
  if (fault) throw new FormulaError(fault);
  const places = argumentPlaces(entry, args.length);
  const runs = args.map((e, i) => {
    const definition = entry.args[places[i]!]!;
    const run = compile(e, definition.type.some((type) => type.startsWith("RANGE")), bound, registry);
    return definition.acceptMatrixOnly ? (f: Frame) => asMatrix(run(f)) : run;
  });
  if (name === "IF" && runs.length >= 2) return lazyIf(runs);
  return (f) => f.functions[name]!(...runs.map((run) => run(f)));
}

/** A value that a LET name or a LAMBDA hands to an argument that must be a range. */
function asMatrix(argument: EngineArgument): EngineArgument {
  return argument === undefined || Array.isArray(argument) ? argument : [[argument]];
}

/** Only the branch taken is evaluated, as in Excel, whenever the test is a single truth value or number. */
function lazyIf(given: readonly Run[]): Run {
  const skipped: EngineValue = { value: null };
  // Excel gives FALSE where no third argument is written, 0 where it is written and empty.
  const runs: readonly Run[] = given.length === 2 ? [...given, () => ({ value: false })] : given;
  return (f) => {
    const test = runs[0]!(f);
    const single = !Array.isArray(test) ? test : test.length === 1 && test[0]!.length === 1 ? test[0]![0] : undefined;
    const value = single?.value;
    const decided = typeof value === "boolean" || typeof value === "number";
    if (value === "") return { value: "#ERROR", message: "IF needs TRUE, FALSE or a number to test, not an empty text." };
    const rest = runs.slice(1).map((run, i) => (decided && Boolean(value) !== (i === 0) ? skipped : run(f)));
    return f.functions["IF"]!(test, ...rest);
  };
}

function compileLet(args: readonly Expression[], asRange: boolean, bound: Bound, registry: Readonly<Record<string, EngineFunctionEntry>>): Run {
  if (args.length < 3 || args.length % 2 === 0) throw new FormulaError("LET needs pairs of a name and a value, then one expression.");
  let names = bound;
  const values: Run[] = [];
  for (let i = 0; i + 1 < args.length; i += 2) {
    values.push(compile(args[i + 1]!, false, names, registry));
    names = withNames(names, [args[i]!], "LET");
  }
  const body = compile(args.at(-1)!, asRange, names, registry);
  const first = bound.next;
  return (f) => {
    let frame = f;
    values.forEach((run, i) => (frame = { ...frame, slots: withSlot(frame.slots, first + i, run(frame)) }));
    return body(frame);
  };
}

function compileLambda(args: readonly Expression[], bound: Bound, registry: Readonly<Record<string, EngineFunctionEntry>>): Run {
  if (args.length === 0) throw new FormulaError("LAMBDA needs an expression.");
  const count = args.length - 1;
  const body = compile(args.at(-1)!, false, withNames(bound, args.slice(0, -1), "LAMBDA"), registry);
  const first = bound.next;
  return (f) =>
    lambdaValue((...given) => {
      if (given.length !== count) return { value: "#ERROR", message: `This LAMBDA takes ${count} argument${count === 1 ? "" : "s"}; it got ${given.length}.` };
      const slots = f.slots.slice(0, first);
      given.forEach((value, i) => (slots[first + i] = value ?? { value: null }));
      return body({ ...f, slots });
    });
}

function compileLambdaFunction(name: string, args: readonly Expression[], bound: Bound, registry: Readonly<Record<string, EngineFunctionEntry>>): Run {
  const runs = args.map((e, i) => {
    // A function's bare name where a LAMBDA is due: MAP(A1:A3,SQRT).
    if (i === args.length - 1 && e.kind === "name" && !bound.slotOf.has(e.name.toUpperCase()) && Object.hasOwn(registry, e.name.toUpperCase())) {
      const called = e.name.toUpperCase();
      return (f: Frame) => lambdaValue((...given) => f.functions[called]!(...given));
    }
    return compile(e, false, bound, registry);
  });
  return (f) => {
    const values = runs.map((run) => run(f));
    const error = values.find((value) => isEngineError(value) && !isLambda(value));
    return error ?? LAMBDA_FUNCTIONS[name]!(values);
  };
}

/** Gives each name the next free slot. */
function withNames(bound: Bound, names: readonly Expression[], what: string): Bound {
  const slotOf = new Map(bound.slotOf);
  names.forEach((e, i) => {
    if (e.kind !== "name" || e.name.includes("!")) throw new FormulaError(`${what} needs a name here, one that does not look like a cell.`);
    slotOf.set(e.name.toUpperCase(), bound.next + i);
  });
  return { slotOf, next: bound.next + names.length };
}

function withSlot(slots: readonly EngineArgument[], slot: number, value: EngineArgument): EngineArgument[] {
  const result = slots.slice(0, slot);
  result[slot] = value;
  return result;
}

import { NOT_COMPUTED } from "../engine/not-computed";
import type { Engine } from "../engine/types";
import { boxSize, cellBox } from "../workbook/cell-reference";
import type { StoredCell } from "../workbook/read-sheet";
import type { PlainFormula } from "../workbook/plain-formula";
import { isWallCall } from "../workbook/wall-call";

/** Why a formula is not calculated here. */
export interface Left {
  reason: string;
  /** Nothing is amiss: its value changes by itself, so that a repeated recalculation would never come to rest. */
  byItself: boolean;
}

/** Cells a fixed array block may have: all of them are written, and more than this no one has filled on purpose. */
const LARGEST_BLOCK = 2_000_000;
/** Their value hangs on the moment or on chance. */
const CHANGING = new Set(["NOW", "TODAY", "RAND", "RANDBETWEEN", "RANDARRAY"]);
/** The sheet engine counts days from 1900 only. */
const DATE_FUNCTIONS = new Set("DATE DATEVALUE DATEDIF DAY DAYS360 EDATE EOMONTH ISOWEEKNUM MONTH NETWORKDAYS NETWORKDAYS.INTL TEXT WEEKDAY WEEKNUM WORKDAY WORKDAY.INTL YEAR YEARFRAC".split(" "));
/** What they give hangs on rows being hidden or filtered out, which the engine is not told. */
const SEEING_FUNCTIONS = new Set(["SUBTOTAL", "AGGREGATE"]);
/** Words our formula reading knows besides the engine's functions. */
const OWN_WORDS = ["LET", "LAMBDA", "LOG10", "ANCHORARRAY", "SINGLE"];

/** Judges formulas by what they call and refer to; undefined where the engine can calculate them. */
export function leftJudge(engine: Engine, { from1904, hidesRows }: { from1904: boolean; hidesRows: boolean }): (cell: StoredCell, formula: PlainFormula) => Left | undefined {
  const known = new Set([...Object.keys(engine.library.registries.functionRegistry.content), ...OWN_WORDS].map((n) => n.toUpperCase()));
  for (const name of engine.functionNames) known.add(`_XLDUDF_${name.replace(/\./g, "_")}`.toUpperCase());
  return (cell, formula) => {
    const uses = (what: string) => ({ reason: `it uses ${what}`, byItself: false });
    if (cell.formula?.kind === "dataTable") return uses("a what-if table");
    const block = cell.formula?.kind === "array" && cell.attributes["cm"] === undefined && cell.formula.ref !== undefined ? boxSize(cellBox(cell.formula.ref)) : 0;
    if (block > LARGEST_BLOCK) return { reason: `its fixed block has ${block} cells, more than ${LARGEST_BLOCK}`, byItself: false };
    if (formula.outside) return uses("a link to another book");
    const named = formula.functions.find((f) => Object.hasOwn(NOT_COMPUTED, f));
    if (named !== undefined) return uses(`${named}, which ${NOT_COMPUTED[named]}`);
    const unknown = formula.functions.find((f) => !known.has(f));
    if (unknown !== undefined) return uses(`the function ${unknown.replace(/^_XLDUDF_/, "")}, unknown here`);
    if (formula.missingName !== undefined) return uses(`the name ${formula.missingName}, which the book does not define, or only by itself`);
    const dated = from1904 ? formula.functions.find((f) => DATE_FUNCTIONS.has(f)) : undefined;
    if (dated !== undefined) return uses(`${dated}, and the book counts days from 1904`);
    const partial = hidesRows ? formula.functions.find((f) => SEEING_FUNCTIONS.has(f)) : undefined;
    if (partial !== undefined) return uses(`${partial}, which may skip hidden rows, and the book hides some`);
    const changing = formula.functions.find((f) => CHANGING.has(f));
    if (changing !== undefined && cell.value !== null && !callsWall(formula)) return { reason: `${changing} gives another value each time`, byItself: true };
    return undefined;
  };
}

/** The formula calls one of our functions, in either spelling. */
export function callsWall(formula: PlainFormula): boolean {
  return formula.functions.some(isWallCall);
}

import { cellError } from "../errors/cell-error";
import { addressOf, type Call } from "./call";
import { cellRows, cellValue, describeCell, type CellValue } from "./cell-value";
import { nearestWord } from "./nearest-word";
import { OPTION_VOCABULARY, type OptionKind, type OptionLabel } from "./option-vocabulary";
import { chosen } from "./read-choice";
import { columnKeys } from "../writing/headings";

/** Options of one call, read and checked. */
export interface Options {
  number(label: OptionLabel): number | undefined;
  word(label: OptionLabel): string | undefined;
  /** Keys of the `columns` option in the wanted order. */
  columns(): readonly string[] | undefined;
  /** The settings used in one line for a table's note: what was given, else the default stated here. */
  settings(defaults: Readonly<Partial<Record<OptionLabel, string>>>): string;
}

/**
 * Reads `options`: a two-column block (label, value) or text such as `"onset = Michel; turbulence level = 0.2%"`.
 * A label the function does not know is refused with the nearest it knows; a label given twice is refused.
 */
export function readOptions(call: Call, raw: unknown, accepted: readonly OptionLabel[]): Options {
  const values = new Map<OptionLabel, number | string | readonly string[]>();
  for (const { label, value, place } of pairs(call, raw)) {
    const known = accepted.find((a) => a.toLowerCase() === label.toLowerCase().replace(/\s+/g, " "));
    if (known === undefined) {
      throw cellError("#VALUE!", `${call.name} needs options it knows; ${place} has "${label}", nearest is "${nearestWord(label, accepted)}"`);
    }
    if (values.has(known)) throw cellError("#VALUE!", `${call.name} needs each option once; ${place} repeats "${known}"`);
    if (value.kind === "blank") continue;
    values.set(known, valueOf(call, known, value));
  }
  return {
    number: (label) => asKind(values.get(label), "number") as number | undefined,
    word: (label) => asKind(values.get(label), "string") as string | undefined,
    columns: () => values.get("columns") as readonly string[] | undefined,
    settings: (defaults) =>
      accepted
        .filter((label) => label !== "columns" && (values.has(label) || defaults[label] !== undefined))
        .map((label) => `${label} = ${String(values.get(label) ?? defaults[label])}`)
        .join("; "),
  };
}

interface Pair {
  label: string;
  value: CellValue;
  place: string;
}

function pairs(call: Call, raw: unknown): Pair[] {
  const rows = cellRows(raw);
  if (rows === undefined) return [];
  if (rows.length === 1 && rows[0]!.length === 1) return textPairs(call, cellValue(rows[0]![0]));
  if (rows[0]!.length !== 2) {
    throw cellError("#VALUE!", `${call.name} needs options as a block of two columns (label, value) or as text; the range has ${rows[0]!.length} columns`);
  }
  const out: Pair[] = [];
  rows.forEach((row, i) => {
    const label = cellValue(row[0]);
    const address = addressOf(call, "options", i);
    const place = `row ${i + 1}${address === undefined ? "" : ` (${address})`} of options`;
    if (label.kind === "blank" || (label.kind === "number" && label.value === 0)) return;
    if (label.kind !== "text") throw cellError("#VALUE!", `${call.name} needs a label in the first column of options; ${place} ${describeCell(label)}`);
    out.push({ label: label.value.trim(), value: cellValue(row[1]), place });
  });
  return out;
}

function textPairs(call: Call, cell: CellValue): Pair[] {
  if (cell.kind === "blank") return [];
  if (cell.kind !== "text") throw cellError("#VALUE!", `${call.name} needs options as text or as a block of two columns; it ${describeCell(cell)}`);
  return cell.value
    .split(/[;\n]/)
    .map((part) => part.trim())
    .filter((part) => part !== "")
    .map((part) => {
      const at = part.indexOf("=");
      if (at < 1) throw cellError("#VALUE!", `${call.name} needs options in the form label = value; "${part}" has no "="`);
      return { label: part.slice(0, at).trim(), value: cellValue(part.slice(at + 1).trim()), place: "the text" };
    });
}

/** A number with an optional per-cent sign or unit word; decimal point only. */
const NUMBER_TEXT = /^([+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?)\s*(%|[a-z][a-z0-9/^²³·]*)?$/i;
/** Unit words that change nothing in a coherent set of units; scaled ones such as mm would, and are refused. */
const COHERENT = new Set(["m", "m/s", "m2/s", "m²/s", "m^2/s", "ft", "ft/s", "ft2/s", "ft²/s", "ft^2/s"]);

function valueOf(call: Call, label: OptionLabel, value: CellValue): number | string | readonly string[] {
  const rule: OptionKind = OPTION_VOCABULARY[label];
  if (value.kind === "error" || value.kind === "flag") {
    throw cellError("#VALUE!", `${call.name} needs a value for option "${label}"; it ${describeCell(value)}`);
  }
  const written = value.kind === "text" ? value.value.trim() : "";
  switch (rule.kind) {
    case "choice":
      if (value.kind !== "text") throw cellError("#VALUE!", `${call.name} needs option "${label}" as a word; it ${describeCell(value)}`);
      return chosen(call, `option "${label}"`, written, rule.choices);
    case "columns":
      return columnKeys(call, written === "" && value.kind === "number" ? String(value.value) : written);
    case "number":
    case "fraction": {
      const number = value.kind === "number" ? value.value : numberFrom(call, label, written);
      const positive = rule.kind === "number" && rule.positive === true;
      const notNegative = rule.kind === "fraction" || (rule.kind === "number" && rule.notNegative === true);
      if (!Number.isFinite(number) || (positive && !(number > 0)) || (notNegative && number < 0)) {
        throw cellError("#VALUE!", `${call.name} needs option "${label}" ${positive ? "above 0" : "of 0 or more"}; it has ${number}`);
      }
      if (rule.kind === "fraction" && number > 1) {
        throw cellError("#VALUE!", `${call.name} needs option "${label}" as a fraction or with %; it has ${number} (write ${number}% for ${number / 100})`);
      }
      return number;
    }
    case "number or choice":
      if (value.kind === "text" && !NUMBER_TEXT.test(written)) return chosen(call, `option "${label}"`, written, rule.choices);
      return checked(call, label, value.kind === "number" ? value.value : numberFrom(call, label, written), rule.positive === true);
  }
}

function checked(call: Call, label: OptionLabel, number: number, positive: boolean): number {
  if (Number.isFinite(number) && (!positive || number > 0)) return number;
  throw cellError("#VALUE!", `${call.name} needs option "${label}" ${positive ? "above 0" : "as a finite number"}; it has ${number}`);
}

function numberFrom(call: Call, label: OptionLabel, written: string): number {
  const match = NUMBER_TEXT.exec(written);
  if (!match) throw cellError("#VALUE!", `${call.name} needs a number for option "${label}"; it holds "${written}"`);
  const number = Number(match[1]);
  const unit = match[2];
  if (unit === "%") return number / 100;
  if (unit !== undefined && !COHERENT.has(unit.toLowerCase())) {
    throw cellError("#VALUE!", `${call.name} needs option "${label}" in the sheet's own units; "${unit}" would have to be converted`);
  }
  return number;
}

function asKind(value: unknown, kind: "number" | "string"): unknown {
  return typeof value === kind ? value : undefined;
}

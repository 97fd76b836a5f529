import type { Refusal } from "../../numerics/outcome";
import { catalogue } from "../generated/catalogue";

/** What a host tells about the call besides the values: the addresses of the arguments, where it knows them. */
export interface Invoked {
  parameterAddresses?: readonly (string | undefined)[];
}

/** One call of a cell function: its name for sentences, and where its arguments stand. */
export interface Call {
  readonly name: string;
  readonly invoked: Invoked | undefined;
}

/** Begins a call. Every cell function does this first. */
export function openCall(name: string, invocation?: unknown): Call {
  const known = typeof invocation === "object" && invocation !== null;
  return { name, invoked: known ? (invocation as Invoked) : undefined };
}

const CORNER = /^(?:(.*)!)?\$?([A-Z]{1,3})\$?(\d+)(?::\$?([A-Z]{1,3})\$?(\d+))?$/i;

/** Address such as `A11` of an entry of an argument, counted from 0 along the column or row; undefined where unknown. */
export function addressOf(call: Call, argument: string, entry: number): string | undefined {
  const index = catalogue.find((f) => f.name === call.name)?.parameters.findIndex((p) => p.name === argument) ?? -1;
  const match = CORNER.exec(call.invoked?.parameterAddresses?.[index] ?? "");
  if (!match) return undefined;
  const [, , letters, digits, endLetters, endDigits] = match;
  const along = endDigits !== undefined && endDigits === digits && endLetters !== letters ? "row" : "column";
  const column = columnNumber(letters!) + (along === "row" ? entry : 0);
  const row = Number(digits) + (along === "column" ? entry : 0);
  return columnLetters(column) + row;
}

/** Place of a refusal in words: `row 7 (A11)`, `row 7 at 0.35`, `at 0.35`, or "". */
export function placeOf(call: Call, refusal: Pick<Refusal, "row" | "at" | "argument">): string {
  if (refusal.row === undefined) return refusal.at === undefined ? "" : `at ${Number(refusal.at.toPrecision(6))}`;
  const address = refusal.argument === undefined ? undefined : addressOf(call, refusal.argument, refusal.row - 1);
  return address === undefined ? `row ${refusal.row}` : `row ${refusal.row} (${address})`;
}

function columnNumber(letters: string): number {
  let n = 0;
  for (const c of letters.toUpperCase()) n = n * 26 + c.charCodeAt(0) - 64;
  return n;
}

function columnLetters(n: number): string {
  let out = "";
  for (let k = n; k > 0; k = Math.floor((k - 1) / 26)) out = String.fromCharCode(65 + ((k - 1) % 26)) + out;
  return out;
}

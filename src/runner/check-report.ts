import type { StoredValue } from "../workbook/read-sheet";
import type { Changed, Recalculated } from "./recalculate";

/** How far two numbers may lie apart: by this share of the larger, or by this much in their own unit. */
export interface Allowed {
  tolerance: number;
  floor: number;
}

/** Lines for the cells whose stored value is not the calculated one, and a summary. */
export function checkReport({ changes, counts, notes }: Recalculated, allowed: Allowed): { differing: string[]; summary: string } {
  const differing = changes.filter(({ stored, value }) => !alike(stored, value, allowed));
  const left = notes.filter((n) => n.kind !== "error").length;
  const summary = `${counts.formulas} formulas compared, ${left} not calculated here; ${differing.length} cell${differing.length === 1 ? " differs" : "s differ"}`;
  return { differing: differing.map(line), summary };
}

function alike(stored: StoredValue, value: StoredValue, { tolerance, floor }: Allowed): boolean {
  if (typeof stored !== "number" || typeof value !== "number") return false; // equal ones are no changes
  return Math.abs(stored - value) <= Math.max(floor, tolerance * Math.max(Math.abs(stored), Math.abs(value)));
}

function line({ sheet, cell, stored, value }: Changed): string {
  const both = typeof stored === "number" && typeof value === "number";
  const share = both ? `, apart by ${(Math.abs(stored - value) / Math.max(Math.abs(stored), Math.abs(value))).toExponential(1)} of the larger` : "";
  return `${sheet}!${cell}: stored ${words(stored)}, calculated ${words(value)}${share}`;
}

function words(value: StoredValue): string {
  if (value === null) return "nothing";
  if (typeof value === "object") return value.error;
  return typeof value === "string" ? JSON.stringify(value) : typeof value === "boolean" ? String(value).toUpperCase() : String(value);
}

/** Digits a sentence or a note shows. */
const SIGNIFICANT = 6;

/** A number as a sentence shows it: six significant digits, no trailing zeros. */
export function formatNumber(value: number): string {
  return String(Number(value.toPrecision(SIGNIFICANT)));
}

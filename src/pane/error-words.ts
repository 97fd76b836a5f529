/** What the sheet's own codes mean for a WALL cell; a function's own sentence is always better and comes first. */
const MEANINGS: Readonly<Record<string, string>> = {
  "#SPILL!": "The table needs blank cells below and to the right of its first cell: something stands in the way, or the sheet ends.",
  "#NAME?": "A name in this formula is not known here. If it is a WALL function of an older workbook, enter the formula again.",
  "#REF!": "The formula refers to cells that are gone, or to itself.",
  "#DIV/0!": "Something is divided by zero.",
  "#NUM!": "A number is too large, or has no value here.",
  "#NULL!": "Two ranges that are to overlap do not.",
  "#CALC!": "The formula gives no value that a cell can hold.",
  "#BUSY!": "The result is still being calculated.",
};
const NO_REASON = "This host does not pass the reason on; WALL.INPUT_CHECK beside the cell says what is wrong with its inputs.";

/** An error in words: the function's sentence where the host knows it, otherwise what the code means. */
export function errorWords(error: { readonly code: string; readonly sentence: string }): string {
  // A host's own text for these says less than ours.
  if (error.code === "#SPILL!" || error.sentence === "") return `${error.code}: ${MEANINGS[error.code] ?? NO_REASON}`;
  return `${error.code}: ${error.sentence}`;
}

/**
 * Excel's functions that are not calculated here although the engine (19.3.7) may have one of the name, and why: the only list of them. Any
 * other name that the engine does not know counts as unknown.
 */
export const NOT_COMPUTED: Readonly<Record<string, string>> = {
  AREAS: "reads references, not values",
  ISREF: "reads references, not values",
  CELL: "reads the look and place of cells",
  INFO: "reads the program's surroundings",
  SHEET: "counts the book's sheets",
  SHEETS: "counts the book's sheets",
  FORMULATEXT: "shows a formula in the program's own spelling",
  GETPIVOTDATA: "reads a pivot table",
  CUBEVALUE: "reads a data model",
  CUBEMEMBER: "reads a data model",
  CUBESET: "reads a data model",
  IMAGE: "fetches a picture",
  WEBSERVICE: "fetches a page",
  RTD: "listens to another program",
  CALL: "runs another program",
  PHONETIC: "reads the phonetic guides of a text",
  "FORECAST.ETS": "fits in a way that is not published in full",
  "FORECAST.ETS.SEASONALITY": "fits in a way that is not published in full",
  "FORECAST.ETS.CONFINT": "fits in a way that is not published in full",
  "FORECAST.ETS.STAT": "fits in a way that is not published in full",
};

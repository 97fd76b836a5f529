/** One argument of a cell function, as its comment states it. */
export interface CatalogueParameter {
  name: string;
  description: string;
  /** Unit in words or symbols, e.g. `length`, `speed`, `1`. */
  unit: string;
  optional: boolean;
}

/** An executable example: a formula that gives one value. */
export interface CatalogueExample {
  formula: string;
  value: number | string | boolean;
}

/** All that the comment above a cell function says; generated, never written by hand. */
export interface CatalogueEntry {
  /** Name without the namespace, e.g. `THWAITES_MARCH`. */
  name: string;
  family: string;
  purpose: string;
  parameters: readonly CatalogueParameter[];
  gives: string;
  resultUnit: string;
  limits: readonly string[];
  sources: readonly string[];
  examples: readonly CatalogueExample[];
  /** Further words under which a search finds the function. */
  words: readonly string[];
}

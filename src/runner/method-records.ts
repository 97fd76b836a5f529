import { catalogue } from "../cells/generated/catalogue";
import type { MethodRecord } from "../workbook/method-notes";

/** What the catalogue says of every function, for method notes. */
export const METHOD_RECORDS: readonly MethodRecord[] = catalogue.map(({ name, purpose, limits, sources }) => ({ name, purpose, limits, sources }));

import type { Equation } from "./equation";
import { DRAG } from "./drag";
import { LAMINAR } from "./laminar";
import { TRAVERSE } from "./traverse";
import { TURBULENT } from "./turbulent";

/** The equations of each function that has some worth showing. */
export const FUNCTION_EQUATIONS: Readonly<Record<string, readonly Equation[]>> = { ...TRAVERSE, ...LAMINAR, ...TURBULENT, ...DRAG };

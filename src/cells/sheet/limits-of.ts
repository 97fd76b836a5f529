import { openCall } from "../reading/call";
import { catalogueLines } from "./catalogue-lines";

/**
 * States where a WALL function is valid and how far it is off there, one statement a row.
 * @customfunction LIMITS_OF
 * @requiresParameterAddresses
 * @param {any} name Name of a WALL function as text, with or without WALL.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} One statement a row.
 * @family Sheet
 * @unit name text
 * @unit result text
 * @limits Any function of this catalogue; another name gives #N/A with the nearest one.
 * @source The comment above the function itself.
 * @example =ROWS(WALL.LIMITS_OF("LIMITS_OF")) → 1
 * @words validity range accuracy error
 */
export function limitsOf(name: any, invocation: CustomFunctions.Invocation): any[][] {
  return catalogueLines(openCall("LIMITS_OF", invocation), name, (entry) => entry.limits);
}

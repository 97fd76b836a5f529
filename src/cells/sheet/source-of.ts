import { openCall } from "../reading/call";
import { catalogueLines } from "./catalogue-lines";

/**
 * Names the published sources behind a WALL function, one a row.
 * @customfunction SOURCE_OF
 * @requiresParameterAddresses
 * @param {any} name Name of a WALL function as text, with or without WALL.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} One source a row.
 * @family Sheet
 * @unit name text
 * @unit result text
 * @limits Any function of this catalogue; another name gives #N/A with the nearest one.
 * @source The comment above the function itself.
 * @example =LEFT(INDEX(WALL.SOURCE_OF("THWAITES_MARCH"),1),8) → "Thwaites"
 * @words reference literature method citation
 */
export function sourceOf(name: any, invocation: CustomFunctions.Invocation): any[][] {
  return catalogueLines(openCall("SOURCE_OF", invocation), name, (entry) => entry.sources);
}

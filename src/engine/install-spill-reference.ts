/**
 * Seam: `D5#` across sheets. Pinned: @odoo/o-spreadsheet 19.3.7, function `SPILLED.RANGE`, which looks for the spill's cells on
 * the formula's own sheet (`__originSheetId`) and not on the reference's; `Two!D5#` then silently gives what stands on the wrong
 * sheet, mostly blanks.
 *
 * Relies on: the function reading nothing else from `__originSheetId`. How it would break: the test of this file.
 */
import type { EngineArgument, EngineContext, EngineLibrary } from "./types";

const NAME = "SPILLED.RANGE";
const mended = new WeakSet<EngineLibrary>();

/** Lets a spill reference to another sheet read that sheet. A library is changed once. */
export function installSpillReference(library: EngineLibrary): void {
  if (mended.has(library)) return;
  const original = library.registries.functionRegistry.content[NAME];
  if (!original) throw new Error(`The grid library has no function ${NAME}.`);
  const { compute } = original;
  library.registries.functionRegistry.replace(NAME, {
    ...original,
    compute(this: EngineContext, reference: EngineArgument) {
      const sheetId = (Array.isArray(reference) ? reference[0]?.[0] : reference)?.position?.sheetId;
      if (sheetId === undefined || sheetId === this.__originSheetId) return compute.call(this, reference);
      return compute.call(Object.create(this, { __originSheetId: { value: sheetId } }) as EngineContext, reference);
    },
  });
  mended.add(library);
}

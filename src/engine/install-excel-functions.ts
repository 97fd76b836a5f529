/**
 * Seam: Excel's worksheet functions the engine lacks or computes otherwise. Pinned: @odoo/o-spreadsheet 19.3.7, exported
 * `registries.functionRegistry` (`content`, `replace`), `helpers.arg`; numbers from @formulajs/formulajs 4.6.1 where it agrees
 * with an independent reference.
 *
 * Relies on: `replace` rebuilding the callable that formulas find under a name; an argument declared `number` or `any` without
 * `range` being applied to each element of an array by the engine; a function's own argument order.
 * How it would break: `correct` throws for a name that has gone; changed argument orders are caught by the parity table.
 */
import { installAggregate } from "./excel-functions/aggregate";
import { installArrays } from "./excel-functions/arrays";
import { installComplex } from "./excel-functions/complex";
import { installConvert } from "./excel-functions/convert";
import { installCorrections } from "./excel-functions/corrections";
import { installDistributions } from "./excel-functions/distributions";
import { installElementary } from "./excel-functions/elementary";
import { installEngineering } from "./excel-functions/engineering";
import { installFixedBlock } from "./excel-functions/fixed-block";
import { installFits } from "./excel-functions/fits";
import { installOldDates } from "./excel-functions/old-dates";
import { installStatistics } from "./excel-functions/statistics";
import { installTextAndKind } from "./excel-functions/text-and-kind";
import type { EngineLibrary } from "./types";

export function installExcelFunctions(library: EngineLibrary): void {
  installElementary(library);
  installStatistics(library);
  installDistributions(library);
  installEngineering(library);
  installComplex(library);
  installTextAndKind(library);
  installArrays(library);
  installConvert(library);
  installAggregate(library);
  installFits(library);
  installOldDates(library);
  installFixedBlock(library);
  installCorrections(library);
}

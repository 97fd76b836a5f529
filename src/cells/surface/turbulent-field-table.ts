import { fieldLayer } from "../../physics/surface/field-layer";
import type { OnsetChoice } from "../../physics/surface/layer-march";
import { cellError } from "../errors/cell-error";
import { refusalError } from "../errors/sentences";
import { laminarStartShape } from "../laminar/laminar-start-shape";
import type { ReadWall } from "../laminar/read-wall";
import type { Call } from "../reading/call";
import type { Options } from "../reading/read-options";
import type { Cell } from "../writing/spill-table";
import { layerRemarks } from "./layer-remarks";
import { layerTable } from "./layer-table";

/** The table of a field march with an onset. */
export function turbulentFieldTable(call: Call, read: ReadWall, settings: Options, onset: OnsetChoice): Cell[][] {
  const { wall, nu, words } = read;
  if (wall.wallVelocity !== null) throw cellError("#VALUE!", `${call.name} needs a solid wall where an onset is given; wall_velocity is not 0`);
  if (settings.word("Richardson") === "yes") throw cellError("#VALUE!", `${call.name} needs Richardson = no where an onset is given; use grid refinement`);
  const refinement = settings.number("grid refinement") ?? 1;
  const made = fieldLayer(wall, nu, onset, { startMomentumLoss: settings.number("start momentum loss"), startShape: laminarStartShape(call, settings), refinement });
  if (!made.ok) throw refusalError(call, made);
  const { march } = made;
  const used = settings.settings({ "edge fit": "spline", "grid refinement": "1" });
  const from = march.start === "given momentum loss" ? "from a given momentum loss" : `at a ${march.start}`;
  return layerTable(
    call,
    wall.edge,
    march.columns,
    {
      settings: `full boundary-layer equations, eddy viscosity of Cebeci and Smith from the onset, ${words}; ${used}; starts ${from}`,
      remarks: layerRemarks(march, "field"),
      beyond: march.stop.kind.endsWith("limit") ? "out of range" : "separated",
    },
    settings.columns(),
  );
}

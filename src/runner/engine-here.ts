import { existsSync } from "node:fs";
import path from "node:path";
import { loadHeadless } from "../engine/load-headless";
import { prepareEngine } from "../engine/prepare-engine";
import type { Engine } from "../engine/types";
import { wallSheetFunctions } from "../engine/wall-functions";

/** The sheet engine with our functions: its library files lie in `engine/` beside the built program, or in node_modules beside the sources. */
export function engineHere(): Engine {
  const built = path.join(__dirname, "engine");
  return prepareEngine(loadHeadless(existsSync(built) ? built : path.resolve(__dirname, "../..")), wallSheetFunctions());
}

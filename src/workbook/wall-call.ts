/** A called function's name, without `_xlfn.` and upper case, in either spelling of ours: as a file stores it or as a sheet shows it. */
const OWN = /^(?:_XLDUDF_)?WALL[._]/;

/** The function is one of ours. */
export function isWallCall(name: string): boolean {
  return OWN.test(name);
}

/** `_XLDUDF_WALL_EDGE_SPEED` or `WALL.EDGE_SPEED` → `EDGE_SPEED`. */
export function wallFunctionName(name: string): string {
  return name.replace(OWN, "");
}

// Direction of dependence between rooms: numerics ← physics ← cells ← {excel, bench, runner}; pane and chart take plain data.
const rooms = ["numerics", "physics", "cells", "record", "engine", "workbook", "chart", "pane", "excel", "bench", "runner", "help"];
const mayUse = {
  numerics: [],
  physics: ["numerics"],
  cells: ["physics", "numerics"],
  record: ["cells"],
  workbook: [],
  engine: ["cells"],
  chart: [],
  pane: ["chart", "cells"],
  excel: ["cells", "pane", "chart"],
  bench: ["cells", "pane", "chart", "engine", "workbook"],
  runner: ["cells", "engine", "workbook", "chart"],
  help: ["cells", "record", "chart"],
};

/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
  forbidden: [
    ...rooms.map((room) => ({
      name: `${room} uses only ${mayUse[room].join(", ") || "itself"}`,
      severity: "error",
      from: { path: `^src/${room}/` },
      to: { path: "^src/", pathNot: [room, ...mayUse[room]].map((r) => `^src/${r}/`) },
    })),
    {
      name: "numerics, physics and cells use no package (but the spelling distance)",
      severity: "error",
      from: { path: "^src/(numerics|physics|cells)/" },
      to: { pathNot: "node_modules/fastest-levenshtein/", dependencyTypes: ["npm", "npm-dev", "npm-optional", "npm-peer", "npm-no-pkg", "npm-unknown", "core"] },
    },
    {
      name: "chart takes plain data and the d3 scales and shapes, no other package",
      severity: "error",
      from: { path: "^src/chart/" },
      to: { pathNot: "node_modules/(@types/)?d3-(scale|shape)/", dependencyTypes: ["npm", "npm-dev", "npm-optional", "npm-peer", "npm-no-pkg", "npm-unknown", "core"] },
    },
    { name: "only chart draws", severity: "error", from: { path: "^src/", pathNot: "^src/chart/" }, to: { path: "node_modules/(@types/)?d3-" } },
    { name: "no circles", severity: "error", from: {}, to: { circular: true } },
    { name: "no room outside the plan", severity: "error", from: { path: "^src/", pathNot: rooms.map((r) => `^src/${r}/`) }, to: {} },
    { name: "not found", severity: "error", from: {}, to: { couldNotResolve: true } },
  ],
  options: {
    doNotFollow: { path: "node_modules" },
    tsConfig: { fileName: "tsconfig.json" },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: { extensions: [".ts", ".js", ".mjs", ".json"], exportsFields: ["exports"], conditionNames: ["import", "require", "node", "default"] },
  },
};

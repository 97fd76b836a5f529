import { existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { gzipSync } from "node:zlib";
import { Bench } from "tinybench";
import { wallFunctions } from "../../src/cells/generated/functions";
import { edgeCurve } from "../../src/physics/edge/edge-curve";
import { thwaitesMarch } from "../../src/physics/laminar/thwaites-march";
import { wallConditions } from "../../src/physics/laminar/wall-conditions";
import { michel } from "../../src/physics/onset/michel";
import { layerMarch } from "../../src/physics/surface/layer-march";

// `npm run measure`: times per call and per station, the growth exponent, and bundle sizes; a table on the screen and JSON in test/output/.
// The named alternative in the same run is the floor: a bare typed-array trapezoid of ue⁵ over the same columns, without any checking.
const STATIONS = [20, 200, 2_000, 200_000];
const MARCHES = ["THWAITES_MARCH", "ENERGY_MARCH", "FIELD_MARCH", "ENTRAINMENT_MARCH", "LAG_MARCH", "LAYER_MARCH"];
/** LAYER_MARCH is to cost the same a station however many there are. */
const LAYER_STATIONS = [20, 200, 2_000, 20_000];
const MARCH_STATIONS = 200;
const BUNDLES = ["functions.js", "taskpane.js", "bench.js", "wallsheet.js", "functions.json"];
const SHORTEST_MS = 400;

interface Timing {
  stations: number;
  marchMs: number;
  perStationNs: number;
  spreadPercent: number;
  /** Curve and march alone, columns in, columns out. */
  physicsMs: number;
  physicsPerStationNs: number;
  floorMs: number;
  ratioToFloor: number;
}

async function main(): Promise<void> {
  const timings: Timing[] = [];
  for (const n of STATIONS) timings.push(await time(n));
  const sizes = BUNDLES.filter((name) => existsSync(`dist/${name}`)).map((name) => {
    const raw = readFileSync(`dist/${name}`);
    return { name, rawKB: round(raw.length / 1024), gzipKB: round(gzipSync(raw).length / 1024) };
  });
  const first = timings[1]!;
  const last = timings.at(-1)!;
  const exponent = (of: (t: Timing) => number) => Math.log(of(last) / of(first)) / Math.log(last.stations / first.stations);
  const growth = { wholeCall: round(exponent((t) => t.marchMs)), physics: round(exponent((t) => t.physicsMs)) };
  console.log("THWAITES_MARCH, whole cell call (ranges read, marched, table spilled); floor = bare typed-array trapezoid of ue⁵");
  console.table(timings);
  console.log(`growth exponent from ${first.stations} to ${last.stations} stations: whole call ${growth.wholeCall}, physics ${growth.physics}`);
  const marches = await rivals();
  console.log(`marches over ${MARCH_STATIONS} stations, whole cell call; ratio to THWAITES_MARCH of the same run`);
  console.table(marches);
  const layers: LayerTiming[] = [];
  for (const n of LAYER_STATIONS) layers.push(await layerTime(n));
  const layerGrowth = round(Math.log(layers.at(-1)!.physicsMs / layers[1]!.physicsMs) / Math.log(layers.at(-1)!.stations / layers[1]!.stations));
  console.log(`LAYER_MARCH, laminar to Michel's onset, then lag; growth exponent of the physics from ${layers[1]!.stations} to ${layers.at(-1)!.stations} stations: ${layerGrowth}`);
  console.table(layers);
  console.table(sizes);
  mkdirSync("test/output", { recursive: true });
  writeFileSync("test/output/measure.json", JSON.stringify({ node: process.version, timings, growth, marches, layers, layerGrowth, sizes }, null, 2));
}

async function time(n: number): Promise<Timing> {
  // An invented decelerating flow, short of separation.
  const stations = Float64Array.from({ length: n }, (_, i) => i / (n - 1));
  const speed = stations.map((s) => 20 * (1 - 0.1 * s));
  const x = Array.from(stations, (v) => [v]);
  const ue = Array.from(speed, (v) => [v]);
  const march = wallFunctions["THWAITES_MARCH"]!;
  let kept: unknown;
  const bench = new Bench({ time: SHORTEST_MS, warmupTime: SHORTEST_MS / 4, iterations: 3 });
  bench.add("march", () => {
    kept = march(x, ue, 1.5e-5, null, null, {});
  });
  bench.add("physics", () => {
    const made = edgeCurve(stations, speed);
    kept = made.ok ? thwaitesMarch(made.edge, 1.5e-5) : undefined;
  });
  bench.add("floor", () => {
    kept = floor(stations, speed);
  });
  await bench.run();
  if (kept === undefined) throw new Error("nothing was calculated");
  const [a, physics, b] = bench.tasks.map((task) => {
    if (!("latency" in task.result)) throw new Error(`${task.name} did not run`);
    return task.result.latency;
  });
  const marchMs = a!.p50;
  const floorMs = b!.p50;
  return {
    stations: n,
    marchMs: round(marchMs),
    perStationNs: round((1e6 * marchMs) / n),
    spreadPercent: round((100 * (a!.p75 - a!.min)) / marchMs),
    physicsMs: round(physics!.p50),
    physicsPerStationNs: round((1e6 * physics!.p50) / n),
    floorMs: round(floorMs),
    ratioToFloor: round(marchMs / floorMs),
  };
}

interface LayerTiming {
  stations: number;
  callMs: number;
  physicsMs: number;
  physicsPerStationNs: number;
  spreadPercent: number;
}

async function layerTime(n: number): Promise<LayerTiming> {
  const stations = Float64Array.from({ length: n }, (_, i) => i / (n - 1));
  // An invented wing side: quick rise, then a slow fall; onset near a third of the way.
  const speed = stations.map((s) => 20 * (1 + 0.2 * Math.sin(3 * s) - 0.3 * s));
  const x = Array.from(stations, (v) => [v]);
  const ue = Array.from(speed, (v) => [v]);
  const bench = new Bench({ time: SHORTEST_MS, warmupTime: SHORTEST_MS / 4, iterations: 3 });
  bench.add("call", () => void wallFunctions["LAYER_MARCH"]!(x, ue, 4e-6, null, null, {}));
  bench.add("physics", () => {
    const edge = edgeCurve(stations, speed);
    const wall = edge.ok ? wallConditions(edge.edge) : edge;
    if (!wall.ok || !layerMarch(wall.wall, 4e-6, { onset: { kind: "free", criterion: michel, turbulence: 0 } }).ok) throw new Error("nothing was calculated");
  });
  await bench.run();
  const [call, physics] = bench.tasks.map((task) => {
    if (!("latency" in task.result)) throw new Error(`${task.name} did not run`);
    return task.result.latency;
  });
  return {
    stations: n,
    callMs: round(call!.p50),
    physicsMs: round(physics!.p50),
    physicsPerStationNs: round((1e6 * physics!.p50) / n),
    spreadPercent: round((100 * (physics!.p75 - physics!.min)) / physics!.p50),
  };
}

async function rivals(): Promise<{ march: string; medianMs: number; spreadPercent: number; ratio: number }[]> {
  const x = Array.from({ length: MARCH_STATIONS }, (_, i) => [i / (MARCH_STATIONS - 1)]);
  const ue = x.map(([s]) => [20 * (1 - 0.1 * s!)]);
  const bench = new Bench({ time: SHORTEST_MS, warmupTime: SHORTEST_MS / 4, iterations: 3 });
  for (const name of MARCHES) bench.add(name, () => void wallFunctions[name]!(x, ue, 1.5e-5, null, null, ...(name === "ENERGY_MARCH" || name === "FIELD_MARCH" ? [null] : []), {}));
  await bench.run();
  const latency = bench.tasks.map((task) => {
    if (!("latency" in task.result)) throw new Error(`${task.name} did not run`);
    return task.result.latency;
  });
  return MARCHES.map((march, i) => {
    const { p50, p75, min } = latency[i]!;
    return { march, medianMs: round(p50), spreadPercent: round((100 * (p75 - min)) / p50), ratio: round(p50 / latency[0]!.p50) };
  });
}

function floor(x: Float64Array, ue: Float64Array): Float64Array {
  const theta2 = new Float64Array(x.length);
  let sum = 0;
  for (let i = 1; i < x.length; i++) {
    sum += 0.5 * (ue[i]! ** 5 + ue[i - 1]! ** 5) * (x[i]! - x[i - 1]!);
    theta2[i] = (0.45 * 1.5e-5 * sum) / ue[i]! ** 6;
  }
  return theta2;
}

function round(value: number): number {
  return Number(value.toPrecision(4));
}

await main();

import { spawn } from "node:child_process";
import { mkdirSync, readdirSync, writeFileSync } from "node:fs";

// `npm test`: every check in turn, then one line that counts them. A stage without counts of its own counts as one.
interface Stage {
  name: string;
  command: string[];
  /** Reads passed and failed from the stage's output; absent = one check, by exit code. */
  count?: (output: string) => { passed: number; failed: number };
}

const bin = (name: string) => `node_modules/.bin/${name}`;
const stages: Stage[] = [
  { name: "types", command: [bin("tsc"), "--noEmit"] },
  { name: "lint", command: [bin("eslint"), "--max-warnings=0", "--config", ".config/eslint.config.mjs", "."] },
  { name: "layers", command: [bin("depcruise"), "--config", ".config/layers.cjs", "src"] },
  { name: "build", command: [bin("webpack"), "--mode", "production"] },
  {
    name: "unit and property",
    command: [bin("jest"), "--config", ".config/jest.config.cjs"],
    count: (output) => {
      const line = /^Tests:.*$/m.exec(output)?.[0] ?? "";
      return { passed: number(/(\d+) passed/.exec(line)), failed: number(/(\d+) failed/.exec(line)) };
    },
  },
  {
    name: "browser",
    command: [bin("tsx"), "--test", "--test-concurrency=1", ...readdirSync("test/browser").filter((name) => name.endsWith(".test.mts")).map((name) => `test/browser/${name}`)],
    count: (output) => ({ passed: number(/^(?:#|ℹ) pass (\d+)/m.exec(output)), failed: number(/^(?:#|ℹ) fail (\d+)/m.exec(output)) }),
  },
];

function number(match: RegExpExecArray | null): number {
  return match ? Number(match[1]) : 0;
}

function run(stage: Stage): Promise<{ code: number; output: string }> {
  return new Promise((resolve, reject) => {
    const child = spawn(stage.command[0]!, stage.command.slice(1), { stdio: ["ignore", "pipe", "pipe"], shell: false });
    let output = "";
    const take = (data: Buffer) => {
      output += data.toString();
      process.stdout.write(data);
    };
    child.stdout.on("data", take);
    child.stderr.on("data", take);
    child.on("error", reject);
    child.on("close", (code) => resolve({ code: code ?? 1, output }));
  });
}

let passed = 0;
let failed = 0;
const lines: string[] = [];
for (const stage of stages) {
  console.log(`\n== ${stage.name}`);
  const started = Date.now();
  const { code, output } = await run(stage);
  const counted = stage.count?.(output) ?? { passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1 };
  // A stage that ended badly, or that ran nothing, is a failure whatever it printed.
  if (counted.failed === 0 && (code !== 0 || counted.passed === 0)) counted.failed = 1;
  passed += counted.passed;
  failed += counted.failed;
  lines.push(`${stage.name}: ${counted.passed} passed, ${counted.failed} failed, ${((Date.now() - started) / 1000).toFixed(0)} s`);
}
mkdirSync("test/output", { recursive: true });
writeFileSync("test/output/summary.txt", lines.join("\n") + "\n");
console.log("\n" + lines.join("\n"));
console.log(`${passed} passed, ${failed} failed`);
process.exitCode = failed > 0 ? 1 : 0;

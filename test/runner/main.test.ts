import { spawn, spawnSync } from "node:child_process";

/** The command from source, as a process of its own. */
const RUN = ["node_modules/.bin/tsx", "src/runner/main.ts"] as const;

function run(...args: string[]): { status: number | null; out: string; err: string } {
  const { status, stdout, stderr } = spawnSync(RUN[0], [RUN[1], ...args], { encoding: "utf8", timeout: 60_000 });
  return { status, out: stdout, err: stderr };
}

describe("wallsheet", () => {
  it("keeps results on standard output and everything else on standard error", () => {
    expect(run("eval", "=WALL.EDGE_SPEED(-0.5625,20)")).toEqual({ status: 0, out: "25\n", err: "" });
    expect(run("eval", "=WALL.EDGE_SPEED(2,20)")).toEqual({ status: 1, out: "", err: "#VALUE! EDGE_SPEED needs cp of at most 1; row 1 has 2\n" });
    expect(run("recalc", "no-such.xlsx", "-o", "out.xlsx")).toEqual({ status: 2, out: "", err: "wallsheet: cannot read no-such.xlsx: there is no such file or folder\n" });
  }, 120_000);

  it("explains itself", () => {
    const help = run("--help");
    expect(help).toMatchObject({ status: 0, err: "" });
    for (const command of ["recalc", "freeze", "audit", "eval", "list"]) {
      expect(help.out).toContain(`\n  ${command} `);
      const own = run(command, "--help");
      expect(own).toMatchObject({ status: 0, err: "" });
      expect(own.out).toContain(`wallsheet ${command}`);
    }
    expect(run("--version").out).toMatch(/^wallsheet \d+\.\d+\.\d+\n$/);
  }, 120_000);

  it("answers wrong usage in one line, with 2", () => {
    for (const args of [["frob"], ["recalc", "--bogus"], ["list", "A", "B"]]) {
      const { status, out, err } = run(...args);
      expect([status, out]).toEqual([2, ""]);
      expect(err).toMatch(/^wallsheet: [^\n]+--help\n$/);
    }
  }, 120_000);

  it("ends quietly when its reader goes away", async () => {
    const child = spawn(RUN[0], [RUN[1], "list", "--json"], { stdio: ["ignore", "pipe", "pipe"] });
    let complaints = "";
    child.stderr.on("data", (data: Buffer) => (complaints += data.toString()));
    child.stdout.destroy();
    const status = await new Promise((resolve) => child.on("close", resolve));
    expect([status, complaints]).toEqual([0, ""]);
  }, 120_000);
});

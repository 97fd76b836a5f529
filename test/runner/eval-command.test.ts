import { evalCommand } from "../../src/runner/eval-command";

const printed = (...args: string[]) => evalCommand(args);

describe("wallsheet eval", () => {
  it("prints a value, with or without the leading sign", () => {
    // Bernoulli: 20 √(1 + 0.5625) = 25.
    for (const formula of ["=WALL.EDGE_SPEED(-0.5625,20)", "WALL.EDGE_SPEED(-0.5625,20)", " =wall.edge_speed(-0.5625, 20)"]) expect(printed(formula)).toEqual({ status: 0, out: "25\n", complaints: [] });
    expect(printed("-2^2").out).toBe("4\n"); // Excel's precedence
    expect(printed("=1=1").out).toBe("TRUE\n");
  });

  it("prints a table as tab-separated lines, CSV or JSON", () => {
    const table = '={1.5,"a,b";TRUE,"say ""x"""}';
    expect(printed(table).out).toBe('1.5\ta,b\nTRUE\tsay "x"\n');
    expect(printed(table, "--csv").out).toBe('1.5,"a,b"\nTRUE,"say ""x"""\n');
    expect(JSON.parse(printed("--json", table).out)).toEqual([[1.5, "a,b"], [true, 'say "x"']]);
    expect(JSON.parse(printed("--json", "=2+3").out)).toBe(5);
  });

  it("keeps every digit of a number", () => {
    expect(Number(printed("=1/3").out)).toBe(1 / 3);
  });

  it("defuses CSV text that a spreadsheet would run", () => {
    expect(printed('={"=1+1","-x";"@x",-1}', "--csv").out).toBe("'=1+1,'-x\n'@x,-1\n");
  });

  it("tells an error on standard error alone and ends with 1", () => {
    expect(printed("=WALL.EDGE_SPEED(2,20)")).toEqual({ status: 1, out: "", complaints: ["#VALUE! EDGE_SPEED needs cp of at most 1; row 1 has 2"] });
    expect(printed("=1+")).toMatchObject({ status: 1, out: "" });
    expect(printed("={1,#N/A}")).toMatchObject({ status: 1, out: "1\t#N/A\n" });
  });

  it("refuses wrong usage with 2", () => {
    expect(printed()).toMatchObject({ status: 2, out: "" });
    expect(printed("=1", "=2")).toMatchObject({ status: 2 });
    expect(printed("=1", "--csv", "--json")).toMatchObject({ status: 2 });
    expect(printed("--help")).toMatchObject({ status: 0, complaints: [] });
  });
});

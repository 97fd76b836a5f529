import { serverOptions } from "../../../src/bench/server/options";

describe("the bench server's command line", () => {
  test.each([
    ["nothing means a free port", [], {}, { kind: "serve", port: 0 }],
    ["--port N", ["--port", "8123"], {}, { kind: "serve", port: 8123 }],
    ["--port=N", ["--port=8123"], {}, { kind: "serve", port: 8123 }],
    ["PORT", [], { PORT: "8124" }, { kind: "serve", port: 8124 }],
    ["--port before PORT", ["--port", "8123"], { PORT: "8124" }, { kind: "serve", port: 8123 }],
    ["--help", ["--port", "1", "--help"], {}, { kind: "help" }],
  ])("%s", (_, args, environment, expected) => {
    expect(serverOptions(args, environment)).toEqual(expected);
  });

  test.each([
    [["--port", "80a"], 'The bench server needs a port from 0 to 65535; "80a" is none.'],
    [["--port", "65536"], 'The bench server needs a port from 0 to 65535; "65536" is none.'],
    [["--port"], 'The bench server needs a port from 0 to 65535; "" is none.'],
    [["--prot", "1"], 'The bench server does not know "--prot"; --help lists what it knows.'],
  ])("%s is refused in one sentence", (args, sentence) => {
    expect(serverOptions(args, {})).toEqual({ kind: "refused", sentence });
  });
});

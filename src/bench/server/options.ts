/** How the bench server was asked to run. */
export type ServerOptions = { kind: "serve"; port: number } | { kind: "help" } | { kind: "refused"; sentence: string };

const LARGEST_PORT = 65535;

export const USAGE = `Usage: npm start [-- --port N]
       node dist/bench-server.js [--port N]

Serves the bench to this machine only and prints its address.

  --port N   port to listen on; 0 or nothing = a free one (environment: PORT)
  --help     this text
`;

/** Reads the command line; the environment's PORT stands in for --port. */
export function serverOptions(args: readonly string[], environment: Readonly<Record<string, string | undefined>>): ServerOptions {
  let written = environment.PORT;
  for (let i = 0; i < args.length; i++) {
    const argument = args[i]!;
    if (argument === "--help" || argument === "-h") return { kind: "help" };
    if (argument === "--port") written = args[++i] ?? "";
    else if (argument.startsWith("--port=")) written = argument.slice("--port=".length);
    else return { kind: "refused", sentence: `The bench server does not know "${argument}"; --help lists what it knows.` };
  }
  if (written === undefined) return { kind: "serve", port: 0 };
  const port = Number(written);
  if (!/^\d+$/.test(written) || port > LARGEST_PORT) return { kind: "refused", sentence: `The bench server needs a port from 0 to ${LARGEST_PORT}; "${written}" is none.` };
  return { kind: "serve", port };
}

import { createServer, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import { benchHandler } from "./bench-handler";
import { serverOptions, USAGE } from "./options";

// The bench server: `node dist/bench-server.js [--port N]`. Serves the folder it stands in, to this machine only.
const LOOPBACK = "127.0.0.1";

const options = serverOptions(process.argv.slice(2), process.env);
if (options.kind === "help") process.stdout.write(USAGE);
else if (options.kind === "refused") fail(options.sentence, 2);
else serve(options.port);

function serve(port: number): void {
  const server: Server = createServer(benchHandler(__dirname, () => (server.address() as AddressInfo).port));
  server.on("error", (error: NodeJS.ErrnoException) => {
    if (error.code === "EADDRINUSE") fail(`Port ${port} is in use; choose another with --port, or leave it out for a free one.`, 1);
    else if (error.code === "EACCES") fail(`Port ${port} may not be used by this account; choose one above 1023, or leave it out for a free one.`, 1);
    else fail(`The bench server cannot start: ${error.message}.`, 1);
  });
  server.listen(port, LOOPBACK, () => {
    process.stdout.write(`Bench: http://${LOOPBACK}:${(server.address() as AddressInfo).port}/  (this machine only; Ctrl-C ends it)\n`);
  });
  for (const signal of ["SIGINT", "SIGTERM"] as const) {
    process.once(signal, () => {
      server.close();
      server.closeAllConnections();
    });
  }
}

function fail(sentence: string, code: number): void {
  process.stderr.write(sentence + "\n");
  process.exitCode = code;
}

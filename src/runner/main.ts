import { writeSync } from "node:fs";
import project from "../../package.json";
import { auditCommand } from "./audit-command";
import { refused, type CommandResult } from "./command-result";
import { evalCommand } from "./eval-command";
import { freezeCommand } from "./freeze-command";
import { listCommand } from "./list-command";
import { recalcCommand } from "./recalc-command";
import { USAGE } from "./usage";

const COMMANDS: Readonly<Record<string, (args: readonly string[]) => CommandResult>> = { recalc: recalcCommand, freeze: (args) => freezeCommand(args), audit: auditCommand, eval: evalCommand, list: listCommand };

function run(args: readonly string[]): CommandResult {
  const [command, ...rest] = args;
  if (command === undefined) return { status: 2, out: "", complaints: [USAGE.main] };
  if (command === "--help" || command === "-h" || command === "help") return { status: 0, out: USAGE.main + "\n", complaints: [] };
  if (command === "--version" || command === "-V") return { status: 0, out: `wallsheet ${project.version}\n`, complaints: [] };
  const named = COMMANDS[command];
  if (!named) return refused(`there is no command "${command}"; see wallsheet --help`);
  try {
    return named(rest);
  } catch (error) {
    const { code, message } = error as NodeJS.ErrnoException;
    if (code?.startsWith("ERR_PARSE_ARGS")) return refused(`${message.replace(/\. To specify.*$/s, "")}; see wallsheet ${command} --help`);
    throw error; // a fault of ours: Node prints it with its trace
  }
}

/** Writes all of it before the program ends; a reader that has gone away (`| head`) is no fault. */
function print(channel: 1 | 2, text: string): void {
  const bytes = Buffer.from(text);
  for (let at = 0; at < bytes.length; ) {
    try {
      at += writeSync(channel, bytes, at);
    } catch (error) {
      const { code } = error as NodeJS.ErrnoException;
      if (code === "EPIPE") return;
      if (code !== "EAGAIN") throw error;
    }
  }
}

const result = run(process.argv.slice(2));
print(1, result.out);
print(2, result.complaints.map((line) => line + "\n").join(""));
process.exitCode = result.status;

/** What a command has to say to the shell. */
export interface CommandResult {
  status: 0 | 1 | 2;
  /** For standard output. */
  out: string;
  /** For standard error, one line each. */
  complaints: readonly string[];
}

/** Wrong usage or an unreadable file. */
export function refused(sentence: string): CommandResult {
  return { status: 2, out: "", complaints: [`wallsheet: ${sentence}`] };
}

import { closeSync, fsyncSync, openSync, renameSync, rmSync, writeSync } from "node:fs";
import path from "node:path";

/** Writes a file whole or not at all: under another name in the same folder first, then renamed. */
export function writeWhole(file: string, bytes: Uint8Array): void {
  const temporary = path.join(path.dirname(file), `.${path.basename(file)}.${process.pid}.part`);
  const handle = openSync(temporary, "wx");
  try {
    try {
      for (let at = 0; at < bytes.length; ) at += writeSync(handle, bytes, at);
      fsyncSync(handle);
    } finally {
      closeSync(handle);
    }
    renameSync(temporary, file);
  } catch (error) {
    rmSync(temporary, { force: true });
    throw error;
  }
}

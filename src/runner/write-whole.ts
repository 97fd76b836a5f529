import { closeSync, fchmodSync, fsyncSync, openSync, realpathSync, renameSync, rmSync, statSync, writeSync } from "node:fs";
import path from "node:path";

/** Writes a file whole or not at all: under another name in the same folder first, then renamed. A link stays a link, and a file keeps its permissions. */
export function writeWhole(file: string, bytes: Uint8Array): void {
  const old = statSync(file, { throwIfNoEntry: false });
  const target = old ? realpathSync(file) : file;
  if (old && !old.isFile()) throw new Error("it is no ordinary file");
  const temporary = path.join(path.dirname(target), `.${path.basename(target)}.${process.pid}.part`);
  const handle = openSync(temporary, "wx");
  try {
    try {
      if (old) fchmodSync(handle, old.mode);
      for (let at = 0; at < bytes.length; ) at += writeSync(handle, bytes, at);
      fsyncSync(handle);
    } finally {
      closeSync(handle);
    }
    renameSync(temporary, target);
  } catch (error) {
    rmSync(temporary, { force: true });
    throw error;
  }
}

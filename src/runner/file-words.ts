import { statSync } from "node:fs";
import path from "node:path";

/** One file under two names too: links and other spellings of the path. */
export function isSameFile(one: string, other: string): boolean {
  if (path.resolve(one) === path.resolve(other)) return true;
  const [a, b] = [one, other].map((file) => statSync(file, { throwIfNoEntry: false }));
  return a !== undefined && b !== undefined && a.dev === b.dev && a.ino === b.ino;
}

/** What the operating system objects to, in words. */
export function systemWords(error: unknown): string {
  const { code, message } = error as NodeJS.ErrnoException;
  const words: Record<string, string> = {
    ENOENT: "there is no such file or folder",
    EACCES: "permission denied",
    ENOTDIR: "a part of its path is no folder",
    EISDIR: "it is a folder",
    ENOSPC: "the disk is full",
    EROFS: "the disk is read-only",
  };
  return words[code ?? ""] ?? message;
}

import { inflateSync, strFromU8 } from "fflate";
import { crc32 } from "./crc32";
import { WorkbookError } from "./workbook-error";
import { zipDirectory, type ZipEntry } from "./zip-directory";

export { WorkbookError };

/** The parts of a workbook's package, in their order in the file. */
export interface BookPackage {
  parts: Map<string, Uint8Array>;
  /** Each part as it came, packed; a part whose bytes are still the same object is written back as it was. */
  entries: ReadonlyMap<string, { entry: ZipEntry; data: Uint8Array }>;
}

/** Bounds against files made to exhaust the machine; each is far above any workbook an engineer keeps. */
export const PACKAGE_LIMITS = {
  entries: 10_000,
  partBytes: 256 * 1024 * 1024,
  totalBytes: 768 * 1024 * 1024,
  /** Unpacked over packed size; sheets of repeated text reach some 50. */
  ratio: 500,
} as const;
/** Below this size a high ratio does no harm. */
const RATIO_MATTERS = 16 * 1024 * 1024;
/** First bytes of a compound file: books saved with a password, and books of the format before .xlsx. */
const COMPOUND_FILE = [0xd0, 0xcf, 0x11, 0xe0];
const ZIP_FILE = [0x50, 0x4b];

/** Opens a workbook's package. Refuses what is no .xlsx, with the reason in a sentence. */
export function openPackage(bytes: Uint8Array): BookPackage {
  if (startsWith(bytes, COMPOUND_FILE)) throw new WorkbookError("The file is password-protected or an old .xls book: save it as .xlsx without a password.");
  if (!startsWith(bytes, ZIP_FILE)) throw new WorkbookError("The file is not an .xlsx book: it is not a zip package.");
  const directory = zipDirectory(bytes, PACKAGE_LIMITS.entries);
  checkSizes(directory);
  const parts = new Map<string, Uint8Array>();
  const entries = new Map<string, { entry: ZipEntry; data: Uint8Array }>();
  for (const entry of directory) {
    if (parts.has(entry.name)) throw new WorkbookError(`The file is damaged: its part ${entry.name} stands in it twice.`);
    const data = unpacked(entry);
    parts.set(entry.name, data);
    entries.set(entry.name, { entry, data });
  }
  return { parts, entries };
}

/** A part as text; a document type, which could expand without end, is refused. */
export function partText(book: BookPackage, name: string): string {
  const data = book.parts.get(name);
  if (data === undefined) throw new WorkbookError(`The file is damaged: its part ${name} is missing.`);
  if (startsWith(data, [0xff, 0xfe]) || startsWith(data, [0xfe, 0xff])) throw new WorkbookError(`The file is refused: its part ${name} is not written in UTF-8.`);
  const text = strFromU8(data);
  if (/<!DOCTYPE|<!ENTITY/i.test(text)) throw new WorkbookError(`The file is refused: its part ${name} declares a document type, which no workbook program writes.`);
  return text;
}

/** Unpacks into a buffer of the promised size, so that more can never come out; check sum and size must be as promised. */
function unpacked({ name, method, packed, size, crc }: ZipEntry): Uint8Array {
  let data: Uint8Array;
  try {
    data = method === 0 ? packed.slice() : inflateSync(packed, { out: new Uint8Array(size) });
  } catch (error) {
    throw new WorkbookError(`The file is damaged: its part ${name} cannot be unpacked (${(error as Error).message}).`);
  }
  if (data.length !== size) throw new WorkbookError(`The file is damaged: its part ${name} is incomplete.`);
  if (crc32(data) !== crc) throw new WorkbookError(`The file is damaged: the check sum of its part ${name} is wrong.`);
  return data;
}

function checkSizes(entries: readonly ZipEntry[]): void {
  let total = 0;
  for (const { name, packed, size } of entries) {
    total += size;
    if (/^[\\/]|^[a-z]:/i.test(name) || name.split(/[\\/]/).includes("..")) throw new WorkbookError(`The file is refused: its part ${name} points outside the package.`);
    if (size > PACKAGE_LIMITS.partBytes) throw new WorkbookError(`The file is refused: its part ${name} unpacks to more than ${PACKAGE_LIMITS.partBytes / 1024 / 1024} MB.`);
    if (size > RATIO_MATTERS && size > PACKAGE_LIMITS.ratio * Math.max(1, packed.length)) {
      throw new WorkbookError(`The file is refused: its part ${name} unpacks to over ${PACKAGE_LIMITS.ratio} times its size, as no workbook does.`);
    }
  }
  if (total > PACKAGE_LIMITS.totalBytes) throw new WorkbookError(`The file is refused: it unpacks to more than ${PACKAGE_LIMITS.totalBytes / 1024 / 1024} MB.`);
}

function startsWith(bytes: Uint8Array, first: readonly number[]): boolean {
  return bytes.length >= first.length && first.every((byte, i) => bytes[i] === byte);
}

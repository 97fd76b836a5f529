import { strFromU8 } from "fflate";
import { WorkbookError } from "./workbook-error";

/** What the directory of a zip package says of one entry (PKWARE APPNOTE 4.3.12). */
export interface ZipEntry {
  name: string;
  /** The name as written, whose character set the flags tell. */
  nameBytes: Uint8Array;
  flags: number;
  /** 0 stored, 8 deflated. */
  method: number;
  /** MS-DOS date (high half) and time. */
  stamp: number;
  crc: number;
  size: number;
  /** The data as they stand in the file. */
  packed: Uint8Array;
  madeBy: number;
  attributes: number;
}

const END_OF_DIRECTORY = 0x06054b50;
const DIRECTORY_ENTRY = 0x02014b50;
const LOCAL_HEADER = 0x04034b50;
/** Longest comment an end record may carry. */
const LONGEST_COMMENT = 0xffff;
const ENCRYPTED = 1;
const UTF8_NAME = 1 << 11;

/** The entries of a zip package in the order of its directory; at most `limit` of them. */
export function zipDirectory(bytes: Uint8Array, limit: number): ZipEntry[] {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const end = endRecord(view);
  const count = view.getUint16(end + 10, true);
  if (count > limit) throw new WorkbookError(`The file is refused: its package has ${count} parts, more than ${limit}.`);
  const entries: ZipEntry[] = [];
  let at = view.getUint32(end + 16, true);
  for (let i = 0; i < count; i++) {
    if (at + 46 > bytes.length || view.getUint32(at, true) !== DIRECTORY_ENTRY) throw new WorkbookError("The file is damaged: its package's directory is broken.");
    const nameLength = view.getUint16(at + 28, true);
    entries.push(entryAt(bytes, view, at, bytes.subarray(at + 46, at + 46 + nameLength)));
    at += 46 + nameLength + view.getUint16(at + 30, true) + view.getUint16(at + 32, true);
  }
  return entries;
}

function endRecord(view: DataView): number {
  const last = view.byteLength - 22;
  for (let at = last; at >= 0 && at >= last - LONGEST_COMMENT; at--) if (view.getUint32(at, true) === END_OF_DIRECTORY) return at;
  throw new WorkbookError("The file is damaged or cut short: its package has no directory.");
}

function entryAt(bytes: Uint8Array, view: DataView, at: number, nameBytes: Uint8Array): ZipEntry {
  const flags = view.getUint16(at + 8, true);
  const method = view.getUint16(at + 10, true);
  const name = strFromU8(nameBytes, (flags & UTF8_NAME) === 0);
  if (flags & ENCRYPTED) throw new WorkbookError(`The file is refused: its part ${name} is encrypted.`);
  if (method !== 0 && method !== 8) throw new WorkbookError(`The file is refused: its part ${name} is packed by a method no workbook uses (${method}).`);
  const length = view.getUint32(at + 20, true);
  const local = view.getUint32(at + 42, true);
  if (local + 30 > bytes.length || view.getUint32(local, true) !== LOCAL_HEADER) throw new WorkbookError(`The file is damaged: its part ${name} is not where the directory says.`);
  const begin = local + 30 + view.getUint16(local + 26, true) + view.getUint16(local + 28, true);
  if (begin + length > bytes.length) throw new WorkbookError(`The file is damaged: its part ${name} is incomplete.`);
  return {
    name,
    nameBytes,
    flags,
    method,
    stamp: view.getUint32(at + 12, true),
    crc: view.getUint32(at + 16, true),
    size: view.getUint32(at + 24, true),
    packed: bytes.subarray(begin, begin + length),
    madeBy: view.getUint16(at + 4, true),
    attributes: view.getUint32(at + 38, true),
  };
}

import { deflateSync, strToU8 } from "fflate";
import { crc32 } from "./crc32";
import type { BookPackage } from "./open-package";
import type { ZipEntry } from "./zip-directory";

/** Any fixed level makes the same bytes of the same parts; this one is the common default. */
const LEVEL = 6;
const VERSION_NEEDED = 20;
const UTF8_NAME = 1 << 11;
/** Bit 3, sizes behind the data: ours stand before them. */
const SIZES_BEHIND = 1 << 3;
/** 1 January 1980, the first day an entry can hold; a new part bears it, so that the same parts give the same bytes. */
const FIRST_DAY = (1 << 5) | 1;

/** Packs the parts again in their order. An unchanged part keeps its packed bytes and every part its time stamp; the same parts give the same bytes. */
export function writePackage(book: BookPackage): Uint8Array {
  const written: ZipEntry[] = [...book.parts].map(([name, data]) => {
    const old = book.entries.get(name);
    return old?.data === data ? old.entry : packedEntry(name, data, old?.entry);
  });
  const locals = written.map((entry) => 30 + entry.nameBytes.length + entry.packed.length);
  const directoryAt = sum(locals);
  const directorySize = sum(written.map((entry) => 46 + entry.nameBytes.length));
  const out = new Uint8Array(directoryAt + directorySize + 22);
  const view = new DataView(out.buffer);
  let local = 0;
  let central = directoryAt;
  written.forEach((entry, i) => {
    view.setUint32(local, 0x04034b50, true);
    commonFields(view, local + 4, entry);
    out.set(entry.nameBytes, local + 30);
    out.set(entry.packed, local + 30 + entry.nameBytes.length);
    view.setUint32(central, 0x02014b50, true);
    view.setUint16(central + 4, entry.madeBy, true);
    commonFields(view, central + 6, entry);
    view.setUint32(central + 38, entry.attributes, true);
    view.setUint32(central + 42, local, true);
    out.set(entry.nameBytes, central + 46);
    local += locals[i]!;
    central += 46 + entry.nameBytes.length;
  });
  view.setUint32(central, 0x06054b50, true);
  view.setUint16(central + 8, written.length, true);
  view.setUint16(central + 10, written.length, true);
  view.setUint32(central + 12, directorySize, true);
  view.setUint32(central + 16, directoryAt, true);
  return out;
}

/** The fields that local header and directory have in common (PKWARE APPNOTE 4.3.7 and 4.3.12); extra fields are left out. */
function commonFields(view: DataView, at: number, entry: ZipEntry): void {
  view.setUint16(at, VERSION_NEEDED, true);
  view.setUint16(at + 2, entry.flags & ~SIZES_BEHIND, true);
  view.setUint16(at + 4, entry.method, true);
  view.setUint32(at + 6, entry.stamp, true);
  view.setUint32(at + 10, entry.crc, true);
  view.setUint32(at + 14, entry.packed.length, true);
  view.setUint32(at + 18, entry.size, true);
  view.setUint16(at + 22, entry.nameBytes.length, true);
}

function packedEntry(name: string, data: Uint8Array, old: ZipEntry | undefined): ZipEntry {
  const known = old ?? { name, nameBytes: strToU8(name), flags: UTF8_NAME, stamp: FIRST_DAY << 16, madeBy: VERSION_NEEDED, attributes: 0 };
  return { ...known, method: 8, crc: crc32(data), size: data.length, packed: deflateSync(data, { level: LEVEL }) };
}

function sum(numbers: readonly number[]): number {
  return numbers.reduce((total, n) => total + n, 0);
}

// node src/excel/icons/make-icons.mjs: draws the ribbon icons, a wall and the speed profile above it, as plain PNG files.
import { writeFileSync } from "node:fs";
import { crc32, deflateSync } from "node:zlib";

const WALL = [60, 60, 60, 255];
const LAYER = [31, 94, 158, 255];
const NOTHING = [0, 0, 0, 0];

for (const size of [16, 32, 64, 80]) {
  const wall = Math.max(2, Math.round(size / 8));
  const rows = [];
  for (let row = 0; row < size; row++) {
    const height = (size - wall - row) / (size - wall);
    // Blasius-like arrows: the profile u = 1 − (1 − y)² filled in bars, one bar every four rows of a 16-pixel icon.
    const reach = height > 0 ? size * (1 - (1 - height) ** 2) : size;
    const bar = Math.floor((row / size) * 16) % 3 !== 2;
    const line = [0];
    for (let column = 0; column < size; column++) {
      line.push(...(height <= 0 ? WALL : bar && column < reach ? LAYER : NOTHING));
    }
    rows.push(Buffer.from(line));
  }
  writeFileSync(new URL(`icon-${size}.png`, import.meta.url), png(size, Buffer.concat(rows)));
}

function png(size, data) {
  const head = Buffer.alloc(13);
  head.writeUInt32BE(size, 0);
  head.writeUInt32BE(size, 4);
  head.set([8, 6, 0, 0, 0], 8);
  const signature = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
  return Buffer.concat([signature, chunk("IHDR", head), chunk("IDAT", deflateSync(data)), chunk("IEND", Buffer.alloc(0))]);
}

function chunk(type, data) {
  const body = Buffer.concat([Buffer.from(type), data]);
  const out = Buffer.alloc(body.length + 8);
  out.writeUInt32BE(data.length, 0);
  body.copy(out, 4);
  out.writeUInt32BE(crc32(body), body.length + 4);
  return out;
}

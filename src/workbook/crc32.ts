const POLYNOMIAL = 0xedb88320;
const TABLE = Uint32Array.from({ length: 256 }, (_, byte) => {
  let rest = byte;
  for (let bit = 0; bit < 8; bit++) rest = rest & 1 ? (rest >>> 1) ^ POLYNOMIAL : rest >>> 1;
  return rest;
});

/** The check sum of zip packages (ISO 3309, polynomial 0x04C11DB7 reflected). */
export function crc32(data: Uint8Array): number {
  let rest = 0xffffffff;
  for (let i = 0; i < data.length; i++) rest = TABLE[(rest ^ data[i]!) & 0xff]! ^ (rest >>> 8);
  return (rest ^ 0xffffffff) >>> 0;
}

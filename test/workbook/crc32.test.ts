import { crc32 } from "../../src/workbook/crc32";

describe("crc32", () => {
  it("has the check value of its published parameters", () => {
    // CRC-32/ISO-HDLC, check of "123456789" = 0xCBF43926 (R. N. Williams, A painless guide to CRC error detection algorithms, 1993).
    expect(crc32(new TextEncoder().encode("123456789"))).toBe(0xcbf43926);
    expect(crc32(new Uint8Array(0))).toBe(0);
  });
});

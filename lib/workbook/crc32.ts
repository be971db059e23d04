/** CRC-32 as in zip files (polynomial 0xEDB88320, reflected). */
const table = Uint32Array.from({ length: 256 }, (_, index) => {
  let value = index;
  for (let bit = 0; bit < 8; bit += 1) value = value & 1 ? (value >>> 1) ^ 0xedb88320 : value >>> 1;
  return value;
});

/** Goes on from `previous`, so that data can come in pieces; begin with 0. */
export function crc32(bytes: Uint8Array, previous = 0): number {
  let crc = ~previous;
  for (let index = 0; index < bytes.length; index += 1) {
    crc = (crc >>> 8) ^ (table[(crc ^ (bytes[index] ?? 0)) & 0xff] ?? 0);
  }
  return ~crc >>> 0;
}

import { endianness } from 'node:os';

/** Raw points as they lie in the database: 64-bit floats, little endian, in the file's order; NaN at a gap. */
export interface StoredPoints {
  readonly spectrum_id: string;
  readonly x: Buffer;
  readonly y: Buffer;
}

const SWAP = endianness() === 'BE';

export function bytesOfPoints(values: Float64Array): Buffer {
  const bytes = Buffer.from(values.buffer, values.byteOffset, values.byteLength);
  return SWAP ? Buffer.from(bytes).swap64() : bytes;
}

/** Read by copying: the driver hands out buffers that need not begin at a multiple of eight. */
export function pointsOfBytes(bytes: Buffer): Float64Array {
  const copy = new Uint8Array(bytes);
  if (SWAP) Buffer.from(copy.buffer).swap64();
  return new Float64Array(copy.buffer);
}

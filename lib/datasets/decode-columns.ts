/** Reads the numbers of a published series: little-endian Float64 columns, and one byte a flag. */
import type { Flag } from '@/lib/engine/assessment';
import { FLAG_BYTES } from './encode-columns';

const FLOAT_BYTES = 8;

/** The numbers of a column. */
export function decodeNumbers(column: Uint8Array): Float64Array {
  const view = new DataView(column.buffer, column.byteOffset, column.byteLength);
  return Float64Array.from({ length: column.byteLength / FLOAT_BYTES }, (_, i) =>
    view.getFloat64(i * FLOAT_BYTES, true),
  );
}

/** The flags of a series. */
export function decodeFlags(column: Uint8Array): Flag[] {
  return Array.from(column, (code) => FLAG_BYTES[code]);
}

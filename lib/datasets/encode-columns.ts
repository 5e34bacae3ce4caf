/** The numbers of a series as columns: little-endian Float64, one number a point. */
import type { AssessedPoint, Flag } from '@/lib/engine/assessment';

const FLOAT_BYTES = 8;

/** The byte of a flag in the column of flags: its place here. */
export const FLAG_BYTES: readonly Flag[] = ['on-curve', 'warning', 'off-curve'];

/** A column of numbers, the same on every machine. */
export function encodeNumbers(values: readonly number[]): Buffer {
  const buffer = Buffer.allocUnsafe(values.length * FLOAT_BYTES);
  for (const [i, value] of values.entries()) buffer.writeDoubleLE(value, i * FLOAT_BYTES);
  return buffer;
}

/** The column of flags: one byte a point. */
export function encodeFlags(flags: readonly Flag[]): Buffer {
  return Buffer.from(flags.map((flag) => FLAG_BYTES.indexOf(flag)));
}

/** All columns of the points of a series. */
export function encodePoints(points: readonly AssessedPoint[]) {
  const column = (quantity: (point: AssessedPoint) => number) => encodeNumbers(points.map(quantity));
  return {
    energy: column((point) => point.energy),
    energyU: column((point) => point.energyU),
    activity: column((point) => point.activity),
    activityU: column((point) => point.activityU),
    expected: column((point) => point.expected),
    expectedU: column((point) => point.expectedU),
    residualU: column((point) => point.residualU),
    z: column((point) => point.z),
    p: column((point) => point.pValue),
    q: column((point) => point.q),
    flags: encodeFlags(points.map((point) => point.flag)),
  };
}

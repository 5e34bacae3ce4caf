const STEPS = ['bytes', 'KiB', 'MiB', 'GiB'];

/** A size of a file as people write it: `312 bytes`, `1.4 MiB`. */
export function formatBytes(bytes: number): string {
  let size = bytes;
  let step = 0;
  while (size >= 1024 && step < STEPS.length - 1) {
    size /= 1024;
    step += 1;
  }
  return `${step === 0 || size >= 100 ? Math.round(size) : size.toFixed(1)} ${STEPS[step]}`;
}

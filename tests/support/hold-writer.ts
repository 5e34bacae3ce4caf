/** Keeps the one writer of the process busy, as a long write does. */
import { write } from '@/db/client';

/** Begins a write that lasts until the returned function is called, which waits for its end. */
export function holdWriter(): Promise<() => Promise<void>> {
  return new Promise((resolve) => {
    const held = write('acknowledged', () => {
      return new Promise<void>((end) => {
        resolve(async () => {
          end();
          await held;
        });
      });
    });
  });
}

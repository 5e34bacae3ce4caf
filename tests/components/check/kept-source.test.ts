import { afterEach, expect, it, vi } from 'vitest';
import { keepSource, keptSource } from '@/components/check/kept-source';

/** A tab's storage with room for so many characters. */
function storageWithRoom(most: number) {
  const entries = new Map<string, string>();
  return {
    getItem: (key: string) => entries.get(key) ?? null,
    removeItem: (key: string) => entries.delete(key),
    setItem(key: string, value: string) {
      if (value.length > most) throw new Error('QuotaExceededError');
      entries.set(key, value);
    },
  };
}

afterEach(() => vi.unstubAllGlobals());

it('gives back what was kept', () => {
  vi.stubGlobal('sessionStorage', storageWithRoom(1000));
  expect(keptSource()).toBeNull();
  const kept = { source: { text: '{}', name: 'a.json' }, draft: null };
  keepSource(kept);
  expect(keptSource()).toEqual(kept);
});

it('keeps nothing rather than something older where there is no room', () => {
  vi.stubGlobal('sessionStorage', storageWithRoom(100));
  keepSource({ source: { text: 'short', name: null }, draft: null });
  keepSource({ source: { text: 'x'.repeat(200), name: null }, draft: null });
  expect(keptSource()).toBeNull();
});

it('passes over what is not its own', () => {
  vi.stubGlobal('sessionStorage', { ...storageWithRoom(10), getItem: () => '{broken' });
  expect(keptSource()).toBeNull();
});

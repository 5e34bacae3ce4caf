import { expect, it } from 'vitest';
import { describeTimeLeft } from '@/components/ui/time-left';

it.each([
  [0, 'almost done'],
  [4.4, 'about 4 s left'],
  [33, 'about 35 s left'],
  [57, 'about 1 min left'],
  [150, 'about 3 min left'],
])('%d seconds', (seconds, words) => {
  expect(describeTimeLeft(seconds)).toBe(words);
});

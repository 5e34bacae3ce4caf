import { expect, it, vi } from 'vitest';
import { accessTo } from '@/components/deposits/draft-access';
import { withValueAt } from '@/components/deposits/draft-value';

const JUDGED = { title: '', series: [{ points: [{ u: -1 }] }] };
const ERRORS = [
  { pointer: '/title', detail: 'must not be empty' },
  { pointer: '/series/0/points/0/u', detail: 'must be greater than 0' },
];

it('says what is wrong with a place as long as it is as it was judged', () => {
  const changed = withValueAt(JUDGED, '/title', 'now with a title');
  const access = accessTo(changed, JUDGED, ERRORS, vi.fn());
  expect(access.errorAt('/title')).toBeUndefined();
  expect(access.errorAt('/series/0/points/0/u')).toBe('must be greater than 0');
  expect(access.errorAt('/abstract', '/series/0/points/0/u')).toBe('must be greater than 0');
  expect(access.at('/title')).toBe('now with a title');
});

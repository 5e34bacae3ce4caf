import { describe, expect, it } from 'vitest';
import { measuredText, replicatesIn, withMeasured } from '@/components/deposits/measured-entry';

describe('what is typed for an activity', () => {
  it.each([
    ['0.41 0.44 0.40', [0.41, 0.44, 0.4]],
    ['0.41; 0.44;0.40', [0.41, 0.44, 0.4]],
    ['0.41, 0.44, 0.40', [0.41, 0.44, 0.4]],
    ['0.41,0.44', [0.41, 0.44]],
    ['0,41 0,44', [0.41, 0.44]],
    ['−0.01 0.02', [-0.01, 0.02]],
  ])('%s are replicates', (text, numbers) => {
    expect(replicatesIn(text)).toEqual(numbers);
  });

  it.each(['', '0.41', '0,41', '0.41 ', '0.41 about 0.44', '0.41 0.4o'])('“%s” are none', (text) => {
    expect(replicatesIn(text)).toBeNull();
  });

  it('becomes replicates, and one number again, and nothing; the rest of the point stays', () => {
    const point = { ligands: { velline: 1 }, activity: 0.4 };
    const several = withMeasured(point, '0.41 0.44');
    expect(several).toEqual({ ligands: { velline: 1 }, replicates: [0.41, 0.44] });
    expect(measuredText(several)).toBe('0.41 0.44');
    expect(withMeasured(several, '0.41')).toEqual({ ligands: { velline: 1 }, activity: 0.41 });
    expect(withMeasured(several, ' ')).toEqual({ ligands: { velline: 1 } });
    expect(withMeasured(several, 'high')).toEqual({ ligands: { velline: 1 }, activity: 'high' });
  });
});

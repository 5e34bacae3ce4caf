import { describe, expect, it } from 'vitest';
import { isBlock, pastePoints } from '@/components/deposits/paste-points';

const COLUMNS = [['ligands', 'velline'], ['activity'], ['u']];

describe('a pasted block of cells', () => {
  it('is told from the text of one cell', () => {
    expect(isBlock('0.41\t0.02')).toBe(true);
    expect(isBlock('1\n2\n')).toBe(true);
    expect(isBlock('0.41 0.44\n')).toBe(false);
  });

  it('fills cells from its place on, and adds rows', () => {
    const points = [
      { ligands: { velline: 0 }, activity: 0.9 },
      { ligands: { velline: 1 }, activity: 0.8 },
    ];
    const pasted = pastePoints(points, COLUMNS, { row: 1, column: 1 }, '0.7\t0.02\r\n0,6\t0.03\r\n');
    expect(pasted).toEqual({
      points: [
        points[0],
        { ligands: { velline: 1 }, activity: 0.7, u: 0.02 },
        { ligands: {}, activity: 0.6, u: 0.03 },
      ],
      rows: 2,
      left: 0,
    });
  });

  it('takes replicates, leaves a line of heads out, and keeps what is no number to be mended', () => {
    const { points, rows } = pastePoints(
      [],
      COLUMNS,
      { row: 0, column: 0 },
      'velline\tactivity\n1\t0.4 0.5\n2\t0.4l',
    );
    expect(rows).toBe(2);
    expect(points).toEqual([
      { ligands: { velline: 1 }, replicates: [0.4, 0.5] },
      { ligands: { velline: 2 }, activity: '0.4l' },
    ]);
  });

  it('says how many columns did not fit', () => {
    expect(pastePoints([], COLUMNS, { row: 0, column: 1 }, '0.4\t0.02\tnote\n').left).toBe(1);
  });
});

import { describe, expect, it } from 'vitest';
import { shortWhys, whyItMisses } from '@/components/reasons/reason-sentence';
import type { Misreading, SeriesAssessment, Shape, ShapeKind } from '@/lib/engine/assessment';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import { NO_SHAPE, reasoned } from '@/tests/support/reasoned-dataset';

const MISSES = { rmsZ: 14.23, pValue: 0 };

/** Sentences with ordinary spaces, as they are read. */
const plain = (text: string) => text.replaceAll('\u00a0', ' ');

function sentencesOf(
  found: Partial<SeriesAssessment>,
  place = 0,
  change?: (document: DatasetDocument) => void,
) {
  const why = whyItMisses(reasoned({ series: { [place]: { ...MISSES, ...found } }, change }));
  return why.series.flatMap(({ reasons }) => reasons.map(({ text }) => plain(text)));
}

const convention = (misreading: Misreading, rmsZ = 0.9) => ({
  conventions: [{ ...misreading, rmsZ, deltaSumZ2: -400 }],
});

function shapeOf(
  kind: ShapeKind,
  ...estimates: [Shape['alternatives'][0]['estimates'][0]['name'], number, number][]
) {
  const alternative = {
    kind,
    estimates: estimates.map(([name, value, u]) => ({ name, value, u })),
    deltaAIC: -40,
  };
  return { shape: { best: kind, allowedByStatements: 0.1873, alternatives: [alternative] } };
}

describe('a misread convention, as a sentence', () => {
  it('names the orientation that was not stated, of an energy and of a ratio', () => {
    // wild type states inactive − active in kT, S88N the ratio inactive / active.
    expect(sentencesOf(convention({ misreading: 'gap-orientation' }))).toEqual([
      'Reading the gap as active − inactive brings RMS z from 14.2 to 0.90.',
    ]);
    expect(sentencesOf(convention({ misreading: 'gap-orientation' }), 2)).toEqual([
      'Reading the ratio as active / inactive brings RMS z from 14.2 to 0.90.',
    ]);
  });

  it('says the number and the unit of a gap', () => {
    expect(sentencesOf(convention({ misreading: 'gap-unit', unit: 'kT' }, 1.234), 1)).toEqual([
      'Reading −8.2 as kT, not kJ/mol, brings RMS z from 14.2 to 1.23.',
    ]);
    expect(sentencesOf(convention({ misreading: 'log-ratio', base: '10' }), 2)).toEqual([
      'Reading the ratio’s 0.4 as its common logarithm, log10 L, brings RMS z from 14.2 to 0.90.',
    ]);
  });

  it.each([
    [1000, 'Multiplying the stated concentrations by 1000 (as if they were in mM, not µM) brings'],
    [1e6, 'Multiplying the stated concentrations by a million (as if they were in M, not µM) brings'],
    [1e-3, 'Dividing the stated concentrations by 1000 (as if they were in nM, not µM) brings'],
    [1e-6, 'Dividing the stated concentrations by a million (as if they were in pM, not µM) brings'],
  ])('says what a scale of %d stands for', (factor, beginning) => {
    const [sentence] = sentencesOf(convention({ misreading: 'concentration-scale', factor }));
    expect(sentence).toBe(`${beginning} RMS z from 14.2 to 0.90.`);
  });

  it('leaves out a unit that has no neighbour', () => {
    const inTorr = (document: DatasetDocument) => {
      document.ligands[0].unit = 'Torr';
    };
    const [sentence] = sentencesOf(
      convention({ misreading: 'concentration-scale', factor: 1000 }),
      0,
      inTorr,
    );
    expect(sentence).toBe('Multiplying the stated concentrations by 1000 brings RMS z from 14.2 to 0.90.');
  });

  it('says the others without a word of the code', () => {
    const all: Misreading[] = [
      { misreading: 'gap-scope' },
      { misreading: 'swapped-constants' },
      { misreading: 'inverted-activity' },
      { misreading: 'association-constants' },
    ];
    const sentences = all.flatMap((one) => sentencesOf(convention(one)));
    expect(sentences).toEqual([
      'Reading the gap as per site, not of the whole complex, brings RMS z from 14.2 to 0.90.',
      'Exchanging the two constants, inactive for active, brings RMS z from 14.2 to 0.90.',
      'Reading 1 − activity in place of activity brings RMS z from 14.2 to 0.90.',
      'Reading each constant as an association constant, 1/K, brings RMS z from 14.2 to 0.90.',
    ]);
    for (const sentence of sentences) expect(sentence).not.toMatch(/[a-z]-[a-z]+-[a-z]|gap-|-constants/);
  });

  it('stands once, for the dataset, where every series shows it', () => {
    const finding = { misreading: 'gap-orientation' as const, rmsZ: 0.9, deltaSumZ2: -400 };
    const own = { misreading: 'swapped-constants' as const, rmsZ: 1.4, deltaSumZ2: -300 };
    const series = Object.fromEntries(
      [0, 1, 2, 3].map((i) => [i, { ...MISSES, conventions: i === 1 ? [finding, own] : [finding] }]),
    );
    const why = whyItMisses(reasoned({ series, summary: { rmsZ: 20.1, conventions: [finding] } }));
    // The orientations that the four state differ.
    expect(why.dataset.map(({ text }) => text)).toEqual([
      'Reading the gap the other way round brings RMS z from 20.1 to 0.90.',
    ]);
    expect(why.dataset[0].trial?.reading).toMatchObject({
      kind: 'convention',
      series: ['wt', 'T61A', 'S88N', 'G143C'],
    });
    expect(why.series.map(({ label, reasons }) => [label, reasons.map(({ text }) => text)])).toEqual([
      ['T61A', ['Exchanging the two constants, inactive for active, brings RMS z from 14.2 to 1.40.']],
    ]);
  });
});

describe('a shape, as a sentence', () => {
  it('has its estimate to the digits that its uncertainty justifies, and what the statements would allow', () => {
    expect(sentencesOf(shapeOf('offset', ['offset', -1.2034, 0.081]))).toEqual([
      'An offset of −1.203 ± 0.081 kT would bring it nearest to the curve; the stated uncertainties alone explain about 0.19 kT (one standard uncertainty).',
    ]);
  });

  it.each<[ShapeKind, Parameters<typeof shapeOf>[1][], string]>([
    ['slope', [['slope', 0.72, 0.043]], 'A response 0.720 ± 0.043 times as steep as stated (a slope)'],
    ['ceiling', [['ceiling', 0.82, 0.012]], 'A ceiling at 0.820 ± 0.012, in place of 1,'],
    ['floor', [['floor', -0.05, 0.011]], 'A floor at −0.050 ± 0.011, in place of 0,'],
    ['stock', [['stock', 1.92, 0.13]], 'A stock 1.92 ± 0.13 times as concentrated as stated'],
    [
      'floor+ceiling',
      [
        ['floor', 0.08, 0.012],
        ['ceiling', 0.82, 0.013],
      ],
      'A floor at 0.080 ± 0.012 and a ceiling at 0.820 ± 0.013, in place of 0 and 1,',
    ],
  ])('says a %s', (kind, estimates, beginning) => {
    expect(sentencesOf(shapeOf(kind, ...estimates))).toEqual([
      `${beginning} would bring it nearest to the curve.`,
    ]);
  });

  it('comes after a misreading that explains the same', () => {
    expect(
      sentencesOf({
        ...convention({ misreading: 'gap-orientation' }),
        ...shapeOf('offset', ['offset', -4.8, 0.1]),
      }),
    ).toEqual([
      'Reading the gap as active − inactive brings RMS z from 14.2 to 0.90.',
      'Or: an offset of −4.80 ± 0.10 kT would bring it nearest to the curve; the stated uncertainties alone explain about 0.19 kT (one standard uncertainty).',
    ]);
  });
});

describe('whether anything is said', () => {
  it('nothing of a series that lies on the curve', () => {
    const data = reasoned({});
    expect(whyItMisses(data)).toEqual({ dataset: [], series: [] });
    expect(shortWhys(data)).toEqual([null, null, null, null]);
  });

  it('that nothing explains a rejected series, with nothing to try', () => {
    const why = whyItMisses(reasoned({ series: { 3: MISSES } }));
    expect(why.series).toMatchObject([
      {
        index: 3,
        label: 'G143C',
        reasons: [
          {
            text: 'No single misreading and no offset, slope, ceiling, floor or stock explains it.',
            trial: null,
          },
        ],
      },
    ]);
  });

  it('nor of a series without p whose RMS z is 3 or less, but of one above', () => {
    expect(sentencesOf({ pValue: null, rmsZ: 2.9 })).toEqual([]);
    expect(sentencesOf({ pValue: null, rmsZ: 3.1 })).toHaveLength(1);
  });

  it('that a series whose parameters were fitted here is no test', () => {
    expect(sentencesOf({ origin: 'fitted-here', ...shapeOf('slope', ['slope', 0.7, 0.04]) })).toContain(
      'Its parameters were fitted to these very points, so it is no test of the curve.',
    );
  });

  it('the note on its scaling, with the way back to the range that the statements predict', () => {
    const detail = 'The series is scaled to its own range.';
    const why = whyItMisses(
      reasoned({ series: { 2: { ...MISSES, notes: [{ code: 'normalisation', detail }] } } }),
    );
    const reason = why.series[0].reasons.find(({ text }) => text === detail);
    // S88N: 1/(1 + 0.4) = 0.714 without ligand; nothing is left at 1 mM.
    const reading = reason?.trial?.reading;
    if (reading?.kind !== 'range') throw new Error('The scaling cannot be tried.');
    expect(reading.series).toBe('S88N');
    expect(reading.high).toBeCloseTo(0.7143, 3);
    expect(reading.low).toBeLessThan(1e-4);
  });

  it('in a few words for the row', () => {
    const data = reasoned({
      series: {
        0: { ...MISSES, ...convention({ misreading: 'gap-orientation' }) },
        1: { ...MISSES, ...shapeOf('offset', ['offset', -1.2034, 0.08]) },
        2: MISSES,
        3: { ...MISSES, ...convention({ misreading: 'concentration-scale', factor: 1000 }) },
      },
    });
    expect(shortWhys(data)).toEqual(['gap reversed?', 'offset −1.2 kT', null, 'concentrations × 1000?']);
  });

  it('nothing where an older engine recorded no reasons', () => {
    const { shape: _, conventions: __, ...older } = { ...MISSES, shape: NO_SHAPE, conventions: [] };
    const data = reasoned({ series: { 0: older } });
    for (const { assessed } of data.series) {
      Object.assign(assessed, { shape: undefined, conventions: undefined });
    }
    expect(whyItMisses(data).series).toEqual([]);
  });
});

describe('an offset that all series have', () => {
  const places = reasoned({}).series.length;
  const offsets = (values: readonly number[]) =>
    Object.fromEntries(
      values.map((value, i) => [i, { ...MISSES, ...shapeOf('offset', ['offset', value, 0.08]) }]),
    );
  const shared = (values: readonly number[]) =>
    whyItMisses(reasoned({ series: offsets(values) })).dataset.map(({ text }) => plain(text));

  it('is said once, as a cause to look for', () => {
    const values = Array.from({ length: places }, (_, i) => -1.2 + i / 100);
    const range = `−1.20 to −${(1.2 - (places - 1) / 100).toFixed(2)} kT`;
    expect(shared(values)).toEqual([
      `Each is brought nearer to the curve by an offset of ${range}: look for a cause that they share.`,
    ]);
  });

  it('is not said where one differs in sign or size, or has none', () => {
    const like = Array.from({ length: places }, () => -1.2);
    expect(shared([...like.slice(1), 1.2])).toEqual([]);
    expect(shared([...like.slice(1), -3])).toEqual([]);
    expect(shared(like.slice(1))).toEqual([]);
  });
});

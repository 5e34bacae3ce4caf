import { describe, expect, it } from 'vitest';
import { checkFree } from '@/lib/documents/check-free';
import type { FreeParameter } from '@/lib/engine/free-parameters';
import { contractDocument } from '@/tests/support/contract-document';

const GAP: FreeParameter = { parameter: 'gap', share: 'series' };
const INACTIVE: FreeParameter = {
  parameter: 'inactive',
  siteClass: 'main',
  ligand: 'velline',
  share: 'dataset',
};
const errorsOf = (...free: FreeParameter[]) => checkFree(contractDocument(), free);

describe('parameters to be freed', () => {
  it('may be any that the document states', () => {
    expect(
      errorsOf(
        GAP,
        INACTIVE,
        { ...INACTIVE, parameter: 'active' },
        { parameter: 'sites', siteClass: 'main', share: 'series' },
        { parameter: 'slope', modulator: 'V', share: 'dataset' },
      ),
    ).toEqual([]);
  });

  it.each<[string, FreeParameter, string, RegExp]>([
    ['a ligand left out', { ...INACTIVE, ligand: undefined }, '/ligand', /belongs to a ligand; name it/],
    ['a name too many', { ...GAP, modulator: 'V' }, '/modulator', /gap belongs to no modulator; leave/],
    ['an unknown class', { ...INACTIVE, siteClass: 'mian' }, '/siteClass', /did you mean “main”\?/],
    ['an unknown ligand', { ...INACTIVE, ligand: 'other' }, '/ligand', /ligand “other”; there is “velline”/],
    [
      'an unknown modulator',
      { parameter: 'slope', modulator: 'pH', share: 'series' },
      '/modulator',
      /there is “V”/,
    ],
    [
      'a gap that nobody states',
      { parameter: 'gapPerSite', siteClass: 'main', share: 'series' },
      '/parameter',
      /free gap/,
    ],
  ])('%s is named', (_, parameter, place, detail) => {
    const errors = errorsOf({ ...INACTIVE, parameter: 'active' }, parameter).filter(({ pointer }) =>
      pointer.startsWith('/free/1'),
    );
    expect(errors).toEqual([{ pointer: `/free/1${place}`, detail: expect.stringMatching(detail) }]);
  });

  it('are constants that exist', () => {
    const document = contractDocument();
    for (const { parameters } of document.series) parameters.siteClasses[0].binding[0].active = null;
    const [error, ...others] = checkFree(document, [{ ...INACTIVE, parameter: 'active' }]);
    expect(others).toEqual([]);
    expect(error.pointer).toBe('/free/0/parameter');
    expect(error.detail).toContain('not to bind the active state');
  });

  it('are bound by the class that is named', () => {
    const document = contractDocument();
    document.ligands.push({ ...document.ligands[0], id: 'other' });
    const [error] = checkFree(document, [{ ...INACTIVE, ligand: 'other' }]);
    expect(error).toEqual({ pointer: '/free/0/ligand', detail: 'no site class “main” binds “other”' });
  });

  it('are freed once each, however they are shared', () => {
    expect(errorsOf(INACTIVE, GAP, { ...INACTIVE, share: 'series' })).toEqual([
      { pointer: '/free/2', detail: expect.stringContaining('already stands at /free/0') },
    ]);
  });

  it('are at least one, and at most 40 values', () => {
    expect(errorsOf()).toEqual([{ pointer: '/free', detail: expect.stringContaining('at least one') }]);
    const document = contractDocument();
    const [first] = document.series;
    document.series = Array.from({ length: 41 }, (_, i) => ({ ...structuredClone(first), id: `s${i}` }));
    expect(checkFree(document, [GAP])).toEqual([
      {
        pointer: '/free',
        detail: expect.stringContaining('at most 40 values are fitted at once; these come to 41'),
      },
    ]);
    expect(checkFree(document, [{ ...GAP, share: 'dataset' }])).toEqual([]);
  });

  it('are all judged at once', () => {
    const wrong: FreeParameter = { parameter: 'slope', modulator: 'x', share: 'series' };
    expect(errorsOf(wrong, { ...GAP, ligand: 'velline' }, wrong).map(({ pointer }) => pointer)).toEqual([
      '/free/0/modulator',
      '/free/1/ligand',
      '/free/2/modulator',
    ]);
  });
});

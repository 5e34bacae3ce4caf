import { MathSymbol as S } from '@/components/ui/math-symbol';
import { InlineEquation } from './equation';
import { MethodsSection } from './methods-section';
import { PlainTable } from './plain-table';

/** The discrete misreadings, and when one is reported. */
export function ConventionsSection() {
  return (
    <MethodsSection id="conventions">
      <p>
        Laboratories state the same physics in different ways, and a statement that was meant in another way
        than it was entered moves all points of a series. A series that is rejected as stated (<S>p</S> of{' '}
        <S>Q</S> below 0.001, or RMS <S>z</S> above 3 where there is no <S>p</S>) is therefore read in every
        way of this list:
      </p>
      <PlainTable
        caption="Misreadings that are tried"
        heads={['what may have been meant', 'what is tried']}
        rows={[
          {
            key: 'orientation',
            cells: ['the opposite orientation of the gap', 'every gap reversed; slopes stay'],
          },
          {
            key: 'scope',
            cells: [
              'the gap per site, or of the whole complex',
              <>
                <InlineEquation tex="g_0" /> becomes <InlineEquation tex="g_0 \sum n_s" />, or{' '}
                <InlineEquation tex="g_s" /> becomes <InlineEquation tex="g_s / n_s" />; not where both are
                stated
              </>,
            ],
          },
          {
            key: 'constants',
            cells: ['the constants of the other state', 'both exchanged in every class of sites'],
          },
          {
            key: 'activity',
            cells: ['inactivity in place of activity', <InlineEquation key="e" tex="a \to 1 - a" />],
          },
          {
            key: 'scale',
            cells: ['concentrations in another unit', 'all times 1000 or a million, or divided by it'],
          },
          { key: 'unit', cells: ['the gap in another unit', 'its number read in kT, kJ/mol, kcal/mol, meV'] },
          {
            key: 'association',
            cells: ['association constants', <InlineEquation key="e" tex="K \to 1/K" />],
          },
          {
            key: 'logarithm',
            cells: ['the logarithm of a ratio', 'the ratio’s number read as its common or natural logarithm'],
          },
        ]}
      />
      <p>
        A reading is reported where it brings RMS <S>z</S> to at most 2 and the sum of{' '}
        <InlineEquation tex="z^2" /> at least 20 below what it was. Several may be; the one with the lowest
        RMS <S>z</S> comes first. What every series of a dataset shows is said once, for the dataset. A
        reading is offered and never applied by itself: whoever deposited the data knows what was meant.
      </p>
    </MethodsSection>
  );
}

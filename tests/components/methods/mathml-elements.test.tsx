import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import MethodsPage from '@/app/methods/page';
import { mathmlElements } from '@/components/methods/mathml-elements';
import { SECTIONS } from '@/components/methods/sections';
import { POLICY } from '@/lib/engine/flags';

const write = (tex: string) => renderToStaticMarkup(mathmlElements(tex, true));

describe('an equation', () => {
  it('is MathML without inline styles', () => {
    const html = write('\\begin{aligned} a &= \\frac{1}{2} \\\\ b &< 3 \\end{aligned}');
    expect(html).toMatch(/^<math .*<\/math>$/);
    expect(html).not.toContain(' style=');
    expect(html).toContain('&lt;');
  });

  it('sets single letters in italic, names and upright letters not', () => {
    const html = write('K_\\mathrm{I} = \\ln c');
    expect(html).toContain('<mi class="letter">K</mi>');
    expect(html).toContain('<mi class="letter">c</mi>');
    expect(html).toContain('<mi>ln</mi>');
    expect(html).not.toContain('class="letter">I<');
  });

  it('refuses TeX that it cannot read', () => {
    expect(() => write('\\frac{1')).toThrow();
  });
});

describe('the methods page', () => {
  const html = renderToStaticMarkup(<MethodsPage />);

  it('has an address for every entry of its contents', () => {
    for (const { id } of SECTIONS) {
      expect(html).toContain(`href="#${id}"`);
      expect(html).toContain(`id="${id}"`);
    }
  });

  it('has no inline style, no radical and no unread TeX', () => {
    expect(html).not.toMatch(/ style=|<msqrt|\\[a-z]+/);
  });

  it('states the limits of the policy in full', () => {
    expect(html).toContain(String(POLICY.warningBelow));
    expect(html).toContain(String(POLICY.offCurveBelow));
  });
});

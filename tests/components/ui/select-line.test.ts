import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { selectLine } from '@/components/ui/select-line';

/** What is used of a text area. */
function areaOf(value: string) {
  const area = {
    value,
    scrollTop: -1,
    clientHeight: 100,
    selected: '',
    focused: false,
    focus() {
      area.focused = true;
    },
    setSelectionRange(start: number, end: number) {
      area.selected = area.value.slice(start, end);
    },
  };
  return area;
}

function select(value: string, line: number, column: number | null) {
  const area = areaOf(value);
  selectLine(area as unknown as HTMLTextAreaElement, line, column);
  return area;
}

describe('selecting a line', () => {
  beforeEach(() => vi.stubGlobal('getComputedStyle', () => ({ lineHeight: '20px' })));
  afterEach(() => vi.unstubAllGlobals());

  it('selects the whole line, or from a column to its end', () => {
    expect(select('one\ntwo words\nthree', 2, null)).toMatchObject({ selected: 'two words', focused: true });
    expect(select('one\ntwo words\nthree', 2, 5).selected).toBe('words');
    expect(select('one\ntwo', 1, 1).selected).toBe('one');
  });

  it('stays within the text', () => {
    expect(select('one\ntwo', 9, null).selected).toBe('two');
    expect(select('one\ntwo', 1, 40).selected).toBe('');
  });

  it('scrolls the line to the middle, and not above the top', () => {
    const text = Array.from({ length: 100 }, (_, i) => `line ${i + 1}`).join('\n');
    const area = select(text, 51, null);
    expect(area.selected).toBe('line 51');
    expect(area.scrollTop).toBe(960);
    expect(select(text, 1, null).scrollTop).toBe(0);
  });
});

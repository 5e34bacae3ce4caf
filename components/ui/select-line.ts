/**
 * Selects a line of a text area and scrolls it into view.
 *
 * @param line from 1
 * @param column from 1; the selection runs from there to the end of the line
 */
export function selectLine(area: HTMLTextAreaElement, line: number, column: number | null): void {
  const lines = area.value.split('\n');
  const index = Math.min(line, lines.length) - 1;
  const start = lines.slice(0, index).reduce((sum, text) => sum + text.length + 1, 0);
  const from = Math.min((column ?? 1) - 1, lines[index].length);
  area.focus();
  area.setSelectionRange(start + from, start + lines[index].length);
  const lineHeight = Number.parseFloat(getComputedStyle(area).lineHeight);
  area.scrollTop = Math.max(0, (index + 0.5) * lineHeight - area.clientHeight / 2);
}

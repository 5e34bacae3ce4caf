import type { MouseEvent } from 'react';

/** Whether a click on a link is meant for this page, and not for a new tab or window. */
export function isPlainClick(event: MouseEvent): boolean {
  return event.button === 0 && !(event.metaKey || event.ctrlKey || event.shiftKey || event.altKey);
}

'use client';

import { useEffect } from 'react';

const WORDS =
  'Your last changes are not saved. They are kept in this browser tab, not on the server. Leave without saving?';

/** Asks before a page with unsaved changes is left: by the browser's own question, or by a link of the site. */
export function useLeaveWarning(isDirty: boolean): void {
  useEffect(() => {
    if (!isDirty) return;
    const beforeUnload = (event: BeforeUnloadEvent) => event.preventDefault();
    const follow = (event: MouseEvent) => {
      if (!leaves(event) || window.confirm(WORDS)) return;
      event.preventDefault();
      event.stopPropagation();
    };
    window.addEventListener('beforeunload', beforeUnload);
    // Before the router's own listener, which would already be on its way.
    document.addEventListener('click', follow, { capture: true });
    return () => {
      window.removeEventListener('beforeunload', beforeUnload);
      document.removeEventListener('click', follow, { capture: true });
    };
  }, [isDirty]);
}

/** Whether a click follows a link to another page of the site in this tab; others meet the browser's own question. */
function leaves(event: MouseEvent): boolean {
  if (event.defaultPrevented || event.button !== 0 || event.metaKey || event.ctrlKey || event.shiftKey)
    return false;
  const link = event.target instanceof Element ? event.target.closest('a') : null;
  if (link === null || link.target === '_blank' || link.hasAttribute('download')) return false;
  return link.origin === window.location.origin && link.pathname !== window.location.pathname;
}

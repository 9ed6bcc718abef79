'use client';

import { useEffect } from 'react';

const QUESTION = 'What you changed is not saved. Leave without saving?';

/** While `unsaved`, asks before the page is closed or a link leads away from it. */
export function useUnsavedWarning(unsaved: boolean): void {
  useEffect(() => {
    if (!unsaved) return;
    const onUnload = (event: BeforeUnloadEvent) => event.preventDefault();
    const onClick = (event: MouseEvent) => {
      const link = event.target instanceof Element ? event.target.closest('a[href]') : null;
      const leads = link && !link.getAttribute('href')?.startsWith('#') && !link.getAttribute('target');
      if (!leads || event.ctrlKey || event.metaKey || event.shiftKey) return;
      if (window.confirm(QUESTION)) return;
      event.preventDefault();
      event.stopPropagation();
    };
    window.addEventListener('beforeunload', onUnload);
    document.addEventListener('click', onClick, true);
    return () => {
      window.removeEventListener('beforeunload', onUnload);
      document.removeEventListener('click', onClick, true);
    };
  }, [unsaved]);
}

import { type RefObject, useEffect } from 'react';

const APART = 12;
/** From here on the margin stands beside the sheet; below, it folds under each section. */
const BESIDE = '(min-width: 1024px)';

/**
 * Lets remarks stand beside what they are about without tearing the text apart: each margin begins at its row, or
 * below the one before where that is longer. Sets --push on each, by how much it had to give way.
 */
export function useMarginFlow(page: RefObject<HTMLElement | null>): void {
  useEffect(() => {
    const sheet = page.current;
    if (!sheet) return;
    const beside = matchMedia(BESIDE);
    const place = () => {
      const top = sheet.getBoundingClientRect().top;
      let bottom = 0;
      for (const margin of sheet.querySelectorAll<HTMLElement>('[data-margin-slot]')) {
        const height = (margin.firstElementChild as HTMLElement | null)?.offsetHeight ?? 0;
        if (height === 0) continue;
        const row = margin.getBoundingClientRect().top - top;
        const at = Math.max(row, bottom);
        const push = beside.matches ? Math.round(at - row) : 0;
        margin.style.setProperty('--push', `${push}px`);
        margin.toggleAttribute('data-pushed', push > 0);
        bottom = at + height + APART;
      }
      sheet.style.minHeight = beside.matches ? `${bottom}px` : '';
    };
    const sizes = new ResizeObserver(place);
    const watch = () => {
      sizes.observe(sheet);
      sheet.querySelectorAll('[data-margin-slot] > *').forEach((margin) => sizes.observe(margin));
      place();
    };
    watch();
    // threads come and go; rows of images and steps too
    const changes = new MutationObserver(watch);
    changes.observe(sheet, { childList: true, subtree: true });
    beside.addEventListener('change', place);
    return () => {
      sizes.disconnect();
      changes.disconnect();
      beside.removeEventListener('change', place);
    };
  }, [page]);
}

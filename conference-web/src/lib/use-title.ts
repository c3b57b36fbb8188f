import { useEffect } from 'react';

/** The tab's title: `Cases · Kerfside`. Nothing clinical goes in it, since browsers keep it in their history. */
export function useTitle(title: string): void {
  useEffect(() => {
    document.title = title ? `${title} · Kerfside` : 'Kerfside';
  }, [title]);
}

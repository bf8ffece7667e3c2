import { useEffect } from 'react';

/** Names the window after the screen; the layout reads the name out when a screen is reached. */
export function usePageTitle(title: string): void {
  useEffect(() => {
    document.title = `${title} · Graticule`;
    window.dispatchEvent(new CustomEvent('graticule:title', { detail: title }));
  }, [title]);
}

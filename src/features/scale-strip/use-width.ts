import { useLayoutEffect, useRef, useState, type RefObject } from 'react';

/** Width assumed until the element has been measured, in pixels. */
const BEFORE_MEASURED = 640;

/** The element's width in pixels, followed as it changes; a fixed guess where nothing can be measured. */
export function useWidth<Element extends HTMLElement>(): [RefObject<Element | null>, number] {
  const element = useRef<Element>(null);
  const [width, setWidth] = useState(BEFORE_MEASURED);
  useLayoutEffect(() => {
    const node = element.current;
    if (node === null || typeof ResizeObserver === 'undefined') return undefined;
    const observer = new ResizeObserver((entries) => {
      const measured = entries[0]?.contentRect.width ?? 0;
      if (measured > 0) setWidth(Math.round(measured));
    });
    observer.observe(node);
    return () => observer.disconnect();
  }, []);
  return [element, width];
}

import { useLayoutEffect, useRef, useState, type RefObject } from 'react';

/** The width of a box in whole pixels, followed as it changes; `fallback` until it is known. */
export function useMeasuredWidth<Box extends HTMLElement>(fallback: number): readonly [RefObject<Box | null>, number] {
  const box = useRef<Box>(null);
  const [width, setWidth] = useState(fallback);
  useLayoutEffect(() => {
    const element = box.current;
    if (element === null || typeof ResizeObserver === 'undefined') return;
    const measure = () => setWidth((known) => Math.floor(element.clientWidth) || known);
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [box, width];
}

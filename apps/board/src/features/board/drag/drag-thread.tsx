import { useEffect, useRef, type RefObject } from 'react';

interface Point {
  readonly x: number;
  readonly y: number;
}
export interface ThreadEnds {
  readonly from: Point;
  readonly to: Point;
}

const restMs = 700;

const curve = ({ from, to }: ThreadEnds): string => {
  const reach = Math.max(60, Math.abs(to.x - from.x) / 2);
  const n = (value: number) => String(Math.round(value));
  return `M${n(from.x)} ${n(from.y)}C${n(from.x + reach)} ${n(from.y)} ${n(to.x - reach)} ${n(to.y)} ${n(to.x)} ${n(to.y)}`;
};

/** The indigo thread from the place of origin to the hand; drawn past React, at the pace of the pointer. */
export function DragThread({ followRef }: { readonly followRef: RefObject<((ends: ThreadEnds) => void) | null> }) {
  const path = useRef<SVGPathElement>(null);
  useEffect(() => {
    let rest: ReturnType<typeof setTimeout> | undefined;
    followRef.current = (ends) => {
      path.current?.setAttribute('d', curve(ends));
      path.current?.setAttribute('opacity', '1');
      clearTimeout(rest);
      rest = setTimeout(() => path.current?.setAttribute('opacity', '.6'), restMs);
    };
    return () => {
      clearTimeout(rest);
      followRef.current = null;
    };
  }, [followRef]);
  return (
    <svg aria-hidden="true" className="pointer-events-none fixed inset-0 z-40 size-full">
      <path
        ref={path}
        fill="none"
        strokeWidth="2.5"
        strokeLinecap="round"
        className="stroke-indigo transition-opacity"
      />
    </svg>
  );
}

import { useState, type KeyboardEvent } from 'react';
import type { AgeRulerProps } from './age-ruler.tsx';
import type { RulerLayout } from './layout/ruler-layout.ts';
import { nextStop, type Stop } from './ruler-moves.ts';
import { ageOfPosition, periodOfAge } from './scale.ts';

interface RulerKeyboard {
  /** The one item that the tab key reaches. */
  readonly stopKey: string | null;
  readonly setStop: (key: string) => void;
  readonly onKeyDown: (event: KeyboardEvent<SVGGElement>, key: string) => void;
}

type Props = Pick<AgeRulerProps, 'selectedKey' | 'dependencies' | 'onSelect' | 'onPeriodChange'> & {
  readonly layout: RulerLayout;
};

/** One tab stop that moves over the windows. */
export function useRulerKeyboard({
  layout,
  selectedKey,
  dependencies,
  onSelect,
  onPeriodChange,
}: Props): RulerKeyboard {
  const [movedTo, setStop] = useState<string | null>(null);
  const stops = layout.items.map(({ item, laneIndex, markX }): Stop => ({ key: item.key, laneIndex, x: markX }));
  const known = [movedTo, selectedKey].find((key) => stops.some((stop) => stop.key === key));
  const stopKey = known ?? nearestToToday(stops, layout.todayX)?.key ?? null;

  const look = (pressed: string, from: Stop) => {
    const { frame } = layout;
    const age = ageOfPosition((from.x - frame.x0) / frame.axisWidth, frame.period);
    onPeriodChange?.(pressed === '-' ? 'all' : periodOfAge(age));
  };

  const onKeyDown = (event: KeyboardEvent<SVGGElement>, key: string) => {
    const from = stops.find((stop) => stop.key === key);
    if (from === undefined || event.altKey || event.ctrlKey || event.metaKey) return;
    const next = nextStop(
      { stops, todayX: layout.todayX, dependencyKeys: dependencies.map((dependency) => dependency.key) },
      from,
      event.key,
    );
    if (next !== null) {
      setStop(next.key);
      event.currentTarget.ownerSVGElement?.querySelector<SVGElement>(`[data-key="${CSS.escape(next.key)}"]`)?.focus();
    } else if (event.key === 'Enter' || event.key === ' ') onSelect(key);
    else if (event.key === '+' || event.key === '=' || event.key === '-') look(event.key, from);
    else return;
    event.preventDefault();
  };
  return { stopKey, setStop, onKeyDown };
}

function nearestToToday(stops: readonly Stop[], todayX: number): Stop | undefined {
  return stops.toSorted((a, b) => Math.abs(a.x - todayX) - Math.abs(b.x - todayX))[0];
}

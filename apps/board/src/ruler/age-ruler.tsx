import type { PlainDate } from '@weftway/calendar/plain-date';
import { useId, useMemo } from 'react';
import { rulerWords } from '../words/ruler.ts';
import { RulerDrawing } from './drawing/ruler-drawing.tsx';
import { placeLabels } from './layout/ruler-labels.ts';
import { layoutRuler, rulerFrame } from './layout/ruler-layout.ts';
import type { RulerDependency, RulerItem, RulerLane } from './ruler-item.ts';
import type { Period } from './scale.ts';
import { useMeasuredWidth } from './use-measured-width.ts';

export interface AgeRulerProps {
  readonly lanes: readonly RulerLane[];
  readonly items: readonly RulerItem[];
  readonly birth: PlainDate;
  readonly today: PlainDate;
  readonly period: Period;
  readonly selectedKey: string | null;
  /** What the chosen milestone waits for. */
  readonly dependencies: readonly RulerDependency[];
  readonly onSelect: (key: string) => void;
  /** The keys plus and minus look closer and wider when given. */
  readonly onPeriodChange?: ((period: Period) => void) | undefined;
  /** Accessible name: whose pathway. */
  readonly label?: string | undefined;
}

const leastRulerWidth = 560;

/** A child's life on one stretched axis: disciplines as threads, milestones as marks whose width is their window. */
export function AgeRuler(props: AgeRulerProps) {
  const { lanes, items, birth, today, period, selectedKey, dependencies } = props;
  const [box, measured] = useMeasuredWidth<HTMLDivElement>(1200);
  const hintId = useId();
  const width = Math.max(leastRulerWidth, measured);
  const layout = useMemo(
    () => layoutRuler(rulerFrame({ width, birth, today, period }), lanes, items),
    [width, birth, today, period, lanes, items],
  );
  const labels = useMemo(() => placeLabels(layout, { selectedKey, dependencies }), [layout, selectedKey, dependencies]);
  return (
    <div ref={box} className="w-full overflow-x-auto">
      <RulerDrawing
        {...props}
        label={props.label ?? rulerWords.ruler}
        layout={layout}
        labels={labels}
        describedBy={hintId}
      />
      <p id={hintId} className="sr-only">
        {rulerWords.keys}
      </p>
    </div>
  );
}

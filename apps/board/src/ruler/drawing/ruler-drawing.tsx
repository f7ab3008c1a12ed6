import { useId, useState } from 'react';
import type { AgeRulerProps } from '../age-ruler.tsx';
import { dependencyBranches } from '../layout/dependency-branches.ts';
import { itemName } from '../item-name.ts';
import type { PlacedLabel } from '../layout/ruler-labels.ts';
import type { PlacedItem, RulerLayout } from '../layout/ruler-layout.ts';
import { useRulerKeyboard } from '../use-ruler-keyboard.ts';
import { AxisGround, AxisHead, TodayFlag, TodayLine } from './axis-head.tsx';
import { DependencyLines } from './dependency-lines.tsx';
import { HoverLabel, RulerLabels } from './ruler-labels.tsx';
import { RulerWindow } from './ruler-window.tsx';
import { LaneName, Threads } from './threads.tsx';
import { WindowPatterns } from './window-patterns.tsx';

interface RulerDrawingProps extends AgeRulerProps {
  readonly label: string;
  readonly layout: RulerLayout;
  readonly labels: readonly PlacedLabel[];
  readonly describedBy: string;
}

export function RulerDrawing(props: RulerDrawingProps) {
  const { layout, labels, selectedKey, dependencies, onSelect } = props;
  const patterns = useId();
  const [shownKey, setShownKey] = useState<string | null>(null);
  const keyboard = useRulerKeyboard(props);
  const labelled = new Set(labels.map((label) => label.key));
  const bright = new Set([selectedKey, ...dependencies.map(({ key }) => key)]);
  const chosen = layout.items.some((placed) => placed.item.key === selectedKey);
  const neverDims = new Set(
    layout.items.filter(({ item }) => item.state === 'late' || item.state === 'closing').map(({ item }) => item.key),
  );
  const isDimmed = (key: string) => chosen && !bright.has(key) && !neverDims.has(key);

  const drawItem = (placed: PlacedItem) => {
    const { key } = placed.item;
    return (
      <RulerWindow
        key={key}
        placed={placed}
        name={itemName(placed.item, layout.lanes[placed.laneIndex]?.lane)}
        todayX={layout.todayX}
        patterns={patterns}
        isStop={key === keyboard.stopKey}
        isSelected={key === selectedKey}
        isDimmed={isDimmed(key)}
        onSelect={() => onSelect(key)}
        onFocus={() => {
          keyboard.setStop(key);
          setShownKey(key);
        }}
        onHover={(isOver) => setShownKey(isOver ? key : null)}
        onKeyDown={(event) => keyboard.onKeyDown(event, key)}
      />
    );
  };

  return (
    <svg
      role="grid"
      aria-label={props.label}
      aria-describedby={props.describedBy}
      width={layout.frame.width}
      height={layout.height}
      viewBox={`0 0 ${String(layout.frame.width)} ${String(layout.height)}`}
      onBlur={() => setShownKey(null)}
      className="ruler block select-none print:h-auto print:w-full"
    >
      <WindowPatterns id={patterns} />
      <AxisGround layout={layout} />
      <Threads layout={layout} />
      <AxisHead layout={layout} />
      <TodayLine layout={layout} />
      <DependencyLines branches={dependencyBranches(layout, selectedKey, dependencies)} />
      {layout.lanes.map((placed, laneIndex) => (
        <g key={placed.lane.lane} role="row">
          <LaneName placed={placed} gutter={layout.frame.gutter} />
          {layout.items.filter((item) => item.laneIndex === laneIndex).map(drawItem)}
        </g>
      ))}
      <TodayFlag x={layout.todayX} />
      <RulerLabels layout={layout} labels={labels} isDimmed={isDimmed} selectedKey={selectedKey} />
      <HoverLabel
        layout={layout}
        placed={layout.items.find(({ item }) => item.key === shownKey && !labelled.has(item.key))}
      />
    </svg>
  );
}

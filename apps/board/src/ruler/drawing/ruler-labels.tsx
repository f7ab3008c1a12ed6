import type { PlacedItem, RulerLayout } from '../layout/ruler-layout.ts';
import { labelWeight, type PlacedLabel } from '../layout/ruler-labels.ts';
import { textWidth } from '../layout/text-width.ts';

interface RulerLabelsProps {
  readonly layout: RulerLayout;
  readonly labels: readonly PlacedLabel[];
  readonly isDimmed: (key: string) => boolean;
  readonly selectedKey: string | null;
}

/** The names of the windows; the same words are in each window's accessible name. */
export function RulerLabels({ layout, labels, isDimmed, selectedKey }: RulerLabelsProps) {
  const states = new Map(layout.items.map((item) => [item.item.key, item]));
  return (
    <g aria-hidden="true" className="ruler-labels text-fine pointer-events-none">
      {labels.map((label) => {
        const placed = states.get(label.key);
        const isQuiet = isDimmed(label.key);
        return (
          <text
            key={label.key}
            x={label.x}
            y={label.baseline}
            className={labelDye(placed, { isQuiet, isSelected: label.key === selectedKey })}
          >
            {label.text}
          </text>
        );
      })}
    </g>
  );
}

function labelDye(placed: PlacedItem | undefined, of: { isQuiet: boolean; isSelected: boolean }): string {
  if (of.isSelected) return 'fill-indigo font-semibold';
  if (of.isQuiet || placed === undefined) return 'fill-ink-3';
  if (labelWeight(placed) === 'bold') return 'fill-ink font-semibold';
  return placed.item.state === 'ahead' ? 'fill-ink-2' : 'fill-ink-3';
}

interface HoverLabelProps {
  readonly placed: PlacedItem | undefined;
  readonly layout: RulerLayout;
}

/** The name of a window that found no place for one, while it is hovered or focused. */
export function HoverLabel({ placed, layout }: HoverLabelProps) {
  if (placed === undefined) return null;
  const width = textWidth(placed.item.label, 'bold') + 16;
  const x = Math.max(layout.frame.gutter, Math.min(placed.markX - width / 2, layout.frame.width - width));
  return (
    <g aria-hidden="true" className="text-fine pointer-events-none">
      <rect x={x} y={placed.y - 33} width={width} height="20" rx="3" className="fill-bleached stroke-thread-2" />
      <text x={x + 8} y={placed.y - 19} className="fill-ink font-semibold">
        {placed.item.label}
      </text>
    </g>
  );
}

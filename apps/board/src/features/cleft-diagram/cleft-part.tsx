import type { KeyboardEvent } from 'react';
import { severities, type Severity } from '@weftway/pathway/cleft-code';
import { severityWords } from '../../words/cleft.ts';
import { severityAfter, severityBy } from './cleft-signs.ts';
import type { PlaceShape } from './cleft-shapes.ts';

interface CleftPartProps {
  /** "Right lip" */
  readonly name: string;
  /** Shorter, since the side is drawn: "Lip". */
  readonly label: string;
  readonly shape: PlaceShape;
  readonly severity: Severity;
  /** Absent: the drawing is only looked at. */
  readonly onChange: ((severity: Severity) => void) | undefined;
}

/** The severity a key asks for, or null when the key means nothing here. */
function severityForKey(key: string, severity: Severity): Severity | null {
  if (key === 'ArrowUp' || key === 'ArrowRight') return severityBy(severity, 1);
  if (key === 'ArrowDown' || key === 'ArrowLeft') return severityBy(severity, -1);
  if (key === 'Enter' || key === ' ') return severityAfter(severity);
  if (key === 'Home' || key === 'Backspace' || key === 'Delete') return 'none';
  return key === 'End' ? 'complete' : null;
}

/** One of the seven parts: a slider of four steps that can also be pressed. */
export function CleftPart({ name, label, shape, severity, onChange }: CleftPartProps) {
  const opening = shape.opening(severity);
  const onKeyDown = (event: KeyboardEvent) => {
    const next = severityForKey(event.key, severity);
    if (next === null || event.ctrlKey || event.metaKey || event.altKey) return;
    event.preventDefault();
    onChange?.(next);
  };
  const drawing = (
    <>
      <path
        d={shape.tissue}
        className="fill-walnut-wash stroke-thread-2 group-hover:stroke-ink group-focus-visible:stroke-focus group-focus-visible:stroke-[3]"
        strokeWidth="1.4"
        strokeLinejoin="round"
      />
      {opening === '' ? null : <path d={opening} className="fill-ink pointer-events-none" />}
      <text x={shape.label.x} y={shape.label.y} textAnchor={shape.label.anchor} className="fill-ink-2 text-body">
        <tspan className={severity === 'none' ? 'fill-ink-3' : 'fill-ink font-semibold'}>{label}</tspan>
        <tspan x={shape.label.x} dy="17" className={severity === 'none' ? 'fill-ink-3' : 'fill-ink font-semibold'}>
          {severityWords[severity]}
        </tspan>
      </text>
    </>
  );
  if (onChange === undefined) return <g>{drawing}</g>;
  return (
    <g
      role="slider"
      tabIndex={0}
      aria-label={name}
      aria-valuemin={0}
      aria-valuemax={3}
      aria-valuenow={severities.indexOf(severity)}
      aria-valuetext={severityWords[severity]}
      onClick={() => onChange(severityAfter(severity))}
      onKeyDown={onKeyDown}
      className="group cursor-pointer outline-none"
    >
      {drawing}
    </g>
  );
}

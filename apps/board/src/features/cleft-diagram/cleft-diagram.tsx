import { useId } from 'react';
import { cleftPlaces, type CleftCode, type Severity } from '@weftway/pathway/cleft-code';
import { cleftWords } from '../../words/cleft.ts';
import { CleftPart } from './cleft-part.tsx';
import { noseLines, placeShapes } from './cleft-shapes.ts';
import { severitiesIn, withSeverity } from './cleft-signs.ts';

interface CleftDiagramProps {
  /** A code, or whatever was typed so far. */
  readonly code: string;
  /** Absent: the drawing is only looked at. */
  readonly onChange?: ((code: CleftCode) => void) | undefined;
}

const labels = [
  cleftWords.lip,
  cleftWords.gum,
  cleftWords.hardPalate,
  cleftWords.softPalate,
  cleftWords.hardPalate,
  cleftWords.gum,
  cleftWords.lip,
] as const;

const capitalised = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** Lip, gum and palate from the front; the child's right is on the left. */
export function CleftDiagram({ code, onChange }: CleftDiagramProps) {
  const hintId = useId();
  const shown = severitiesIn(code);
  const change = (place: number) =>
    onChange === undefined ? undefined : (severity: Severity) => onChange(withSeverity(shown, place, severity));
  return (
    <figure className="m-0 flex max-w-md flex-col gap-1">
      <svg
        viewBox="0 0 400 396"
        role="group"
        aria-label={cleftWords.drawing}
        aria-describedby={onChange === undefined ? undefined : hintId}
        className="h-auto w-full"
      >
        <text x="0" y="14" className="fill-ink-2 text-body">
          {cleftWords.rightSide}
        </text>
        <text x="400" y="14" textAnchor="end" className="fill-ink-2 text-body">
          {cleftWords.leftSide}
        </text>
        {noseLines.map((line) => (
          <path key={line} d={line} fill="none" className="stroke-thread-2" strokeWidth="1.4" strokeLinecap="round" />
        ))}
        {placeShapes.map((shape, place) => (
          <CleftPart
            key={cleftPlaces[place]?.name}
            name={capitalised(cleftPlaces[place]?.name ?? '')}
            label={labels[place] ?? ''}
            shape={shape}
            severity={shown[place] ?? 'none'}
            onChange={change(place)}
          />
        ))}
      </svg>
      {onChange === undefined ? null : (
        <figcaption id={hintId} className="text-fine text-ink-3">
          {cleftWords.keys}
        </figcaption>
      )}
    </figure>
  );
}

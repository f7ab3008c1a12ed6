import type { Evidence } from '@weftway/contract/pathway';
import type { EvidenceField } from '@weftway/pathway/protocol';
import { Button } from '../../../ui/actions/button.tsx';
import { TickIcon } from '../../../ui/icons.tsx';
import { VisuallyHidden } from '../../../ui/page/visually-hidden.tsx';
import { signingWords } from '../../../words/signing.ts';
import { isHere, valueOf } from '../model/evidence.ts';
import { evidenceText } from './evidence-text.ts';

interface EvidenceListProps {
  readonly fields: readonly EvidenceField[];
  readonly values: Evidence;
  /** Opens the form at a field; absent where the reader may not write. */
  readonly onRecord?: ((name: string) => void) | undefined;
}

/** What the signature needs: here with a tick, missing with a dashed square and the way to record it. */
export function EvidenceList({ fields, values, onRecord }: EvidenceListProps) {
  if (fields.length === 0) return <p className="text-body text-ink-2 m-0">{signingWords.noEvidence}</p>;
  return (
    <ul className="m-0 flex list-none flex-col p-0">
      {fields.map((field) => {
        const here = isHere(values, field);
        return (
          <li key={field.name} className="flex min-h-6.5 items-baseline gap-2.5 py-0.5">
            <span className="flex w-4 shrink-0 justify-center self-center">
              {here ? <TickIcon size={14} /> : <MissingMark />}
            </span>
            <span className="text-body min-w-0 grow">
              {field.label}
              <VisuallyHidden>, {here ? signingWords.here : signingWords.missingWord}</VisuallyHidden>
              {here ? (
                <span className="text-ink-2 break-words">: {evidenceText(field, valueOf(values, field.name))}</span>
              ) : null}
            </span>
            {onRecord === undefined || here ? null : (
              <Button
                look="quiet"
                size="small"
                aria-label={signingWords.recordField(field.label)}
                onClick={() => onRecord(field.name)}
              >
                {signingWords.record}
              </Button>
            )}
          </li>
        );
      })}
    </ul>
  );
}

/** A dashed square: not here yet. */
export function MissingMark() {
  return (
    <svg width="14" height="14" viewBox="0 0 16 16" aria-hidden="true" className="shrink-0">
      <rect
        x="1.5"
        y="1.5"
        width="13"
        height="13"
        fill="none"
        className="stroke-thread-2"
        strokeWidth="1.4"
        strokeDasharray="2.6 2"
      />
    </svg>
  );
}

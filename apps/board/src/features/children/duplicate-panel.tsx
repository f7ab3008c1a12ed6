import type { PlainDate } from '@weftway/calendar/plain-date';
import { formatDate } from '@weftway/calendar/format-date';
import { Button } from '../../ui/actions/button.tsx';
import { TextLink } from '../../ui/actions/text-link.tsx';
import { Notice } from '../../ui/notices/notice.tsx';
import { duplicateWords } from '../../words/children.ts';

export interface Candidate {
  readonly id: string;
  readonly name: string;
  readonly recordNumber: string;
  readonly bornOn: PlainDate | null;
  readonly why: readonly (keyof typeof duplicateWords.why)[];
}

interface DuplicatePanelProps {
  readonly candidates: readonly Candidate[];
  /** Set once sending was refused: the way to say that this is another child. */
  readonly onDistinct?: (() => void) | undefined;
  readonly isBusy: boolean;
}

/** Children that may be the same, with the reason, before a second record is made. */
export function DuplicatePanel({ candidates, onDistinct, isBusy }: DuplicatePanelProps) {
  if (candidates.length === 0) return null;
  const isNumberTaken = candidates.some(({ why }) => why.includes('record-number'));
  return (
    <Notice
      kind="conflict"
      title={duplicateWords.title}
      actions={
        onDistinct === undefined || isNumberTaken ? undefined : (
          <Button isBusy={isBusy} onClick={onDistinct}>
            {duplicateWords.distinct}
          </Button>
        )
      }
      footnote={isNumberTaken ? duplicateWords.numberTaken : duplicateWords.twins}
    >
      <p className="m-0 mb-2">{duplicateWords.lead}</p>
      <ul className="m-0 flex list-none flex-col gap-1 p-0">
        {candidates.map((candidate) => (
          <li key={candidate.id} className="border-hair border-t pt-1">
            <TextLink
              to={`/children/${candidate.id}/record`}
              target="_blank"
              aria-label={duplicateWords.open(candidate.name)}
            >
              {candidate.name}
            </TextLink>{' '}
            <span className="figures text-ink-2">
              {candidate.recordNumber}
              {candidate.bornOn === null ? '' : `, ${formatDate(candidate.bornOn)}`}
            </span>{' '}
            <span className="text-ink-2">{candidate.why.map((reason) => duplicateWords.why[reason]).join(', ')}</span>
          </li>
        ))}
      </ul>
    </Notice>
  );
}

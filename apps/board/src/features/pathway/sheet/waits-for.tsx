import type { Wait } from '@weftway/pathway/pathway-plan';
import { Mark } from '../../../marks/mark.tsx';
import { Button } from '../../../ui/actions/button.tsx';
import { TickIcon } from '../../../ui/icons.tsx';
import { Section } from '../../../ui/page/section.tsx';
import { pathwayWords } from '../../../words/pathway.ts';
import { reasonsWords, waitText } from '../../../words/reasons.ts';
import { MissingMark } from '../evidence/evidence-list.tsx';
import type { MilestoneView } from '../model/milestone-view.ts';

export interface WaitLine {
  readonly wait: Wait;
  readonly title: string;
  /** Absent: not on the path. */
  readonly view: MilestoneView | undefined;
  /** Claims it for the viewer; absent where that is not allowed or not needed. */
  readonly onClaim?: (() => void) | undefined;
}

interface WaitsForProps {
  readonly lines: readonly WaitLine[];
  readonly onOpen: (key: string) => void;
}

/** What must come first, what is asked for at signing, what would be good to have; met or not, and whose it is. */
export function WaitsFor({ lines, onOpen }: WaitsForProps) {
  const unmet = lines.filter(({ wait }) => !wait.isMet).length;
  return (
    <Section
      title={reasonsWords.waitsFor}
      level={3}
      aside={lines.length === 0 ? undefined : reasonsWords.metOf(lines.length - unmet, lines.length)}
    >
      {lines.length === 0 ? <p className="text-body text-ink-2 m-0">{reasonsWords.waitsForNothing}</p> : null}
      <ul className="m-0 flex list-none flex-col gap-1.5 p-0">
        {lines.map((line) => (
          <WaitRow key={`${line.wait.milestone} ${line.wait.type}`} {...line} onOpen={onOpen} />
        ))}
      </ul>
    </Section>
  );
}

function WaitRow({ wait, title, view, onClaim, onOpen }: WaitLine & Pick<WaitsForProps, 'onOpen'>) {
  const owner = view === undefined || wait.isMet ? null : view.ownerNames;
  return (
    <li className="flex items-baseline gap-2.5">
      <span className="flex w-4 shrink-0 justify-center">
        {view === undefined ? (
          wait.isMet ? (
            <TickIcon size={14} />
          ) : (
            <MissingMark />
          )
        ) : (
          <Mark state={view.planned.state} unowned={view.unowned} size={14} ground="bleached" />
        )}
      </span>
      <span className="text-body min-w-0 grow">
        <span className={wait.isMet ? '' : 'font-semibold'}>{title}</span>{' '}
        <span className="text-ink-2">{waitText(wait)}</span>
        <span className="text-fine text-ink-3 block">
          {reasonsWords.waitKinds[wait.type]}
          {wait.isMet || view === undefined ? null : (
            <>
              {', '}
              {owner ?? <span className={view.unowned ? 'text-madder font-semibold' : ''}>{pathwayWords.noOne}</span>}
            </>
          )}
          {wait.note === undefined ? null : `. ${wait.note}`}
        </span>
      </span>
      <span className="flex shrink-0 gap-1">
        {onClaim === undefined ? null : (
          <Button look="quiet" size="small" onClick={onClaim} aria-label={reasonsWords.claimNamed(title)}>
            {reasonsWords.claimIt}
          </Button>
        )}
        {view === undefined ? null : (
          <Button look="quiet" size="small" onClick={() => onOpen(view.key)} aria-label={reasonsWords.openNamed(title)}>
            {reasonsWords.openIt}
          </Button>
        )}
      </span>
    </li>
  );
}

interface WillMoveProps {
  readonly views: readonly MilestoneView[];
  readonly onOpen: (key: string) => void;
}

/** Milestones whose dates or state depend on this one. */
export function WillMove({ views, onOpen }: WillMoveProps) {
  return (
    <Section title={reasonsWords.willMove} level={3}>
      {views.length === 0 ? <p className="text-body text-ink-2 m-0">{reasonsWords.movesNothing}</p> : null}
      <ul className="m-0 flex list-none flex-col p-0">
        {views.map((view) => (
          <li key={view.key} className="flex min-h-7 items-center gap-2.5">
            <span className="flex w-4 shrink-0 justify-center">
              <Mark state={view.planned.state} unowned={view.unowned} size={14} ground="bleached" />
            </span>
            <span className="text-body min-w-0 grow">{view.title}</span>
            <Button
              look="quiet"
              size="small"
              onClick={() => onOpen(view.key)}
              aria-label={reasonsWords.openNamed(view.title)}
            >
              {reasonsWords.openIt}
            </Button>
          </li>
        ))}
      </ul>
    </Section>
  );
}

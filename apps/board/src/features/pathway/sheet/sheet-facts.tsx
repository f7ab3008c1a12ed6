import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { WindowBar } from '../../../ruler/window-bar.tsx';
import { Section } from '../../../ui/page/section.tsx';
import { pathwayWords, remarkText, stateWord, windowLine } from '../../../words/pathway.ts';
import { signingWords } from '../../../words/signing.ts';
import type { ChildPlan } from '../model/child-plan.ts';
import { isAbout, type MilestoneView } from '../model/milestone-view.ts';
import { signersInWords } from '../model/permissions.ts';

interface SheetFactsProps {
  readonly of: ChildPlan;
  readonly view: MilestoneView;
  /** Signed once, and being recorded once more. */
  readonly isAgain: boolean;
}

/** State in words, who signs, who holds it, what it is in plain words, and its window. */
export function SheetFacts({ of, view, isAgain }: SheetFactsProps) {
  const { planned, rule } = view;
  const words = pathwayWords.sheet;
  const unmet = planned.waitsFor.filter((wait) => wait.type === 'gate' && !wait.isMet).length;
  const who = view.parts.map(signersInWords);
  const booking = of.pathway.facts.bookings.find((one) => isAbout(one.milestone, planned));
  return (
    <>
      <div className="flex flex-col gap-1">
        <p className="text-body m-0">
          <strong className={stateDye[planned.state] ?? 'text-ink'}>
            {isAgain ? signingWords.renew.doing : stateWord(planned)}
          </strong>
          {planned.state === 'waiting' && unmet > 0 ? ` ${words.onThings(unmet)}` : ''}.{' '}
          {view.isFinished ? null : words.whoSigns([...new Set(who)])}
        </p>
        <p className="text-small text-ink-2 m-0">{rule.plain}</p>
        {isAgain ? <p className="text-body m-0">{signingWords.renew.stays}</p> : <OwnerLine view={view} />}
        <Remarks of={of} view={view} />
        {booking === undefined || view.isFinished ? null : (
          <p className="text-body m-0 font-semibold">{signingWords.book.booked(formatDate(booking.on))}</p>
        )}
      </div>
      {isAgain ? null : <WindowSection view={view} today={of.today} titleOf={of.titleOf} />}
    </>
  );
}

const stateDye: Readonly<Record<string, string>> = {
  open: 'text-indigo',
  closing: 'text-weld',
  late: 'text-madder',
  waiting: 'text-woad',
  held: 'text-walnut',
};

function OwnerLine({ view }: { readonly view: MilestoneView }) {
  if (view.isFinished) return null;
  const hasTwo = view.parts.length > 1;
  const open = view.parts.filter((part) => part.signature === null || view.planned.state !== 'partly-signed');
  return (
    <p className="text-small m-0">
      {pathwayWords.sheet.owner}{' '}
      {open.map((part, at) => (
        <span key={part.part}>
          {at === 0 ? '' : ', '}
          {part.ownerName ?? (
            <span className={view.unowned ? 'text-madder font-semibold' : 'text-ink-2'}>{pathwayWords.noOne}</span>
          )}
          {hasTwo ? ` (${part.label.toLowerCase()})` : ''}
        </span>
      ))}
    </p>
  );
}

function Remarks({ of, view }: Omit<SheetFactsProps, 'isAgain'>) {
  const { planned } = view;
  const { facts } = of.pathway;
  const words = pathwayWords.sheet;
  const hold = planned.state === 'held' ? facts.holds.findLast((one) => isAbout(one.milestone, planned)) : undefined;
  const waiver =
    planned.state === 'waived' ? facts.waivers.findLast((one) => isAbout(one.milestone, planned)) : undefined;
  const isImported = facts.completions.some((one) => isAbout(one.milestone, planned) && one.isUnverified === true);
  const ready = view.parts.filter((part) => part.draft?.isReady === true && part.signature === null);
  const lines = [
    ...ready.map((part) => words.prepared(part.draftByName ?? '')),
    ...(hold === undefined ? [] : [words.heldUntil(formatDate(hold.reviewOn), hold.reason)]),
    ...(waiver === undefined ? [] : [words.waivedBecause(waiver.reason)]),
    ...(planned.isLapsed && !view.isFinished ? [words.lapsed] : []),
    ...(planned.squeezedByDays === null || view.isFinished ? [] : [words.squeezed]),
    ...(isImported && planned.state === 'partly-signed' ? [signingWords.confirm.needed] : []),
    ...(planned.state === 'late' && view.rule.lateMeans !== '' ? [`${words.ifLate}: ${view.rule.lateMeans}`] : []),
  ];
  return lines.map((line) => (
    <p key={line} className="text-body m-0">
      {line}
    </p>
  ));
}

function WindowSection({
  view,
  today,
  titleOf,
}: {
  readonly view: MilestoneView;
  readonly today: PlainDate;
  readonly titleOf: (key: string) => string;
}) {
  const { planned } = view;
  const words = pathwayWords.sheet;
  const isDone = view.isFinished && view.doneOn !== null;
  return (
    <Section
      title={words.window}
      level={3}
      aside={
        <span className="font-semibold">
          {isDone && view.doneOn !== null
            ? pathwayWords.doneOn(formatDate(view.doneOn))
            : planned.window === null
              ? remarkText(planned.remark, titleOf)
              : windowLine(planned, today)}
        </span>
      }
    >
      {planned.window === null ? null : (
        <>
          <WindowBar state={planned.state} window={planned.window} today={today} />
          <p className="text-fine text-ink-2 figures m-0">
            {words.target(formatDate(planned.window.target))}, {words.closing(formatDate(planned.window.closing))}
          </p>
        </>
      )}
    </Section>
  );
}

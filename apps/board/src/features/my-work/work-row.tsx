import { Link } from 'react-router-dom';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { WorkGroup, WorkItem } from '@weftway/contract/board';
import { Mark } from '../../marks/mark.tsx';
import { WindowBar } from '../../ruler/window-bar.tsx';
import type { RulerWindow } from '../../ruler/ruler-item.ts';
import { Button } from '../../ui/actions/button.tsx';
import { LinkButton } from '../../ui/actions/link-button.tsx';
import { myWorkWords } from '../../words/my-work.ts';
import { addressOf, ageOf, buttonOf, stateOf, timeLeft, wayOf } from './work-rows.ts';

interface WorkRowProps {
  readonly group: WorkGroup;
  readonly item: WorkItem;
  readonly today: string;
  /** The one filled button of the page. */
  readonly isFirst: boolean;
  readonly onClaim: (item: WorkItem) => void;
}

export const workGrid =
  'grid grid-cols-[104px_minmax(170px,0.9fr)_minmax(240px,1.7fr)_minmax(180px,1.3fr)_172px] gap-x-4 max-[1099px]:grid-cols-[92px_minmax(0,1fr)_172px] max-sm:grid-cols-[1fr_auto]';

export function WorkRow({ group, item, today, isFirst, onClaim }: WorkRowProps) {
  const time = timeLeft(item);
  return (
    <li className={`${workGrid} border-hair min-h-[42px] items-center gap-y-1 border-t py-0.5 max-[1099px]:py-2`}>
      <span
        className={`figures text-right whitespace-nowrap max-sm:order-2 ${time.isLate ? 'text-madder' : 'text-ink-2'}`}
      >
        <span className="text-numeral">{time.number}</span> <span className="text-small">{time.unit}</span>
      </span>
      <span className="flex min-w-0 flex-col max-sm:order-1">
        <span className="text-body truncate">
          <Link to={addressOf(item)} className="rounded font-semibold hover:underline">
            {item.childName}
          </Link>{' '}
          <span className="text-fine text-ink-2">{ageOf(item, today)}</span>
        </span>
        <span className="text-small text-ink-2 flex items-center gap-1.5">
          <Mark state={stateOf(item)} unowned={item.isUnowned} size={13} />
          <span className="truncate">{item.title}</span>
        </span>
      </span>
      <span className="max-[1099px]:hidden">
        {
          item.window === null ? null : (
            <WindowBar
              state={stateOf(item)}
              window={item.window as RulerWindow}
              today={today as PlainDate}
              scale="weeks"
            />
          ) /* dates of the contract */
        }
      </span>
      <span className="text-small text-ink-2 max-[1099px]:col-span-2 max-[1099px]:col-start-2 max-[1099px]:row-start-2 max-sm:order-3 max-sm:col-span-2 max-sm:col-start-1 max-sm:row-start-auto">
        {wayOf(item)}
      </span>
      <span className="flex flex-col max-[1099px]:col-start-3 max-[1099px]:row-start-1 max-sm:order-4 max-sm:col-span-2 max-sm:col-start-1 max-sm:row-start-auto">
        <RowButton group={group} item={item} isFirst={isFirst} onClaim={onClaim} />
      </span>
    </li>
  );
}

type RowButtonProps = Pick<WorkRowProps, 'group' | 'item' | 'isFirst' | 'onClaim'>;

function RowButton({ group, item, isFirst, onClaim }: RowButtonProps) {
  const kind = buttonOf(group, item);
  const text = myWorkWords.buttons[kind];
  const name = myWorkWords.buttonFor(text, item.title, item.childName);
  const look = isFirst ? 'filled' : 'plain';
  return kind === 'claim' ? (
    <Button look={look} aria-label={name} onClick={() => onClaim(item)}>
      {text}
    </Button>
  ) : (
    <LinkButton look={look} to={addressOf(item)} aria-label={name}>
      {text}
    </LinkButton>
  );
}

import { formatDate } from '@weftway/calendar/format-date';
import { readPlainDate } from '@weftway/calendar/plain-date';
import type { ChildFields } from '@weftway/contract/child';
import type { ChildChange } from '@weftway/contract/child-history';
import { eventWords, fieldWords, recordWords } from '../../words/children.ts';
import { fieldText, isFieldName, type Names } from './field-text.ts';

interface ChangeListProps {
  readonly changes: readonly ChildChange[];
  readonly names: Names;
}

const otherWords: Readonly<Record<string, string>> = {
  on: recordWords.onDay,
  to: recordWords.toTeam,
  memberIds: recordWords.traineesHead,
  version: recordWords.protocol,
};

const valueText = (field: string, value: unknown, names: Names): string => {
  if (isFieldName(field)) return fieldText(field, { [field]: value } as ChildFields, names); // the trail keeps whole records of the contract
  if (value === null || value === '') return recordWords.none;
  if (Array.isArray(value))
    return value.length === 0 ? recordWords.none : value.map((one) => names.get(String(one)) ?? String(one)).join(', ');
  const reading = readPlainDate(String(value));
  return reading.kind === 'date' ? formatDate(reading.date) : String(value);
};

/** "6 Oct 2026, 14:05" */
const momentText = (instant: string): string => {
  const moment = new Date(instant);
  const pad = (number: number): string => String(number).padStart(2, '0');
  const reading = readPlainDate(
    `${String(moment.getFullYear())}-${pad(moment.getMonth() + 1)}-${pad(moment.getDate())}`,
  );
  return `${reading.kind === 'date' ? formatDate(reading.date) : ''}, ${pad(moment.getHours())}:${pad(moment.getMinutes())}`;
};

/** Who changed what, newest first, each field before and after. */
export function ChangeList({ changes, names }: ChangeListProps) {
  return (
    <ol className="m-0 list-none p-0">
      {changes.map((change) => (
        <li key={change.seq} className="border-hair flex flex-col gap-1 border-t py-2">
          <p className="text-body m-0">
            <span className="font-semibold">{eventWords[change.kind] ?? change.kind}</span>{' '}
            <span className="text-ink-2">
              {change.actorName}
              {change.actorRole === '' ? '' : `, ${change.actorRole}`},{' '}
              <span className="figures">{momentText(change.at)}</span>
            </span>
          </p>
          {change.reason === '' ? null : <p className="text-body text-ink-2 m-0">{change.reason}</p>}
          {change.changes.length === 0 ? null : (
            <dl className="m-0 flex flex-col gap-1">
              {change.changes.map(({ field, before, after }) => (
                <div key={field} className="grid grid-cols-[minmax(7rem,11rem)_1fr] gap-x-4 max-sm:grid-cols-1">
                  <dt className="text-body text-ink-2">
                    {isFieldName(field) ? fieldWords[field] : (otherWords[field] ?? field)}
                  </dt>
                  <dd className="text-body m-0 break-words">
                    <del className="text-ink-3">
                      <span className="sr-only">{recordWords.before}: </span>
                      {valueText(field, before, names)}
                    </del>
                    <span aria-hidden="true"> → </span>
                    <ins className="no-underline">
                      <span className="sr-only">{recordWords.after}: </span>
                      {valueText(field, after, names)}
                    </ins>
                  </dd>
                </div>
              ))}
            </dl>
          )}
        </li>
      ))}
    </ol>
  );
}

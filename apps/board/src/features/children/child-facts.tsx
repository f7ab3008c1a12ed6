import type { ReactNode } from 'react';
import { formatDate } from '@weftway/calendar/format-date';
import { readPlainDate } from '@weftway/calendar/plain-date';
import type { Child, ChildFields } from '@weftway/contract/child';
import { Section } from '../../ui/page/section.tsx';
import { fieldWords, recordWords } from '../../words/children.ts';
import { alertText, contactText, fieldText, type Names } from './field-text.ts';

interface ChildFactsProps {
  readonly child: Child;
  readonly names: Names;
  /** The drawing and reading of the cleft. */
  readonly cleft: ReactNode;
}

const identity = [
  'firstName',
  'familyName',
  'recordNumber',
  'sex',
  'bornOn',
  'isBirthEstimated',
  'dueOn',
  'gestation',
] as const satisfies readonly (keyof ChildFields)[];
const team = [
  'site',
  'leadClinicianId',
  'prenatalReferralOn',
  'referredOn',
  'teamStartOn',
] as const satisfies readonly (keyof ChildFields)[];
const cleftNames = ['isCleftProvisional', 'flags', 'syndromes'] as const satisfies readonly (keyof ChildFields)[];

function FactList({
  names,
  fields,
  shown,
}: {
  readonly names: Names;
  readonly fields: ChildFields;
  readonly shown: readonly (keyof ChildFields)[];
}) {
  return (
    <dl className="m-0 grid grid-cols-[minmax(9rem,13rem)_1fr] gap-x-4 gap-y-0">
      {shown.map((name) => (
        <div key={name} className="border-hair col-span-2 grid grid-cols-subgrid border-t py-1.5">
          <dt className="text-body text-ink-2">{fieldWords[name]}</dt>
          <dd className="text-body text-ink figures m-0 break-words">{fieldText(name, fields, names)}</dd>
        </div>
      ))}
    </dl>
  );
}

function Lines({ lines, empty }: { readonly lines: readonly string[]; readonly empty: string }) {
  if (lines.length === 0) return <p className="text-body text-ink-3 m-0">{empty}</p>;
  return (
    <ul className="m-0 list-none p-0">
      {lines.map((line) => (
        <li key={line} className="border-hair text-body border-t py-1.5 break-words">
          {line}
        </li>
      ))}
    </ul>
  );
}

/** Everything recorded about a child, in words. */
export function ChildFacts({ child, names, cleft }: ChildFactsProps) {
  const { fields } = child;
  const since = readPlainDate(child.registeredAt.slice(0, 10));
  return (
    <div className="flex flex-col gap-8">
      <Section title={recordWords.identity}>
        <FactList names={names} fields={fields} shown={identity} />
      </Section>
      <Section title={fieldWords.contacts}>
        <Lines lines={fields.contacts.map(contactText)} empty={recordWords.none} />
      </Section>
      <Section title={fieldWords.alerts}>
        <Lines lines={fields.alerts.map(alertText)} empty={recordWords.none} />
      </Section>
      <Section title={recordWords.cleft}>
        {cleft}
        <FactList names={names} fields={fields} shown={cleftNames} />
      </Section>
      <Section title={recordWords.careOfTeam}>
        <FactList names={names} fields={fields} shown={team} />
        <p className="text-small text-ink-2 m-0">
          {recordWords.registered} {since.kind === 'date' ? formatDate(since.date) : ''}. {recordWords.protocol}{' '}
          {child.protocolVersion}.
        </p>
      </Section>
      <Section title={fieldWords.notes}>
        <p className="text-body m-0 whitespace-pre-wrap">{fields.notes === '' ? recordWords.none : fields.notes}</p>
      </Section>
    </div>
  );
}

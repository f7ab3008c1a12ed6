import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Child } from '@weftway/contract/child';
import type { ReactNode } from 'react';
import { TabLinks } from '../../../ui/actions/tab-links.tsx';
import { Notice } from '../../../ui/notices/notice.tsx';
import { PageHead } from '../../../ui/page/page-head.tsx';
import { Tag } from '../../../ui/page/tag.tsx';
import { pathwayWords } from '../../../words/pathway.ts';
import { childSentence } from './child-sentence.ts';

interface ChildHeadProps {
  readonly child: Child;
  readonly today: PlainDate;
  /** Null: nobody leads yet. */
  readonly leadName: string | null;
  readonly actions?: ReactNode;
  /** Sentences of the planner that are about the whole child. */
  readonly alarms?: readonly string[];
}

/** A sentence, not a banner: alerts as tags first, then cleft, languages, who comes, who leads. */
export function ChildHead({ child, today, leadName, actions, alarms = [] }: ChildHeadProps) {
  const said = childSentence(child, today);
  const { fields } = child;
  const base = `/children/${child.id}`;
  const lead = leadName === null ? pathwayWords.noLead : pathwayWords.lead(leadName);
  return (
    <PageHead
      kind="person"
      title={said.name}
      beside={said.age}
      actions={actions}
      sentence={
        <>
          {fields.alerts.map((alert) => (
            <span key={`${alert.kind} ${alert.text}`} className="mr-2">
              <Tag kind="alert">{alert.text}</Tag>
            </span>
          ))}
          <strong>{said.cleft}</strong> {said.code === '' ? null : <span className="text-ink-2">{said.code}</span>}
          {fields.isCleftProvisional ? <span className="text-ink-2">, {pathwayWords.provisional}</span> : null}.{' '}
          {said.languages === null ? null : `${said.languages} `}
          {said.comesWith}
          {said.needsInterpreter ? (
            <>
              , <strong>{pathwayWords.interpreter}</strong>
            </>
          ) : null}
          {fields.contacts.length === 0 ? ' ' : '. '}
          {lead}, {pathwayWords.site(fields.site)}.{' '}
          <span className="text-ink-2 figures whitespace-nowrap">{pathwayWords.number(fields.recordNumber)}.</span>
          {fields.bornOn === null ? null : (
            <span className="hidden print:inline">{pathwayWords.bornOn(formatDate(fields.bornOn))}.</span>
          )}
          <ChildNotices child={child} today={today} alarms={alarms} />
        </>
      }
      tabs={
        <TabLinks
          label={pathwayWords.tabs}
          tabs={[
            { to: base, label: pathwayWords.tabPathway, end: true },
            { to: `${base}/record`, label: pathwayWords.tabRecord },
          ]}
        />
      }
    />
  );
}

function ChildNotices({
  child,
  today,
  alarms,
}: Pick<ChildHeadProps, 'child' | 'today'> & { readonly alarms: readonly string[] }) {
  const { bornOn } = child.fields;
  const isExpected = bornOn === null || bornOn > today;
  return (
    <div className="flex flex-col gap-2 empty:hidden [&>*:first-child]:mt-1">
      {child.transferredOn === null ? null : (
        <Notice kind="note" title={pathwayWords.transferred(formatDate(child.transferredOn), child.transferredTo)}>
          {pathwayWords.transferredText}
        </Notice>
      )}
      {child.careEnded === null ? null : (
        <Notice kind="note" title={pathwayWords.careEnded(formatDate(child.careEnded.on))}>
          {child.careEnded.reason}. {pathwayWords.careEndedText}
        </Notice>
      )}
      {isExpected ? <p className="text-small text-ink-2 m-0">{pathwayWords.expectedText}</p> : null}
      {alarms.length === 0 ? null : <p className="text-small text-madder m-0 font-semibold">{alarms.join(' ')}</p>}
    </div>
  );
}

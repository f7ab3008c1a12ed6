import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { abilityFor, canSome } from '@weftway/abilities/ability-for';
import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { ApiProblem } from '../api/api-client.ts';
import { RuleBook } from '../features/protocol/rules/rule-book.tsx';
import { ProtocolSettings, ProtocolSources } from '../features/protocol/rules/settings-and-sources.tsx';
import { ActivateDialog } from '../features/protocol/versions/activate-dialog.tsx';
import { protocolQueries } from '../queries/protocol-queries.ts';
import { sessionQueries } from '../queries/session-queries.ts';
import { Button } from '../ui/actions/button.tsx';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { Loading } from '../ui/notices/loading.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { PageHead } from '../ui/page/page-head.tsx';
import { protocolWords } from '../words/protocol.ts';

const dayOf = (instant: string): string => formatDate(instant.slice(0, 10) as PlainDate); // an ISO instant begins with its date

/** One version, whole: rules by lane with their places, settings, sources. `#SURG-03` leads to a rule. */
export function Component() {
  const version = Number(useParams()['version']);
  const read = useQuery(protocolQueries.version(version));
  const heads = useQuery(protocolQueries.all());
  const session = useQuery(sessionQueries.current());
  const [isActivating, setActivating] = useState(false);
  const ability = abilityFor(session.data?.me ?? null);
  if (read.error instanceof ApiProblem) {
    return (
      <>
        <PageHead title={protocolWords.title} />
        <div className="px-6 py-5">
          <ProblemNotice
            problem={read.error.problem}
            actions={<LinkButton to="/protocol">{protocolWords.versions}</LinkButton>}
          />
        </div>
      </>
    );
  }
  if (read.data === undefined) {
    return (
      <>
        <PageHead title={protocolWords.versionName(version)} />
        <div className="px-6 py-5">
          <Loading label={protocolWords.loading} />
        </div>
      </>
    );
  }
  const { protocol } = read.data;
  // The list is fresher than the kept version: a version never changes, but its standing does.
  const head = heads.data?.protocols.find((one) => one.version === version) ?? read.data.head;
  const others = (heads.data?.protocols ?? [])
    .filter((one) => one.version !== version)
    .reduce((sum, one) => sum + one.children, 0);
  const lanes = new Set(protocol.milestones.map((rule) => rule.lane)).size;
  const since =
    head.status === 'active' && head.activatedAt !== null
      ? ` ${protocolWords.columns.active.toLowerCase()} ${dayOf(head.activatedAt)}`
      : '';
  return (
    <>
      <PageHead
        title={protocolWords.versionName(version)}
        beside={`${protocolWords.statuses[head.status]}${since === '' ? '' : since.replace(/^ active/, '')}`}
        sentence={`${protocol.name}. ${head.changes.replace(/\.?$/, '.')} ${protocolWords.facts(protocol.milestones.length, lanes)}; ${protocolWords.followedBy(head.children)}.`}
        actions={
          <>
            <LinkButton to="/protocol">{protocolWords.versions}</LinkButton>
            <Button onClick={() => window.print()}>{protocolWords.print}</Button>
            {canSome(ability, 'propose', 'Protocol') ? (
              <LinkButton to={`/protocol/${String(version)}/proposal`}>{protocolWords.proposeFrom}</LinkButton>
            ) : null}
            {head.status === 'active' ? null : (
              <Button
                look="filled"
                onClick={() => setActivating(true)}
                notYet={canSome(ability, 'activate', 'Protocol') ? null : protocolWords.activate.onlyAdministrator}
              >
                {protocolWords.activate.open}
              </Button>
            )}
          </>
        }
      />
      <div className="flex flex-col gap-8 px-6 py-5 max-sm:px-5">
        <ProtocolSettings protocol={protocol} />
        <RuleBook protocol={protocol} />
        <ProtocolSources protocol={protocol} />
      </div>
      {isActivating ? <ActivateDialog version={version} others={others} onClose={() => setActivating(false)} /> : null}
    </>
  );
}

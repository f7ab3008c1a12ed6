import { useQuery } from '@tanstack/react-query';
import { abilityFor, canSome } from '@weftway/abilities/ability-for';
import { ApiProblem } from '../api/api-client.ts';
import { CompareVersions } from '../features/protocol/versions/compare-versions.tsx';
import { VersionTable } from '../features/protocol/versions/version-table.tsx';
import { protocolQueries } from '../queries/protocol-queries.ts';
import { sessionQueries } from '../queries/session-queries.ts';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { Loading } from '../ui/notices/loading.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { PageHead } from '../ui/page/page-head.tsx';
import { Section } from '../ui/page/section.tsx';
import { protocolWords } from '../words/protocol.ts';

/** Every version, the active one, and what changed between two of them. */
export function Component() {
  const heads = useQuery(protocolQueries.all());
  const session = useQuery(sessionQueries.current());
  const ability = abilityFor(session.data?.me ?? null);
  const active = heads.data?.protocols.find((head) => head.status === 'active');
  return (
    <>
      <PageHead
        title={protocolWords.title}
        sentence={protocolWords.sentence}
        actions={
          active === undefined ? null : (
            <>
              <LinkButton to={`/protocol/${String(active.version)}`}>{protocolWords.toVersion}</LinkButton>
              {canSome(ability, 'propose', 'Protocol') ? (
                <LinkButton look="filled" to={`/protocol/${String(active.version)}/proposal`}>
                  {protocolWords.propose}
                </LinkButton>
              ) : (
                <span className="text-small text-ink-3">{protocolWords.cannotPropose}</span>
              )}
            </>
          )
        }
      />
      <div className="flex flex-col gap-8 px-6 py-5 max-sm:px-5">
        {heads.error instanceof ApiProblem ? (
          <ProblemNotice problem={heads.error.problem} onRetry={() => void heads.refetch()} />
        ) : null}
        {heads.isPending ? <Loading label={protocolWords.loading} /> : null}
        {heads.data === undefined ? null : (
          <>
            <Section title={protocolWords.versions}>
              <VersionTable heads={heads.data.protocols} />
            </Section>
            <CompareVersions heads={heads.data.protocols} />
          </>
        )}
      </div>
    </>
  );
}

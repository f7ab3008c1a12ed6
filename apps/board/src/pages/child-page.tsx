import { useQuery, useQueryClient } from '@tanstack/react-query';
import type { Pathway } from '@weftway/contract/pathway';
import type { Session } from '@weftway/contract/session';
import type { Protocol } from '@weftway/pathway/protocol';
import { useEffect } from 'react';
import { useParams } from 'react-router-dom';
import { ChildPathway } from '../features/pathway/child-pathway.tsx';
import { ChildHead } from '../features/pathway/head/child-head.tsx';
import { usePlan } from '../features/pathway/model/child-plan.ts';
import { PathwayLoading, PathwayProblem } from '../features/pathway/page-states.tsx';
import { followChanges, pathwayQueries } from '../queries/pathway-queries.ts';
import { memberQueries } from '../queries/member-queries.ts';
import { protocolQueries } from '../queries/protocol-queries.ts';
import { sessionQueries } from '../queries/session-queries.ts';
import { pathwayWords } from '../words/pathway.ts';

/** A child's twenty years: the ruler, the list, and the sheet of one milestone. */
export function Component() {
  const { childId = '' } = useParams();
  const client = useQueryClient();
  const session = useQuery(sessionQueries.current()).data;
  const pathway = useQuery(pathwayQueries.ofChild(childId));
  const version = pathway.data?.protocolVersion;
  const protocol = useQuery({ ...protocolQueries.version(version ?? 0), enabled: version !== undefined });
  useEffect(() => followChanges(client, childId), [client, childId]);

  if (pathway.data === undefined) {
    return pathway.isError ? (
      <PathwayProblem error={pathway.error} onRetry={() => void pathway.refetch()} />
    ) : (
      <PathwayLoading />
    );
  }
  if (session === undefined || protocol.data === undefined) {
    return (
      <>
        {session === undefined ? null : <ChildHead child={pathway.data.child} today={session.today} leadName={null} />}
        {protocol.isError ? (
          <PathwayProblem error={protocol.error} onRetry={() => void protocol.refetch()} />
        ) : (
          <PathwayLoading />
        )}
      </>
    );
  }
  return (
    <>
      {pathway.isError ? (
        <p role="status" className="bg-weld-wash text-ink text-small m-0 px-6 py-1.5">
          {pathwayWords.states.offline}
        </p>
      ) : null}
      <Planned key={childId} pathway={pathway.data} protocol={protocol.data.protocol} session={session} />
    </>
  );
}

interface PlannedProps {
  readonly pathway: Pathway;
  readonly protocol: Protocol;
  readonly session: Session;
}

function Planned({ pathway, protocol, session }: PlannedProps) {
  const of = usePlan(pathway, protocol, session.today);
  const members = useQuery(memberQueries.list()).data;
  return <ChildPathway of={of} session={session} members={members ?? noMembers} />;
}

const noMembers: readonly never[] = [];

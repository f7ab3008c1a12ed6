import { useQuery } from '@tanstack/react-query';
import { useNavigate, useParams } from 'react-router-dom';
import { abilityFor, canSome } from '@weftway/abilities/ability-for';
import { ApiProblem } from '../api/api-client.ts';
import { Proposal } from '../features/protocol/proposal/proposal.tsx';
import { protocolQueries } from '../queries/protocol-queries.ts';
import { sessionQueries } from '../queries/session-queries.ts';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { Loading } from '../ui/notices/loading.tsx';
import { Notice } from '../ui/notices/notice.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { PageHead } from '../ui/page/page-head.tsx';
import { protocolWords } from '../words/protocol.ts';

const words = protocolWords.proposal;

/** A change of the protocol, made from one of its versions and kept as a draft. */
export function Component() {
  const version = Number(useParams()['version']);
  const read = useQuery(protocolQueries.version(version));
  const session = useQuery(sessionQueries.current());
  const navigate = useNavigate();
  const mayPropose = canSome(abilityFor(session.data?.me ?? null), 'propose', 'Protocol');
  const back = <LinkButton to={`/protocol/${String(version)}`}>{protocolWords.versionName(version)}</LinkButton>;
  return (
    <>
      <PageHead title={words.title} sentence={words.sentence(version)} actions={back} />
      {session.data !== undefined && !mayPropose ? (
        <div className="px-6 py-5">
          <Notice kind="note" title={words.forWhom} actions={back} />
        </div>
      ) : read.error instanceof ApiProblem ? (
        <div className="px-6 py-5">
          <ProblemNotice problem={read.error.problem} actions={back} />
        </div>
      ) : read.data === undefined ? (
        <div className="px-6 py-5">
          <Loading label={protocolWords.loading} />
        </div>
      ) : (
        <Proposal
          key={version}
          from={read.data.protocol}
          onSaved={(saved) => void navigate(`/protocol/${String(saved)}`)}
        />
      )}
    </>
  );
}

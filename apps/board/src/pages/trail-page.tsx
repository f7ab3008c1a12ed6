import { useMutation, useQuery } from '@tanstack/react-query';
import { abilityFor, canOfMember, canSome } from '@weftway/abilities/ability-for';
import { ApiProblem } from '../api/api-client.ts';
import { ProofNotice } from '../features/trail/proof-notice.tsx';
import { TrailLines } from '../features/trail/trail-lines.tsx';
import { sessionQueries } from '../queries/session-queries.ts';
import { trailMutations } from '../queries/trail-queries.ts';
import { Button } from '../ui/actions/button.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { PageHead } from '../ui/page/page-head.tsx';
import { trailWords } from '../words/trail.ts';

/** What the reader may see of the trail: everybody's lines or their own, with or without contents. */
const reachOf = (me: Parameters<typeof abilityFor>[0]) => {
  const ability = abilityFor(me);
  const seesAll = canOfMember(ability, 'read', 'Trail', '');
  return {
    seesAll,
    seesContent: canOfMember(ability, 'read-content', 'Trail', seesAll ? '' : (me?.id ?? '')),
    mayVerify: canSome(ability, 'verify', 'Trail'),
  };
};

const sentenceFor = ({ seesAll, seesContent }: { readonly seesAll: boolean; readonly seesContent: boolean }): string =>
  `${trailWords.sentence}${seesAll ? '' : ` ${trailWords.ownOnly}`}${seesContent ? '' : ` ${trailWords.noContents}`}`;

export function Component() {
  const session = useQuery(sessionQueries.current());
  const verify = useMutation(trailMutations.verify());
  const reach = reachOf(session.data?.me ?? null);
  return (
    <>
      <PageHead
        title={trailWords.title}
        sentence={sentenceFor(reach)}
        actions={
          <Button
            onClick={() => verify.mutate()}
            isBusy={verify.isPending}
            notYet={reach.mayVerify ? null : trailWords.verifyNotYours}
          >
            {trailWords.verify}
          </Button>
        }
      />
      <div className="flex flex-col gap-5 px-6 py-5 max-sm:px-5">
        {verify.data === undefined ? null : <ProofNotice proof={verify.data} />}
        {verify.error instanceof ApiProblem ? (
          <ProblemNotice problem={verify.error.problem} onRetry={() => verify.mutate()} />
        ) : null}
        <TrailLines zone={session.data?.team.zone ?? 'UTC'} seesAll={reach.seesAll} seesContent={reach.seesContent} />
      </div>
    </>
  );
}

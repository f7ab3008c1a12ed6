import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { abilityFor, canSome } from '@weftway/abilities/ability-for';
import { problemOf } from '../api/form-faults.ts';
import { InviteDialog } from '../features/team/invite-dialog.tsx';
import { MemberTable } from '../features/team/member-table.tsx';
import { memberQueries } from '../queries/member-queries.ts';
import { sessionQueries } from '../queries/session-queries.ts';
import { Button } from '../ui/actions/button.tsx';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { Loading } from '../ui/notices/loading.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { PageHead } from '../ui/page/page-head.tsx';
import { Section } from '../ui/page/section.tsx';
import { teamWords } from '../words/team.ts';

export function Component() {
  const session = useQuery(sessionQueries.current()).data;
  const list = useQuery(memberQueries.list());
  const [isInviting, setInviting] = useState(false);
  if (session === undefined) return null;
  const mayManage = canSome(abilityFor(session.me), 'manage', 'Team');
  const everyone = list.data ?? [];
  const present = everyone.filter(({ status }) => status !== 'left');
  const left = everyone.filter(({ status }) => status === 'left');
  const invited = present.filter(({ status }) => status === 'invited').length;
  const problem = problemOf(list.error);
  return (
    <>
      <title>{teamWords.title}</title>
      <PageHead
        title={teamWords.title}
        sentence={
          list.data === undefined
            ? undefined
            : `${teamWords.sentence(present.length - invited, invited)}${mayManage ? '' : ` ${teamWords.adminsOnly}`}`
        }
        actions={
          mayManage ? (
            <>
              <LinkButton to="/team/settings">{teamWords.settings}</LinkButton>
              <Button look="filled" onClick={() => setInviting(true)}>
                {teamWords.invite}
              </Button>
            </>
          ) : undefined
        }
      />
      <div className="flex flex-col gap-8 px-6 py-4 max-sm:px-5">
        {problem === null ? null : <ProblemNotice problem={problem} onRetry={() => void list.refetch()} />}
        {list.data === undefined && problem === null ? <Loading label={teamWords.loading} /> : null}
        {present.length === 0 ? null : (
          <MemberTable label={teamWords.members} members={present} everyone={everyone} today={session.today} />
        )}
        {left.length === 0 ? null : (
          <Section title={teamWords.left} aside={teamWords.leftSentence}>
            <MemberTable label={teamWords.left} members={left} everyone={everyone} today={session.today} />
          </Section>
        )}
      </div>
      {isInviting ? <InviteDialog everyone={everyone} onClose={() => setInviting(false)} /> : null}
    </>
  );
}

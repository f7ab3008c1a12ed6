import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { abilityFor, canOfMember, canSome } from '@weftway/abilities/ability-for';
import type { Member } from '@weftway/contract/member';
import type { Session } from '@weftway/contract/session';
import { problemOf } from '../api/form-faults.ts';
import { CoverForm } from '../features/team/cover-form.tsx';
import { EditMemberForm } from '../features/team/edit-member-form.tsx';
import { InviteAgainButton } from '../features/team/invite-again-button.tsx';
import { disciplineLine, namesOf, presenceLine, standingLine } from '../features/team/member-lines.ts';
import { MemberWork } from '../features/team/member-work.tsx';
import { memberQueries } from '../queries/member-queries.ts';
import { sessionQueries } from '../queries/session-queries.ts';
import { Button } from '../ui/actions/button.tsx';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { EmptyState } from '../ui/notices/empty-state.tsx';
import { Loading } from '../ui/notices/loading.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { PageHead } from '../ui/page/page-head.tsx';
import { Section } from '../ui/page/section.tsx';
import { teamWords } from '../words/team.ts';

export function Component() {
  const { memberId } = useParams();
  const session = useQuery(sessionQueries.current()).data;
  const list = useQuery(memberQueries.list());
  const problem = problemOf(list.error);
  if (session === undefined) return null;
  const member = list.data?.find(({ id }) => id === memberId);
  if (member !== undefined)
    return <MemberScreen key={member.id} member={member} everyone={list.data ?? []} session={session} />;
  return (
    <>
      <PageHead title={teamWords.title} />
      <div className="px-6 py-4 max-sm:px-5">
        {problem !== null ? (
          <ProblemNotice problem={problem} onRetry={() => void list.refetch()} />
        ) : list.data === undefined ? (
          <Loading label={teamWords.loading} />
        ) : (
          <EmptyState
            kind="time"
            title={teamWords.notFound}
            actions={<LinkButton to="/team">{teamWords.backToTeam}</LinkButton>}
          >
            {teamWords.notFoundText}
          </EmptyState>
        )}
      </div>
    </>
  );
}

interface MemberScreenProps {
  readonly member: Member;
  readonly everyone: readonly Member[];
  readonly session: Session;
}

/** One member: who they are, cover, open work, and for administrators the account. */
function MemberScreen({ member, everyone, session }: MemberScreenProps) {
  const [isEditing, setEditing] = useState(false);
  const ability = abilityFor(session.me);
  const isHere = member.status !== 'left';
  const mayManage = isHere && canSome(ability, 'manage', 'Team');
  const mayHandOver = isHere && canOfMember(ability, 'hand-over', 'Team', member.id);
  const isClinical = member.standing === 'member' || member.standing === 'trainee';
  const names = namesOf(everyone);
  const parts = [standingLine(member, names), disciplineLine(member), presenceLine(member, names, session.today)];
  return (
    <>
      <title>{member.name}</title>
      <PageHead
        title={member.name}
        sentence={
          <>
            {parts.filter((part) => part !== '').join(' · ')}
            <span className="text-ink-2 block break-all">{member.email}</span>
          </>
        }
        actions={
          <>
            {mayManage && member.status === 'invited' ? <InviteAgainButton member={member} /> : null}
            {mayManage && !isEditing ? <Button onClick={() => setEditing(true)}>{teamWords.edit}</Button> : null}
            <LinkButton to="/team">{teamWords.backToTeam}</LinkButton>
          </>
        }
      />
      <div className="flex flex-col gap-8 px-6 py-5 max-sm:px-5">
        {isEditing ? (
          <Section title={teamWords.edit}>
            <EditMemberForm member={member} everyone={everyone} onClose={() => setEditing(false)} />
          </Section>
        ) : null}
        {isClinical && member.status === 'active' ? (
          <Section title={teamWords.cover}>
            <CoverForm
              key={member.version}
              member={member}
              everyone={everyone}
              today={session.today}
              mayChange={canOfMember(ability, 'cover', 'Team', member.id)}
            />
          </Section>
        ) : null}
        {mayHandOver ? (
          <MemberWork
            member={member}
            everyone={everyone}
            mayClose={mayManage}
            mayOpen={canSome(ability, 'read', 'Child')}
          />
        ) : null}
      </div>
    </>
  );
}

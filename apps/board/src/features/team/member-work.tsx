import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Member } from '@weftway/contract/member';
import { problemOf } from '../../api/form-faults.ts';
import { memberQueries } from '../../queries/member-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { Loading } from '../../ui/notices/loading.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { Section } from '../../ui/page/section.tsx';
import { teamWords } from '../../words/team.ts';
import { HandOverDialog } from './hand-over-dialog.tsx';
import { LeaveDialog } from './leave-dialog.tsx';
import { OpenWork } from './open-work.tsx';

interface MemberWorkProps {
  readonly member: Member;
  readonly everyone: readonly Member[];
  /** Leaving belongs to administrators. */
  readonly mayClose: boolean;
  /** Whether the reader opens children. */
  readonly mayOpen: boolean;
}

/** Open work with its hand-over, and the way out of the team. */
export function MemberWork({ member, everyone, mayClose, mayOpen }: MemberWorkProps) {
  const work = useQuery(memberQueries.openClaims(member.id));
  const [open, setOpen] = useState<'hand-over' | 'leave' | null>(null);
  const problem = problemOf(work.error);
  if (problem !== null) return <ProblemNotice problem={problem} onRetry={() => void work.refetch()} />;
  if (work.data === undefined) return <Loading label={teamWords.loadingWork} />;
  const { claims } = work.data;
  const close = () => setOpen(null);
  return (
    <>
      {mayClose ? (
        <Section title={teamWords.account}>
          <p className="text-small text-ink-2 m-0">
            {member.status === 'invited' ? teamWords.invitationSentence : teamWords.accountSentence}
          </p>
          <div className="pt-1">
            <Button look="danger" onClick={() => setOpen('leave')}>
              {member.status === 'invited' ? teamWords.takeBack : teamWords.leaves(member.name)}
            </Button>
          </div>
        </Section>
      ) : null}
      {member.status === 'invited' ? null : (
        <Section title={teamWords.work} aside={claims.length === 0 ? undefined : teamWords.workCount(claims.length)}>
          {claims.length === 0 ? (
            <p className="text-body m-0">{teamWords.workNone(member.name)}</p>
          ) : (
            <>
              <div className="flex flex-wrap gap-2 pb-1">
                <Button onClick={() => setOpen('hand-over')}>{teamWords.handOver}</Button>
              </div>
              <OpenWork claims={claims} mayOpen={mayOpen} />
            </>
          )}
        </Section>
      )}
      {open === 'hand-over' ? (
        <HandOverDialog member={member} claims={claims} everyone={everyone} onClose={close} />
      ) : null}
      {open === 'leave' ? <LeaveDialog member={member} work={work.data} everyone={everyone} onClose={close} /> : null}
    </>
  );
}

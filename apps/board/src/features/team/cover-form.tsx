import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Member } from '@weftway/contract/member';
import type { ProblemDocument } from '../../api/api-client.ts';
import { placeFaults } from '../../api/form-faults.ts';
import { memberMutations } from '../../queries/member-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { DateField } from '../../ui/fields/date-field.tsx';
import { SelectField } from '../../ui/fields/select-field.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { showToast } from '../../ui/overlays/toasts.ts';
import { teamWords } from '../../words/team.ts';
import { coverLine, disciplineLine, namesOf } from './member-lines.ts';

interface CoverFormProps {
  readonly member: Member;
  readonly everyone: readonly Member[];
  readonly today: PlainDate;
  readonly mayChange: boolean;
}

const names = ['cover.byId', 'cover.from', 'cover.until'] as const;

/** Who sees this member's work while they are away. Colleagues who share a discipline stand first. */
export function CoverForm({ member, everyone, today, mayChange }: CoverFormProps) {
  const [byId, setById] = useState(member.cover?.byId ?? '');
  const [from, setFrom] = useState<string>(member.cover?.from ?? today);
  const [until, setUntil] = useState<string>(member.cover?.until ?? '');
  const [faults, setFaults] = useState<Readonly<Record<string, string>>>({});
  const [problem, setProblem] = useState<ProblemDocument | null>(null);
  const set = useMutation(memberMutations.cover(useQueryClient()));

  const save = async (cover: { byId: string; from: string; until: string } | null) => {
    setFaults({});
    setProblem(null);
    try {
      await set.mutateAsync({ memberId: member.id, cover });
      if (cover === null) setById('');
      showToast({
        text: cover === null ? teamWords.coverEnded : teamWords.coverSet(namesOf(everyone).get(cover.byId) ?? ''),
      });
    } catch (error) {
      const found: Record<string, string> = {};
      setProblem(placeFaults(error, { names, setFault: (name, message) => (found[name] = message) }));
      setFaults(found);
    }
  };
  const send = (event: FormEvent) => {
    event.preventDefault();
    if (byId === '') return setFaults({ 'cover.byId': teamWords.choose });
    void save({ byId, from, until });
  };

  const now = coverLine(member, namesOf(everyone), today);
  const shares = (one: Member): boolean =>
    one.disciplines.some((discipline) => member.disciplines.includes(discipline));
  const colleagues = everyone
    .filter((one) => one.id !== member.id && one.status === 'active' && one.standing === 'member')
    .sort((a, b) => Number(shares(b)) - Number(shares(a)) || a.name.localeCompare(b.name));
  return (
    <div className="flex flex-col gap-3">
      <p className="text-body m-0">{now ?? teamWords.coverNobody}</p>
      {mayChange ? (
        <form noValidate onSubmit={send} className="flex flex-col gap-3">
          <p className="text-small text-ink-2 m-0 max-w-[80ch]">{teamWords.coverSentence(member.name)}</p>
          <div className="flex max-w-[860px] flex-wrap gap-x-4 gap-y-3">
            <div className="w-72 max-w-full">
              <SelectField
                label={teamWords.coverBy}
                name="cover.byId"
                value={byId}
                onChange={setById}
                options={colleagues.map((one) => ({ value: one.id, label: `${one.name}, ${disciplineLine(one)}` }))}
                error={faults['cover.byId']}
              />
            </div>
            <DateField
              label={teamWords.coverFirst}
              name="cover.from"
              value={from}
              onChange={setFrom}
              error={faults['cover.from']}
            />
            <DateField
              label={teamWords.coverLast}
              name="cover.until"
              value={until}
              onChange={setUntil}
              error={faults['cover.until']}
            />
          </div>
          {problem === null ? null : <ProblemNotice problem={problem} />}
          <div className="flex flex-wrap gap-2">
            <Button type="submit" isBusy={set.isPending}>
              {teamWords.setCover}
            </Button>
            {member.cover === null ? null : <Button onClick={() => void save(null)}>{teamWords.endCover}</Button>}
          </div>
        </form>
      ) : null}
    </div>
  );
}

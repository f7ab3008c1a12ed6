import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import type { Member } from '@weftway/contract/member';
import { memberMutations } from '../../queries/member-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { TextLink } from '../../ui/actions/text-link.tsx';
import { SelectField } from '../../ui/fields/select-field.tsx';
import { TextField } from '../../ui/fields/text-field.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { Dialog, DialogActions } from '../../ui/overlays/dialog.tsx';
import { showToast } from '../../ui/overlays/toasts.ts';
import { kitWords } from '../../words/kit.ts';
import { teamWords } from '../../words/team.ts';
import { onceLedBy, stillPossible, type OpenWorkOf } from './hand-over-choices.ts';
import { HandOverList } from './hand-over-list.tsx';
import { namesOf } from './member-lines.ts';
import { useHandOver } from './use-hand-over.ts';

interface LeaveDialogProps {
  readonly member: Member;
  readonly work: OpenWorkOf;
  readonly everyone: readonly Member[];
  readonly onClose: () => void;
}

interface TraineesFirstProps {
  readonly member: Member;
  readonly trainees: readonly Member[];
  readonly onClose: () => void;
}

const letGo = 'let-go';

interface Undone {
  readonly unchosen: number;
  readonly isLeadOpen: boolean;
}

const whyNotYet = ({ unchosen, isLeadOpen }: Undone): string | null => {
  if (isLeadOpen) return teamWords.leadTodo;
  return unchosen === 0 ? null : teamWords.leaveTodo(unchosen);
};

const traineesOf = (member: Member, everyone: readonly Member[]): readonly Member[] =>
  everyone.filter((one) => one.supervisorId === member.id && one.status !== 'left');

/** What has to be done elsewhere first, before anything is chosen here. */
function TraineesFirst({ member, trainees, onClose }: TraineesFirstProps) {
  return (
    <Dialog isOpen onClose={onClose} title={teamWords.leaveTitle(member.name)}>
      <p className="text-body m-0">{teamWords.traineesFirst(member.name)}</p>
      <ul className="m-0 flex list-none flex-col gap-1 p-0">
        {trainees.map(({ id, name }) => (
          <li key={id}>
            <TextLink to={`/team/${id}`}>{name}</TextLink>
          </li>
        ))}
      </ul>
      <DialogActions>
        <Button onClick={onClose}>{kitWords.close}</Button>
      </DialogActions>
    </Dialog>
  );
}

/** Leaving the team; a supervisor's trainees come first. */
export function LeaveDialog(props: LeaveDialogProps) {
  const trainees = traineesOf(props.member, props.everyone);
  return trainees.length === 0 ? (
    <LeaveForm {...props} />
  ) : (
    <TraineesFirst member={props.member} trainees={trainees} onClose={props.onClose} />
  );
}

/** One act: children get another lead, every open milestone a colleague or nobody on purpose; then the account closes. */
function LeaveForm({ member, work, everyone, onClose }: LeaveDialogProps) {
  const [lead, setLead] = useState('');
  const claims = onceLedBy(work.claims, lead);
  const state = useHandOver(claims);
  const leave = useMutation(memberMutations.leave(useQueryClient()));
  const unchosen = claims.length - state.items.length;
  const notYet = whyNotYet({ unchosen, isLeadOpen: work.leads > 0 && lead === '' });
  const names = namesOf(everyone);

  const chooseLead = (next: string) => {
    setLead(next);
    state.setChoices(stillPossible(state.choices, onceLedBy(work.claims, next)));
  };
  const send = async (event: FormEvent) => {
    event.preventDefault();
    if (notYet !== null || leave.isPending) return;
    state.clearFaults();
    const leadTo = lead === '' ? undefined : lead === letGo ? null : lead;
    try {
      await leave.mutateAsync({
        memberId: member.id,
        items: state.items,
        reason: state.reason,
        leadTo,
        key: state.key,
      });
      showToast({ text: teamWords.hasLeft(member.name) });
      onClose();
    } catch (error) {
      state.takeError(error);
    }
  };

  return (
    <Dialog isOpen role="alertdialog" onClose={onClose} title={teamWords.leaveTitle(member.name)} width="wide">
      <form noValidate onSubmit={(event) => void send(event)} className="flex flex-col gap-4">
        <p className="text-body m-0">{teamWords.leaveSentence}</p>
        {work.leads === 0 ? null : (
          <SelectField
            label={teamWords.leadLabel(work.leads)}
            hint={teamWords.leadHint}
            name="leadTo"
            value={lead}
            placeholder={teamWords.choose}
            options={[
              ...work.mayLead.map((id) => ({ value: id, label: names.get(id) ?? id })),
              { value: letGo, label: teamWords.leadNobody },
            ]}
            error={state.leadFault}
            onChange={chooseLead}
          />
        )}
        {claims.length === 0 ? (
          <p className="text-body m-0">{teamWords.workNone(member.name)}</p>
        ) : (
          <HandOverList
            claims={claims}
            everyone={everyone}
            choices={state.choices}
            onChange={state.setChoices}
            unchosen={teamWords.choose}
            faults={state.faults}
          />
        )}
        <TextField
          label={teamWords.reason}
          hint={claims.length === 0 && work.leads === 0 ? undefined : teamWords.reasonHint}
          name="reason"
          value={state.reason}
          onChange={state.setReason}
          error={state.reasonFault}
          maxLength={300}
        />
        {state.problem === null ? null : <ProblemNotice problem={state.problem} />}
        <DialogActions>
          <Button type="submit" look="danger" isBusy={leave.isPending} notYet={notYet}>
            {teamWords.leaveButton}
          </Button>
          <Button onClick={onClose}>{kitWords.cancel}</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}

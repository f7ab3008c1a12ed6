import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { FormEvent } from 'react';
import type { Member } from '@weftway/contract/member';
import { memberMutations } from '../../queries/member-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { TextField } from '../../ui/fields/text-field.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { Dialog, DialogActions } from '../../ui/overlays/dialog.tsx';
import { showToast } from '../../ui/overlays/toasts.ts';
import { kitWords } from '../../words/kit.ts';
import { teamWords } from '../../words/team.ts';
import type { OpenClaim } from './hand-over-choices.ts';
import { HandOverList } from './hand-over-list.tsx';
import { useHandOver } from './use-hand-over.ts';

interface HandOverDialogProps {
  readonly member: Member;
  readonly claims: readonly OpenClaim[];
  readonly everyone: readonly Member[];
  readonly onClose: () => void;
}

/** Hands some of the work over; the member stays. */
export function HandOverDialog({ member, claims, everyone, onClose }: HandOverDialogProps) {
  const state = useHandOver(claims);
  const handOver = useMutation(memberMutations.handOver(useQueryClient()));

  const send = async (event: FormEvent) => {
    event.preventDefault();
    if (state.items.length === 0 || handOver.isPending) return;
    state.clearFaults();
    try {
      const { moved } = await handOver.mutateAsync({
        memberId: member.id,
        items: state.items,
        reason: state.reason,
        key: state.key,
      });
      showToast({ text: teamWords.handedOver(moved) });
      onClose();
    } catch (error) {
      state.takeError(error);
    }
  };

  return (
    <Dialog isOpen onClose={onClose} title={teamWords.handOverTitle(member.name)} width="wide">
      <form noValidate onSubmit={(event) => void send(event)} className="flex flex-col gap-4">
        <p className="text-body m-0">{teamWords.handOverSentence}</p>
        <HandOverList
          claims={claims}
          everyone={everyone}
          choices={state.choices}
          onChange={state.setChoices}
          unchosen={teamWords.stays(member.name)}
          faults={state.faults}
        />
        <TextField
          label={teamWords.reason}
          hint={teamWords.reasonHint}
          name="reason"
          value={state.reason}
          onChange={state.setReason}
          error={state.reasonFault}
          maxLength={300}
        />
        {state.problem === null ? null : <ProblemNotice problem={state.problem} />}
        <DialogActions>
          <Button
            type="submit"
            look="filled"
            isBusy={handOver.isPending}
            notYet={state.items.length === 0 ? teamWords.handOverNothing : null}
          >
            {teamWords.handOverButton(state.items.length)}
          </Button>
          <Button onClick={onClose}>{kitWords.cancel}</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}

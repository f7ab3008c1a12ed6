import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { Member, MemberFields } from '@weftway/contract/member';
import { newIdempotencyKey, type ProblemDocument } from '../../api/api-client.ts';
import { placeFaults } from '../../api/form-faults.ts';
import { memberMutations } from '../../queries/member-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { Dialog, DialogActions } from '../../ui/overlays/dialog.tsx';
import { showToast } from '../../ui/overlays/toasts.ts';
import { kitWords } from '../../words/kit.ts';
import { teamWords } from '../../words/team.ts';
import { MemberFieldsInputs } from './member-fields.tsx';
import { memberFieldNames, useMemberForm } from './use-member-form.ts';

interface InviteDialogProps {
  readonly everyone: readonly Member[];
  readonly onClose: () => void;
}

/** Mounted while it is open: what was typed lives as long as the dialog does. */
export function InviteDialog({ everyone, onClose }: InviteDialogProps) {
  const form = useMemberForm(null);
  const invite = useMutation(memberMutations.invite(useQueryClient()));
  const [key] = useState(newIdempotencyKey);
  const [problem, setProblem] = useState<ProblemDocument | null>(null);

  const send = async (fields: MemberFields) => {
    setProblem(null);
    try {
      await invite.mutateAsync({ ...fields, key });
      showToast({ text: teamWords.invited(fields.name) });
      onClose();
    } catch (error) {
      setProblem(
        placeFaults(error, {
          names: memberFieldNames,
          setFault: (name, message) => form.setError(name as 'name', { message }, { shouldFocus: true }),
        }),
      ); // one of the names given
    }
  };

  return (
    <Dialog isOpen onClose={onClose} title={teamWords.inviteTitle} width="wide">
      <form noValidate onSubmit={(event) => void form.handleSubmit(send)(event)} className="flex flex-col gap-4">
        <MemberFieldsInputs form={form} everyone={everyone} memberId={null} />
        {problem === null ? null : <ProblemNotice problem={problem} />}
        <DialogActions>
          <Button type="submit" look="filled" isBusy={invite.isPending}>
            {teamWords.sendInvitation}
          </Button>
          <Button onClick={onClose}>{kitWords.cancel}</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}

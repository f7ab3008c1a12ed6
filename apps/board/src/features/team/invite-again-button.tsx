import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Member } from '@weftway/contract/member';
import { problemOf } from '../../api/form-faults.ts';
import { memberMutations } from '../../queries/member-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { FieldError } from '../../ui/fields/field-error.tsx';
import { showToast } from '../../ui/overlays/toasts.ts';
import { teamWords } from '../../words/team.ts';

export function InviteAgainButton({ member }: { readonly member: Member }) {
  const again = useMutation(memberMutations.inviteAgain(useQueryClient()));
  const problem = problemOf(again.error);
  return (
    <>
      <Button
        isBusy={again.isPending}
        onClick={() =>
          again.mutate(member.id, { onSuccess: () => showToast({ text: teamWords.invitedAgain(member.name) }) })
        }
      >
        {teamWords.inviteAgain}
      </Button>
      <FieldError message={problem === null ? undefined : (problem.detail ?? problem.title)} />
    </>
  );
}

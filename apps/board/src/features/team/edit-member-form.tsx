import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { memberSchema, type Member, type MemberFields } from '@weftway/contract/member';
import { isProblem, type ProblemDocument } from '../../api/api-client.ts';
import { placeFaults } from '../../api/form-faults.ts';
import { memberMutations } from '../../queries/member-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { showToast } from '../../ui/overlays/toasts.ts';
import { kitWords } from '../../words/kit.ts';
import { teamWords } from '../../words/team.ts';
import { MemberConflict } from './member-conflict.tsx';
import { MemberFieldsInputs } from './member-fields.tsx';
import { inputOf, memberFieldNames, useMemberForm } from './use-member-form.ts';

interface EditMemberFormProps {
  readonly member: Member;
  readonly everyone: readonly Member[];
  readonly onClose: () => void;
}

/** Based on the version that was opened; when somebody was faster, both stand side by side and nothing is lost. */
export function EditMemberForm({ member, everyone, onClose }: EditMemberFormProps) {
  const form = useMemberForm(member);
  const edit = useMutation(memberMutations.edit(useQueryClient()));
  const [base, setBase] = useState(member);
  const [current, setCurrent] = useState<Member | null>(null);
  const [problem, setProblem] = useState<ProblemDocument | null>(null);

  const save = (from: Member) => async (fields: MemberFields) => {
    setProblem(null);
    setCurrent(null);
    try {
      await edit.mutateAsync({ member: from, fields });
      showToast({ text: teamWords.saved(fields.name) });
      onClose();
    } catch (error) {
      const theirs = isProblem(error, 'changed-meanwhile') ? memberSchema.safeParse(error.problem.current) : null;
      if (theirs?.success === true) {
        setBase(theirs.data);
        return setCurrent(theirs.data);
      }
      setProblem(
        placeFaults(error, {
          names: memberFieldNames,
          setFault: (name, message) => form.setError(name as 'name', { message }, { shouldFocus: true }),
        }),
      ); // one of the names given
    }
  };

  return (
    <form
      noValidate
      onSubmit={(event) => void form.handleSubmit(save(base))(event)}
      className="flex max-w-[640px] flex-col gap-4"
    >
      <MemberFieldsInputs form={form} everyone={everyone} memberId={member.id} />
      {problem === null ? null : <ProblemNotice problem={problem} />}
      {current === null ? null : (
        <MemberConflict
          current={current}
          typed={form.getValues()}
          everyone={everyone}
          onSaveMine={() => void form.handleSubmit(save(current))()}
          onTakeTheirs={() => {
            form.reset(inputOf(current));
            setCurrent(null);
          }}
        />
      )}
      {current === null ? (
        <div className="flex flex-wrap gap-2">
          <Button type="submit" look="filled" isBusy={edit.isPending}>
            {teamWords.save}
          </Button>
          <Button onClick={onClose}>{kitWords.cancel}</Button>
        </div>
      ) : null}
    </form>
  );
}

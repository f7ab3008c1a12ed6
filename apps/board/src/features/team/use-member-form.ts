import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, type UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';
import { memberFieldsSchema, type Member, type MemberFields } from '@weftway/contract/member';

export type MemberInput = z.input<typeof memberFieldsSchema>;
export type MemberForm = UseFormReturn<MemberInput, unknown, MemberFields>;

export const memberFieldNames = ['name', 'email', 'standing', 'disciplines', 'supervisorId'] as const;

const blank: MemberInput = { name: '', email: '', standing: 'member', disciplines: [], supervisorId: null };

export const inputOf = ({ name, email, standing, disciplines, supervisorId }: Member): MemberInput => ({
  name,
  email,
  standing,
  disciplines,
  supervisorId,
});

/** What a standing does not have is not sent; it stays in the form for whoever looks at another standing and comes back. */
const fitting = (fields: MemberFields): MemberFields => ({
  ...fields,
  disciplines: fields.standing === 'member' || fields.standing === 'trainee' ? fields.disciplines : [],
  supervisorId: fields.standing === 'trainee' ? fields.supervisorId : null,
});

/** Checked on leaving a field by the contract's own schema; the server says what only it can know. */
export const useMemberForm = (member: Member | null): MemberForm =>
  useForm<MemberInput, unknown, MemberFields>({
    defaultValues: member === null ? blank : inputOf(member),
    resolver: zodResolver(memberFieldsSchema.transform(fitting)),
    mode: 'onTouched',
  });

/** Colleagues whose name stands beside a signature or a decision. */
import type { Member } from '@weftway/contract/member';
import { disciplineNames } from '@weftway/team/disciplines';
import type { ComboboxOption } from '../../../ui/fields/combobox-field.tsx';

/** Active clinicians of the team other than the person at the screen. */
export const clinicians = (members: readonly Member[], exceptId: string): readonly Member[] =>
  members.filter(
    ({ id, status, standing, disciplines }) =>
      id !== exceptId &&
      status === 'active' &&
      standing === 'member' &&
      disciplines.some((discipline) => discipline !== 'coordinator'),
  );

export const clinicianOption = ({ name, disciplines }: Member): ComboboxOption => ({
  value: name,
  label: name,
  detail: disciplines.map((one) => disciplineNames[one]).join(', '),
});

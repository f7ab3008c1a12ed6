import type { Me } from '@weftway/contract/session';
import { disciplineNames } from '@weftway/team/disciplines';
import { standingNames } from '@weftway/team/standings';

/** "Orthodontist, Molding dentist"; the standing stands first where it is not plain membership. */
export const roleLine = ({ standing, disciplines }: Pick<Me, 'standing' | 'disciplines'>): string => {
  const held = disciplines.map((one) => disciplineNames[one]);
  return (standing === 'member' ? held : [standingNames[standing], ...held]).join(', ');
};

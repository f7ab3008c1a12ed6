/** What a person is on the team, as one line of text: disciplines, and the standing where it is not plain membership. */
import { disciplineNames } from '@weftway/team/disciplines';
import type { Discipline } from '@weftway/team/disciplines';
import { standingNames } from '@weftway/team/standings';
import type { Standing } from '@weftway/team/standings';

export const roleTextOf = ({
  standing,
  disciplines,
}: {
  readonly standing: Standing;
  readonly disciplines: readonly Discipline[];
}): string => {
  const held = disciplines.map((discipline) => disciplineNames[discipline]);
  return standing === 'member' ? held.join(', ') : [standingNames[standing], ...held].join(', ');
};

/** Which places a person may open, from the permission table, and which of them they start at. */
import { abilityFor, canSome } from '@weftway/abilities/ability-for';
import type { SubjectName } from '@weftway/abilities/permission-table';
import type { Me } from '@weftway/contract/session';
import type { Place } from '../../ui/page/top-bar.tsx';
import { frameWords } from '../../words/frame.ts';

interface PlaceRule extends Place {
  readonly subject: SubjectName;
}

const rules: readonly PlaceRule[] = [
  { to: '/my-work', label: frameWords.places.myWork, subject: 'MyWork' },
  { to: '/board', label: frameWords.places.board, subject: 'Board' },
  { to: '/children', label: frameWords.places.children, subject: 'Child' },
  { to: '/protocol', label: frameWords.places.protocol, subject: 'Protocol' },
  { to: '/team', label: frameWords.places.team, subject: 'Team' },
  { to: '/trail', label: frameWords.places.trail, subject: 'Trail' },
];

const mayOpen = (me: Me, subject: SubjectName): boolean => canSome(abilityFor(me), 'read', subject);

export const placesFor = (me: Me): readonly Place[] =>
  rules.filter(({ subject }) => mayOpen(me, subject)).map(({ to, label }) => ({ to, label }));

/** Name of the place that an address belongs to, where the person may not open it. */
export const closedPlace = (me: Me, pathname: string): string | null =>
  rules.find(({ to, subject }) => (pathname === to || pathname.startsWith(`${to}/`)) && !mayOpen(me, subject))?.label ??
  null;

export const mayGoToChild = (me: Me): boolean => mayOpen(me, 'Child');
export const mayReadReference = (me: Me): boolean => mayOpen(me, 'ApiReference');

/** An administrator starts with the team, an auditor with the trail, everybody else with their own work. */
export const homeFor = (me: Me): string => {
  if (me.standing === 'administrator') return '/team';
  if (me.standing === 'auditor') return '/trail';
  return placesFor(me)[0]?.to ?? '/account';
};

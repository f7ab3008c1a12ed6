/** Writes the demo team through the same door as live use: every fact comes from an event of the trail. */
import type { Knex } from 'knex';
import { addDays, plainDate } from '@weftway/calendar/plain-date';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import { demoChildren } from '@weftway/sample-team/demo-team';
import { emailOf, sampleMembers } from '@weftway/sample-team/members';
import { sampleSites } from '@weftway/sample-team/sample-children';
import { disciplineNames } from '@weftway/team/disciplines';
import { projectChildren } from '../pathways/project-children.ts';
import { demoPassword } from '../sign-in/demo-accounts.ts';
import { hashPassword } from '../sign-in/password-hash.ts';
import { foundTeam } from '../team/found-team.ts';
import { appendEvents } from '../trail/append-events.ts';
import type { TrailEvent } from '../trail/trail-event.ts';
import { demoEvents } from './demo-events.ts';
import type { DemoSetting } from './demo-events.ts';

const zone = 'Europe/London';

/** Ids that sort in the order in which they are made, the same on every machine. */
const countingIds = (): (() => string) => {
  let count = 0;
  return () => {
    count += 1;
    return `demo-${String(count).padStart(7, '0')}`;
  };
};

const progressEvery = 3000;

const foundAt = (first: string): string => new Date(Date.parse(first) - 86_400_000).toISOString();

/** Something that happens at its time; the events are made in that order, since signatures are chained. */
interface Timed {
  readonly at: string;
  readonly byId: string;
  readonly events: () => TrailEvent[];
}

const timed = ({ at, byId }: { readonly at: string; readonly byId: string }, events: () => TrailEvent[]): Timed => ({
  at,
  byId,
  events,
});

/** Members who left did so on the evening of their last day. */
const leavings = (day: string): Timed[] =>
  sampleMembers.flatMap((member) => {
    if (member.leftDaysAgo === null) return [];
    const leftOn = addDays(plainDate(day), -member.leftDaysAgo);
    const event: TrailEvent = { kind: 'member-left', memberId: member.id, after: { leftOn, reason: 'Retired' } };
    return [timed({ at: `${leftOn}T17:30:00.000Z`, byId: 'm-alma-quist' }, () => [event])];
  });

/** `day` is the local date on which the demo starts; histories reach back twenty years from it. */
export const seedDemoTeam = async (db: Knex, day: string): Promise<void> => {
  const today = plainDate(day);
  const protocol = { ...defaultProtocol, settings: { ...defaultProtocol.settings, offersMolding: true } };
  const children = demoChildren(protocol, today);
  const passwordHash = await hashPassword(demoPassword);
  const newId = countingIds();
  const setting: DemoSetting = {
    rules: new Map(protocol.milestones.map((rule) => [rule.id, rule])),
    actors: new Map(
      sampleMembers.map((member) => [
        member.id,
        { name: member.name, role: member.disciplines.map((held) => disciplineNames[held]).join(', ') },
      ]),
    ),
    protocolVersion: protocol.version,
    lastDigests: new Map(),
    newId,
  };
  const inOrder = [
    ...children.flatMap(({ id, acts }) => acts.map((act) => timed(act, () => demoEvents(id, act, setting)))),
    ...leavings(day),
  ].sort((a, b) => (a.at < b.at ? -1 : a.at > b.at ? 1 : 0));
  await db.transaction(async (trx) => {
    const first = inOrder[0]?.at ?? `${day}T08:00:00.000Z`;
    await foundTeam(trx, {
      name: 'Tern Estuary Cleft Team',
      zone,
      sites: sampleSites,
      protocol,
      at: foundAt(first),
      members: sampleMembers.map((member) => ({
        id: member.id,
        passwordHash: member.isOnlyInvited === true ? null : passwordHash,
        fields: {
          name: member.name,
          email: emailOf(member),
          standing: member.standing,
          disciplines: [...member.disciplines],
          supervisorId: member.supervisorId,
        },
      })),
    });
    let written = 0;
    for (const { at, byId, events } of inOrder) {
      const actor = setting.actors.get(byId);
      await appendEvents(trx, events(), {
        at,
        actorId: byId,
        actorName: actor?.name ?? '',
        actorRole: actor?.role ?? '',
        requestId: 'demo',
      });
      written += 1;
      if (written % progressEvery === 0) {
        process.stdout.write(`  ${written} of ${inOrder.length} events of the trail\n`);
      }
    }
    await projectChildren(
      trx,
      children.map((child) => child.id),
      day,
    );
    await trx('board_counter').where({ id: 1 }).update({ rolled_on: day });
  });
};

/**
 * The protocol that a new team starts from: every milestone from before birth to adulthood, as data.
 * A team changes its own copy; published values carry the number of their source, all others are common practice.
 */
import { familyAndMindMilestones } from './default-protocol/family-and-mind.ts';
import { feedingAndFitnessMilestones } from './default-protocol/feeding-and-fitness.ts';
import { geneticsMilestones } from './default-protocol/genetics.ts';
import { growthAndJawMilestones } from './default-protocol/growth-and-jaw.ts';
import { hearingMilestones } from './default-protocol/hearing.ts';
import { moldingMilestones } from './default-protocol/molding.ts';
import { orthodonticsAndGraftMilestones } from './default-protocol/orthodontics-and-graft.ts';
import { outcomeRecordMilestones } from './default-protocol/outcome-records.ts';
import { defaultSources } from './default-protocol/sources.ts';
import { speechMilestones } from './default-protocol/speech.ts';
import { surgeryMilestones } from './default-protocol/surgery.ts';
import { teamMilestones } from './default-protocol/team.ts';
import { teethMilestones } from './default-protocol/teeth.ts';
import { transitionMilestones } from './default-protocol/transition.ts';
import { protocolSchema } from './protocol.ts';
import type { Protocol, ProtocolInput } from './protocol.ts';

const input: ProtocolInput = {
  name: 'Default protocol',
  version: 1,
  changes: 'First version.',
  settings: {
    offersMolding: true,
    moldingClock: 'birth',
    graftRootLower: '1/2',
    graftRootUpper: '2/3',
  },
  milestones: [
    ...teamMilestones,
    ...feedingAndFitnessMilestones,
    ...geneticsMilestones,
    ...moldingMilestones,
    ...surgeryMilestones,
    ...hearingMilestones,
    ...speechMilestones,
    ...teethMilestones,
    ...orthodonticsAndGraftMilestones,
    ...growthAndJawMilestones,
    ...familyAndMindMilestones,
    ...outcomeRecordMilestones,
    ...transitionMilestones,
  ],
  sources: defaultSources,
};

/** Molding is switched on here so that its lane can be tried; a team that does not offer it switches it off. */
export const defaultProtocol: Protocol = protocolSchema.parse(input);

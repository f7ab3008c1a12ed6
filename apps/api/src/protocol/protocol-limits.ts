/** How large a protocol may be. Checked before anything walks it, since some checks compare every entry with every other. */
import type { ProtocolFault } from '@weftway/pathway/protocol-faults';

const most = { milestones: 300, perMilestone: 200, sources: 500, faults: 200 } as const;

const isObject = (value: unknown): value is Readonly<Record<string, unknown>> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

const listFaults = (milestone: unknown, at: string): ProtocolFault[] =>
  isObject(milestone)
    ? Object.entries(milestone)
        .filter(([, value]) => Array.isArray(value) && value.length > most.perMilestone)
        .map(([name]) => ({
          pointer: `${at}/${name}`,
          message: `A list of a milestone holds at most ${most.perMilestone} entries.`,
        }))
    : [];

/** Faults of size alone; empty when the protocol can be looked at. */
export const sizeFaults = (document: unknown): ProtocolFault[] => {
  if (!isObject(document)) return [];
  const { milestones, sources } = document;
  const list = Array.isArray(milestones) ? milestones : [];
  if (list.length > most.milestones)
    return [
      {
        pointer: '/milestones',
        message: `A protocol holds at most ${most.milestones} milestones; this one has ${list.length}.`,
      },
    ];
  if (isObject(sources) && Object.keys(sources).length > most.sources)
    return [{ pointer: '/sources', message: `A protocol lists at most ${most.sources} sources.` }];
  return list.flatMap((milestone, index) => listFaults(milestone, `/milestones/${index}`));
};

/** More faults than anybody reads at once are cut. */
export const firstFaults = (faults: readonly ProtocolFault[]): ProtocolFault[] => faults.slice(0, most.faults);

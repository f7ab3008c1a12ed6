/**
 * The closed list of states that a milestone of a child can be in, and the flags that may stand beside a state.
 * Names are used identically in table, API and screen.
 */
export const milestoneStates = [
  'ahead',
  'open',
  'closing',
  'late',
  'waiting',
  'held',
  'partly-signed',
  'signed',
  'waived',
  'transferred',
] as const;

export type MilestoneState = (typeof milestoneStates)[number];

export const milestoneStateNames: Readonly<Record<MilestoneState, string>> = {
  ahead: 'Ahead',
  open: 'Open',
  closing: 'Closing',
  late: 'Late',
  waiting: 'Waiting',
  held: 'Held',
  'partly-signed': 'Partly signed',
  signed: 'Signed',
  waived: 'Waived',
  transferred: 'Transferred',
};

/** Flags that the planner sets; `unowned` comes from claims and is added where claims are known. */
export const milestoneFlags = ['squeezed', 'lapsed', 'unowned'] as const;
export type MilestoneFlag = (typeof milestoneFlags)[number];

/**
 * The board: every milestone of the caseload that is open and unfinished or opens within six months. Sent in columns,
 * child by child, to keep it small; closed lists travel as places in their lists.
 */
import { z } from 'zod';
import { operation } from './operation.ts';
import { idSchema, noneSchema } from './text-fields.ts';

/** id, name, initials, place in `standings`, places in `disciplines`, 1 while the account is active */
export const boardMemberSchema = z.tuple([z.string(), z.string(), z.string(), z.int(), z.array(z.int()), z.int()]);
export type BoardMember = z.infer<typeof boardMemberSchema>;

/** A part that is signed: its name, its label, who may claim and who may sign it: places in `disciplines`, -1 for the lead clinician. */
export const boardPartSchema = z.tuple([z.string(), z.string(), z.array(z.int()), z.array(z.int())]);
export type BoardPart = z.infer<typeof boardPartSchema>;

/** key, id, short title, place in `lanes`, parts */
export const boardMilestoneSchema = z.tuple([z.string(), z.string(), z.string(), z.int(), z.array(boardPartSchema)]);
export type BoardMilestone = z.infer<typeof boardMilestoneSchema>;

/** Values of the owners column beside places in `members`. */
export const nobody = -1;
export const partSigned = -2;
/** Bits of the marks column. */
export const boardMarks = { due: 1, squeezed: 2, lapsed: 4 } as const;

/**
 * id, family name, first name, site, birth day (days since 1970-01-01, -1 while expected), lead clinician and trainees
 * as places in `members`; then one column each: place in `milestones`, place in `milestoneStates`, marks, latest day
 * (-1 without a window), days from earliest to latest, and who holds each part: a single number when there is one part.
 */
export const boardChildSchema = z.tuple([
  z.string(),
  z.string(),
  z.string(),
  z.string(),
  z.int(),
  z.int(),
  z.array(z.int()),
  z.array(z.int()),
  z.array(z.int()),
  z.array(z.int()),
  z.array(z.int()),
  z.array(z.int()),
  z.array(z.union([z.int(), z.array(z.int())])),
]);
export type BoardChild = z.infer<typeof boardChildSchema>;

export const boardSchema = z.object({
  /** Counter of changes; ask for what came since. */
  version: z.int(),
  /** The team's day, in days since 1970-01-01. */
  day: z.int(),
  /** Differs when somebody on the team was added or changed. */
  team: z.string(),
  members: z.array(boardMemberSchema),
  milestones: z.array(boardMilestoneSchema),
  children: z.array(boardChildSchema),
});
export type Board = z.infer<typeof boardSchema>;

const group = 'Board';
const plain = { params: noneSchema, query: noneSchema, ifMatch: 'none', isRepeatable: false } as const;

export const readBoard = operation({
  ...plain,
  name: 'readBoard',
  group,
  summary: 'The whole caseload',
  method: 'GET',
  path: '/board',
  body: noneSchema,
  answer: boardSchema,
  status: 200,
  problems: ['not-signed-in', 'not-allowed'],
});

/**
 * The children that changed since; one that is listed without rows has nothing left on the board. `isWhole`: too much
 * has changed, read the board again. The lists hold only what the children in this answer name.
 */
export const boardChangesSchema = boardSchema.extend({ isWhole: z.boolean() });
export type BoardChanges = z.infer<typeof boardChangesSchema>;
export const readBoardChanges = operation({
  ...plain,
  name: 'readBoardChanges',
  group,
  summary: 'What changed on the board since a version',
  method: 'GET',
  path: '/board/changes',
  query: z.strictObject({ since: z.coerce.number().int().min(0) }),
  body: noneSchema,
  answer: boardChangesSchema,
  status: 200,
  problems: ['bad-input', 'not-signed-in', 'not-allowed'],
});

export const workItemSchema = z.object({
  childId: idSchema,
  childName: z.string(),
  bornOn: z.string().nullable(),
  milestone: z.string(),
  title: z.string(),
  part: z.string(),
  lane: z.string(),
  state: z.string(),
  isDue: z.boolean(),
  isUnowned: z.boolean(),
  ownerName: z.string().nullable(),
  window: z.object({ earliest: z.string(), target: z.string(), latest: z.string(), closing: z.string() }).nullable(),
  /** Until the window closes; negative when late. */
  daysLeft: z.int().nullable(),
  standsInTheWay: z.string(),
  /** Why it is in its group: "Handed to you by Ruth Alder on 28 Nov 2026". */
  note: z.string(),
});
export type WorkItem = z.infer<typeof workItemSchema>;

export const workGroups = ['cameBack', 'doNow', 'toSign', 'drafted', 'waiting', 'covers', 'late', 'looseEnds'] as const;
export type WorkGroup = (typeof workGroups)[number];

export const myWorkSchema = z.object({
  today: z.string(),
  /** Handed over, sent back, amended, or up for review since. */
  cameBack: z.array(workItemSchema),
  /** Mine: late, closing, open. */
  doNow: z.array(workItemSchema),
  toSign: z.array(workItemSchema),
  drafted: z.array(workItemSchema),
  waiting: z.array(workItemSchema),
  /** Work of somebody I cover for today. */
  covers: z.array(workItemSchema),
  /** Late with others, and mine to watch: as coordinator, lead clinician or supervisor. */
  late: z.array(workItemSchema),
  looseEnds: z.array(workItemSchema),
  /** Whole numbers behind shortened groups. */
  totals: z.record(z.enum(workGroups), z.int()),
});
export type MyWork = z.infer<typeof myWorkSchema>;
export const readMyWork = operation({
  ...plain,
  name: 'readMyWork',
  group: 'My work',
  summary: 'What is mine, by urgency',
  method: 'GET',
  path: '/my-work',
  body: noneSchema,
  answer: myWorkSchema,
  status: 200,
  problems: ['not-signed-in', 'not-allowed'],
});

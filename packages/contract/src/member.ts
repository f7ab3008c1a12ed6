/** Members of the team: invitation, disciplines, supervisors, cover, leaving. */
import { z } from 'zod';
import { disciplines } from '@weftway/team/disciplines';
import { operation } from './operation.ts';
import { emailSchema, idSchema, instantSchema, lineSchema, noneSchema, plainDateSchema } from './text-fields.ts';

export const memberStandings = ['member', 'trainee', 'administrator', 'auditor'] as const;
export const memberStatuses = ['invited', 'active', 'left'] as const;

export const memberFieldsSchema = z.strictObject({
  name: lineSchema(100, 'Write a name.'),
  email: emailSchema,
  standing: z.enum(memberStandings),
  disciplines: z.array(z.enum(disciplines)).max(5),
  supervisorId: idSchema.nullable(),
});
export type MemberFields = z.infer<typeof memberFieldsSchema>;

export const memberSchema = z.object({
  id: idSchema,
  name: z.string(),
  email: z.string(),
  standing: z.enum(memberStandings),
  disciplines: z.array(z.enum(disciplines)),
  supervisorId: idSchema.nullable(),
  status: z.enum(memberStatuses),
  version: z.int(),
  invitedAt: instantSchema.nullable(),
  leftOn: plainDateSchema.nullable(),
  /** Away: somebody covers until and including this day. */
  cover: z.object({ byId: idSchema, from: plainDateSchema, until: plainDateSchema }).nullable(),
  openClaims: z.int(),
});
export type Member = z.infer<typeof memberSchema>;

const group = 'Team';
const plain = { params: noneSchema, query: noneSchema, ifMatch: 'none', isRepeatable: false } as const;
const memberParams = z.strictObject({ memberId: idSchema });

export const listMembers = operation({
  ...plain,
  name: 'listMembers',
  group,
  summary: 'Everyone on the team',
  method: 'GET',
  path: '/members',
  body: noneSchema,
  answer: z.object({ members: z.array(memberSchema) }),
  status: 200,
  problems: ['not-signed-in', 'not-allowed'],
});

export const inviteMember = operation({
  ...plain,
  name: 'inviteMember',
  group,
  summary: 'Invite somebody by e-mail',
  method: 'POST',
  path: '/members',
  isRepeatable: true,
  body: memberFieldsSchema,
  answer: memberSchema,
  status: 201,
  problems: ['bad-input', 'not-signed-in', 'not-allowed', 'duplicate-record', 'forged-request'],
});

export const editMember = operation({
  ...plain,
  name: 'editMember',
  group,
  summary: 'Change a member',
  method: 'PATCH',
  path: '/members/:memberId',
  params: memberParams,
  ifMatch: 'required',
  body: memberFieldsSchema,
  answer: memberSchema,
  status: 200,
  problems: [
    'bad-input',
    'not-signed-in',
    'not-allowed',
    'not-found',
    'changed-meanwhile',
    'version-needed',
    'duplicate-record',
    'forged-request',
  ],
});

export const inviteAgain = operation({
  ...plain,
  name: 'inviteAgain',
  group,
  summary: 'Send the invitation again',
  method: 'POST',
  path: '/members/:memberId/invitation',
  params: memberParams,
  body: noneSchema,
  answer: memberSchema,
  status: 200,
  problems: ['not-signed-in', 'not-allowed', 'not-found', 'already-done', 'forged-request'],
});

export const openClaimSchema = z.object({
  childId: idSchema,
  childName: z.string(),
  milestone: z.string(),
  part: z.string(),
  title: z.string(),
  state: z.string(),
  latest: plainDateSchema.nullable(),
  /** Members who may hold it. */
  mayHold: z.array(idSchema),
  /** Further members who may hold it once they lead the child. */
  mayHoldAsLead: z.array(idSchema),
});

export const listOpenClaims = operation({
  ...plain,
  name: 'listOpenClaims',
  group,
  summary: 'Open milestones that a member holds',
  method: 'GET',
  path: '/members/:memberId/open-claims',
  params: memberParams,
  body: noneSchema,
  answer: z.object({
    claims: z.array(openClaimSchema),
    /** How many children in care have this member as their lead clinician, and who may lead them instead. */
    leads: z.int(),
    mayLead: z.array(idSchema),
  }),
  status: 200,
  problems: ['not-signed-in', 'not-allowed', 'not-found'],
});

/** Each open milestone goes to a named colleague, or is let go on purpose (`to` null) with a reason. */
export const handOverSchema = z.strictObject({
  items: z
    .array(
      z.strictObject({
        childId: idSchema,
        milestone: z.string().max(40),
        part: z.string().max(40),
        to: idSchema.nullable(),
      }),
    )
    .max(2000),
  reason: lineSchema(300, 'Say why.'),
});

export const handOverWork = operation({
  ...plain,
  name: 'handOverWork',
  group,
  summary: 'Hand open milestones to colleagues in one act',
  method: 'POST',
  path: '/members/:memberId/hand-over',
  params: memberParams,
  isRepeatable: true,
  body: handOverSchema,
  answer: z.object({ moved: z.int() }),
  status: 200,
  problems: ['bad-input', 'not-signed-in', 'not-allowed', 'not-found', 'milestone-not-yours', 'forged-request'],
});

/** Whoever leads children hands the lead on too: to one colleague for all of them, or to nobody on purpose (null). */
export const leavingSchema = handOverSchema.extend({ leadTo: idSchema.nullable().optional() });

export const memberLeaves = operation({
  ...plain,
  name: 'memberLeaves',
  group,
  summary: 'A member leaves: hand over all open work and close the account',
  method: 'POST',
  path: '/members/:memberId/leaving',
  params: memberParams,
  isRepeatable: true,
  body: leavingSchema,
  answer: memberSchema,
  status: 200,
  problems: ['bad-input', 'not-signed-in', 'not-allowed', 'not-found', 'work-left-unowned', 'forged-request'],
});

export const setCover = operation({
  ...plain,
  name: 'setCover',
  group,
  summary: 'Somebody covers while a member is away',
  method: 'PUT',
  path: '/members/:memberId/cover',
  params: memberParams,
  body: z.strictObject({
    cover: z.strictObject({ byId: idSchema, from: plainDateSchema, until: plainDateSchema }).nullable(),
  }),
  answer: memberSchema,
  status: 200,
  problems: ['bad-input', 'not-signed-in', 'not-allowed', 'not-found', 'forged-request'],
});

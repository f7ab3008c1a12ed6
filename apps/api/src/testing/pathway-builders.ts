/** Children and acts on their pathways for tests: only what matters to a test is named there. */
import type { Response } from 'supertest';
import type { ChildFields } from '@weftway/contract/child';
import type { Evidence, Pathway } from '@weftway/contract/pathway';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import { fieldsOfPart } from '@weftway/pathway/sign-off-evidence';
import { projectChildren } from '../pathways/project-children.ts';
import { appendEvents } from '../trail/append-events.ts';
import type { TrailEvent } from '../trail/trail-event.ts';
import { testPassword } from './test-app.ts';
import type { TestApp, TestBrowser } from './test-app.ts';

const day = (text: string): NonNullable<ChildFields['bornOn']> => text as NonNullable<ChildFields['bornOn']>; // a literal of a test

/** A term girl with a complete cleft of lip, gum and palate on the left. */
export const childFields = (
  recordNumber: string,
  change: Partial<Omit<ChildFields, 'bornOn'>> & { readonly bornOn?: string | null } = {},
): ChildFields => ({
  firstName: 'Mara',
  familyName: `Lind ${recordNumber}`,
  recordNumber,
  dueOn: null,
  isBirthEstimated: false,
  gestation: { weeks: 39, days: 2 },
  sex: 'female',
  cleft: '•••SHAL',
  isCleftProvisional: false,
  flags: [],
  syndromes: [],
  referredOn: null,
  prenatalReferralOn: null,
  teamStartOn: null,
  site: 'Tern Quay',
  leadClinicianId: 'surgeon',
  contacts: [],
  alerts: [],
  notes: '',
  ...change,
  bornOn: change.bornOn === null ? null : day(change.bornOn ?? '2026-08-20'),
});

/** Writes events as the seed does: facts, trail and board together. */
export const write = async (
  test: TestApp,
  events: readonly TrailEvent[],
  at = test.services.now().toISOString(),
): Promise<void> => {
  await test.db.transaction(async (trx) => {
    await appendEvents(trx, events, {
      at,
      actorId: 'coordinator',
      actorName: 'Test coordinator',
      actorRole: 'Team coordinator',
      requestId: 'builder',
    });
    await projectChildren(trx, [...new Set(events.flatMap((event) => event.childId ?? []))], test.services.today());
  });
};

let numbered = 0;

/** Registers a child; answers its id. */
export const addChild = async (test: TestApp, change: Parameters<typeof childFields>[1] = {}): Promise<string> => {
  numbered += 1;
  const childId = `child-${String(numbered)}`;
  await write(test, [
    {
      kind: 'child-registered',
      childId,
      after: { fields: childFields(`TE-${String(1000 + numbered)}`, change), protocolVersion: 1 },
    },
  ]);
  return childId;
};

/** Something done before this team kept records. */
export const done = (
  childId: string,
  milestone: string,
  performedOn: string,
  results: Record<string, string> = {},
  isUnverified = false,
): TrailEvent => ({
  kind: 'history-imported',
  childId,
  milestone,
  after: { performedOn, precision: 'day', isUnverified, results, source: 'Letter' },
});

export const ruleOf = (key: string): MilestoneRule => {
  const rule = defaultProtocol.milestones.find((one) => one.id === key.split(':')[0]);
  if (rule === undefined) throw new Error(`No milestone ${key}`);
  return rule;
};

/** Every field of the part: the given values, the rest left empty for a reason. */
export const evidence = (key: string, part: string, values: Readonly<Record<string, string>> = {}): Evidence =>
  Object.fromEntries(
    fieldsOfPart(ruleOf(key), part).map(({ name }) => [
      name,
      values[name] === undefined ? { value: null, emptyBecause: 'Not needed here' } : { value: values[name] },
    ]),
  );

export interface SigningAct {
  readonly part?: string;
  readonly performedOn?: string;
  readonly values?: Readonly<Record<string, string>>;
  readonly overrides?: readonly {
    readonly check: string;
    readonly reason: string;
    readonly secondName: string | null;
  }[];
  readonly password?: string;
  readonly key?: string;
}

export const signBody = (milestone: string, act: SigningAct, today: string) => {
  const part = act.part ?? ruleOf(milestone).signatures[0]?.part ?? '';
  return { part, performedOn: act.performedOn ?? today, values: evidence(milestone, part, act.values) };
};

/** Reads the sheet, then signs exactly that. */
export const sign = async (
  test: TestApp,
  browser: TestBrowser,
  childId: string,
  milestone: string,
  act: SigningAct = {},
): Promise<Response> => {
  const body = signBody(milestone, act, test.services.today());
  const sheet = await browser.post(`/children/${childId}/milestones/${milestone}/signing-sheet`, body);
  const digest = String((sheet.body as { digest?: string }).digest ?? 'none');
  const request = browser.post(`/children/${childId}/milestones/${milestone}/sign-off`, {
    ...body,
    digest,
    overrides: act.overrides ?? [],
    password: act.password ?? testPassword,
  });
  return act.key === undefined ? request : request.set('idempotency-key', act.key);
};

export const pathwayIn = (response: Response): Pathway => {
  if (response.status >= 300) throw new Error(`${String(response.status)} ${JSON.stringify(response.body)}`);
  return response.body as Pathway; // contract of the pathway operations
};

/** `/problems/not-allowed` of an answer. */
export const problemOf = (response: Response): string =>
  String((response.body as { type?: string }).type ?? response.status);

export const pointersOf = (response: Response): string[] =>
  ((response.body as { errors?: { pointer: string }[] }).errors ?? []).map(({ pointer }) => pointer);

/** Kinds of the trail lines of a child, oldest first. */
export const trailOf = async (test: TestApp, childId: string): Promise<string[]> => {
  const rows: { kind: string }[] = await test
    .db('trail_lines')
    .where({ child_id: childId })
    .orderBy('seq')
    .select('kind');
  return rows.map(({ kind }) => kind);
};

export interface BoardRow {
  readonly state: string;
  readonly earliest: string | null;
  readonly target: string | null;
  readonly latest: string | null;
  readonly owners: string;
  readonly occurrence: number;
}

export const boardRow = async (test: TestApp, childId: string, milestone: string): Promise<BoardRow | undefined> =>
  test
    .db('board_rows')
    .where({ child_id: childId, milestone })
    .first('state', 'earliest', 'target', 'latest', 'owners', 'occurrence');

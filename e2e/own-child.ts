/** A child of one's own for a journey, so that journeys do not disturb each other; its past is signed through the API. */
import type { Child, ChildFields } from '@weftway/contract/child';
import type { Evidence } from '@weftway/contract/pathway';
import type { Page } from '@playwright/test';
import { fieldsOf, ownFamilyName, type Found } from './child-pathways.ts';
import { demoPassphrase, expect, readApi } from './fixtures.ts';

type Verb = 'post' | 'put';

/** An act through the API as the signed-in person of the page. */
export const send = async <T>(page: Page, verb: Verb, path: string, data: unknown): Promise<T> => {
  const { csrfToken } = await readApi<{ csrfToken: string }>(page, '/session');
  const answer = await page.request[verb](`/api/v1${path}`, {
    headers: { 'x-csrf-token': csrfToken, 'idempotency-key': crypto.randomUUID() },
    data,
  });
  expect(answer.ok(), `${path}: ${await answer.text()}`).toBe(true);
  return (await answer.json()) as T; // the caller names the contract's shape
};

export type OwnChild = Partial<Omit<ChildFields, 'bornOn'>> & { readonly bornOn: string };

/** Registers a child as the signed-in nurse; answers its id. */
export const registerOwnChild = async (page: Page, change: OwnChild): Promise<string> => {
  const number = `${String(Date.now()).slice(-8)}-${String(Math.floor(Math.random() * 900) + 100)}`;
  const fields = {
    firstName: 'Noor',
    familyName: `${ownFamilyName}${number}`,
    recordNumber: `ACT-${number}`,
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
    leadClinicianId: 'm-obed-nkansah',
    contacts: [],
    alerts: [],
    notes: '',
    ...change,
  };
  return (await send<Child>(page, 'post', '/children', { fields, isDistinct: true })).id;
};

interface PastAct {
  readonly on: string;
  readonly part?: string;
  readonly values?: Readonly<Record<string, string>>;
}

/** Signs a milestone as the signed-in person: the given values, the rest left empty for a reason. */
export const signPast = async (page: Page, found: Found, act: PastAct): Promise<void> => {
  const { on, part = 'milestone', values = {} } = act;
  const fields = await fieldsOf(page, found, part);
  const evidence: Evidence = Object.fromEntries(
    fields.map(({ name }) => [
      name,
      values[name] === undefined ? { value: null, emptyBecause: 'On paper' } : { value: values[name] },
    ]),
  );
  const body = { part, performedOn: on, values: evidence };
  const at = `/children/${found.childId}/milestones/${found.key}`;
  const sheet = await send<{ digest: string }>(page, 'post', `${at}/signing-sheet`, body);
  await send(page, 'post', `${at}/sign-off`, {
    ...body,
    digest: sheet.digest,
    password: demoPassphrase,
    overrides: [],
  });
};

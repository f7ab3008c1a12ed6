/** Journeys start signed in as a person of the demo team. */
import AxeBuilder from '@axe-core/playwright';
import { expect, test as base } from '@playwright/test';
import type { Browser, Page } from '@playwright/test';

/** The demo's people by what they do; the passphrase is the demo's. */
export const people = {
  coordinator: 'ruth.alder',
  surgeon: 'obed.nkansah',
  'other-surgeon': 'mireille.aubert',
  'jaw-surgeon': 'casimir.holt',
  orthodontist: 'ines.calder',
  'other-orthodontist': 'tobias.renn',
  'molding-dentist': 'yuki.sandoval',
  'speech-therapist': 'shirin.vaziri',
  'other-speech-therapist': 'hana.dvorak',
  audiologist: 'amos.tettey',
  ent: 'piet.hollander',
  paediatrician: 'wen.zhao',
  nurse: 'fergus.boyle',
  'other-nurse': 'delyth.rowan',
  psychologist: 'joan.tarrow',
  geneticist: 'lakshmi.perera',
  dentist: 'noor.castellan',
  prosthodontist: 'ivar.brandt',
  anaesthetist: 'leila.farrow',
  trainee: 'pavel.novak',
  'other-trainee': 'gwen.osei',
  administrator: 'alma.quist',
  auditor: 'basil.thorne',
} as const;

export type PersonName = keyof typeof people;

export const demoPassphrase = 'a quiet tide at tern estuary';
export const emailOf = (person: PersonName): string => `${people[person]}@tern-estuary.example`;

/** Signs the page's browser in through the API, with the page's own cookie jar. */
export const signIn = async (page: Page, person: PersonName): Promise<void> => {
  const session = (await (await page.request.get('/api/v1/session')).json()) as { csrfToken: string }; // contract of readSession
  const answer = await page.request.post('/api/v1/session', {
    headers: { 'x-csrf-token': session.csrfToken },
    data: { email: emailOf(person), password: demoPassphrase },
  });
  expect(answer.status(), `sign-in as ${person}`).toBe(200);
};

/** A second person at a second screen. */
export const openAs = async (browser: Browser, person: PersonName): Promise<Page> => {
  const context = await browser.newContext();
  const page = await context.newPage();
  await signIn(page, person);
  return page;
};

/** A read of the API as the signed-in person of the page. */
export const readApi = async <T>(page: Page, path: string): Promise<T> => {
  const answer = await page.request.get(`/api/v1${path}`);
  expect(answer.ok(), path).toBe(true);
  return (await answer.json()) as T; // the caller names the contract's shape
};

/** Nothing that the accessibility rules of WCAG 2.2 AA name. */
export const expectAccessible = async (page: Page, include?: string): Promise<void> => {
  const builder = new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']);
  const { violations } = await (include === undefined ? builder : builder.include(include)).analyze();
  expect(
    violations.map(
      (violation) => `${violation.id}: ${violation.nodes.map((node) => node.target.join(' ')).join(' | ')}`,
    ),
  ).toEqual([]);
};

export const test = base;
export { expect };

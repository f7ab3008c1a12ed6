/** What one row says about a child, laid over what is recorded. Only columns of the file count, and an empty cell changes nothing. */
import { isDeepStrictEqual } from 'node:util';
import type { ChildFields, Contact } from '@weftway/contract/child';
import type { ImportColumn } from '@weftway/contract/caseload-import';
import { parseCleftCode } from '@weftway/pathway/cleft-code';
import {
  alertsOf,
  flagsOf,
  gestationOf,
  looksLikePhone,
  relationOf,
  sexOf,
  syndromesOf,
  yesOrNoOf,
} from './cell-words.ts';
import type { RowCells } from './row-cells.ts';

type Mutable<T> = { -readonly [K in keyof T]: T[K] };
type Patch = Partial<Mutable<ChildFields>>;

const emptyContact: Contact = {
  name: '',
  relation: 'other',
  phone: '',
  email: '',
  language: '',
  needsInterpreter: false,
  mayConsent: false,
};

/** A child of whom nothing is known yet. The code of an import is provisional until a clinician has confirmed it. */
export const blankChild = (site: string): ChildFields => ({
  firstName: '',
  familyName: '',
  recordNumber: '',
  bornOn: null,
  dueOn: null,
  isBirthEstimated: false,
  gestation: null,
  sex: 'unknown',
  cleft: '',
  isCleftProvisional: true,
  flags: [],
  syndromes: [],
  referredOn: null,
  prenatalReferralOn: null,
  teamStartOn: null,
  site,
  leadClinicianId: null,
  contacts: [],
  alerts: [],
  notes: '',
});

const identityPatch = (cells: RowCells): Patch => {
  const patch: Patch = {};
  const named = {
    firstName: 'first_name',
    familyName: 'family_name',
    recordNumber: 'record_number',
    notes: 'notes',
  } as const;
  for (const name of Object.keys(named) as (keyof typeof named)[]) {
    // keys of a literal
    const text = cells.text(named[name]);
    if (text !== '') patch[name] = text;
  }
  const sex = cells.value('sex', sexOf, 'Write female, male or unknown (f, m or u).');
  if (sex !== undefined) patch.sex = sex;
  return patch;
};

const birthPatch = (cells: RowCells): Patch => {
  const patch: Patch = {};
  const birth = cells.date('birth_date');
  if (birth !== undefined) {
    patch.bornOn = birth.date;
    patch.isBirthEstimated = birth.precision !== 'day';
    if (birth.precision !== 'day')
      cells.warn(
        'birth_date',
        `Only the ${birth.precision} is known: ${birth.date} stands for it, and the birth date is marked as estimated.`,
      );
  }
  const due = cells.date('due_date');
  if (due !== undefined) {
    if (due.precision === 'day') patch.dueOn = due.date;
    else cells.fault('due_date', 'Write the whole date.');
  }
  const gestation = cells.value('gestation', gestationOf, 'Write weeks, or weeks and days such as 38+4.');
  if (gestation !== undefined) {
    if (gestation.weeks < 20 || gestation.weeks > 45) cells.fault('gestation', 'A gestation runs from 20 to 45 weeks.');
    else patch.gestation = { ...gestation };
  }
  return patch;
};

/** A referral before the birth, or of a child not yet born, has a field of its own. */
const referralPatch = (cells: RowCells, bornOn: ChildFields['bornOn']): Patch => {
  const patch: Patch = {};
  const referral = cells.date('referral_date');
  if (referral !== undefined) {
    if (bornOn !== null && referral.date >= bornOn) patch.referredOn = referral.date;
    else {
      patch.prenatalReferralOn = referral.date;
      if (bornOn !== null)
        cells.warn('referral_date', 'This is before the birth; it is kept as a referral before birth.');
    }
  }
  const start = cells.date('team_start');
  if (start !== undefined) patch.teamStartOn = start.date;
  return patch;
};

const cleftPatch = (cells: RowCells, before: ChildFields | null): Patch => {
  const patch: Patch = {};
  const text = cells.text('cleft');
  const reading = text === '' ? null : parseCleftCode(text);
  if (reading !== null && !reading.ok) cells.fault('cleft', reading.message);
  if (reading?.ok === true) patch.cleft = reading.code;
  const { flags, unknown } = flagsOf(cells.text('flags'));
  if (unknown.length > 0) cells.fault('flags', `Not a flag: ${unknown.join(', ')}.`);
  if (flags.length > 0) patch.flags = flags;
  const syndromes = syndromesOf(cells.text('syndromes'));
  if (syndromes.length > 0) patch.syndromes = syndromes;
  if (before === null || before.isCleftProvisional) return patch;
  const columns = { cleft: 'cleft', flags: 'flags', syndromes: 'syndromes' } as const satisfies Partial<
    Record<keyof ChildFields, ImportColumn>
  >;
  for (const name of Object.keys(columns) as (keyof typeof columns)[]) {
    // keys of a literal
    if (patch[name] === undefined || isDeepStrictEqual(patch[name], before[name])) continue;
    cells.fault(
      columns[name],
      'A clinician has confirmed what is recorded here; an import cannot change it. Change it in the record.',
    );
  }
  return patch;
};

/** Somebody who needs an interpreter but whom the file does not name becomes an alert. */
const unnamedPatch = (cells: RowCells, contact: Contact, hasReach: boolean, before: ChildFields | null): Patch => {
  if (hasReach) cells.fault('contact_name', 'A contact needs a name.');
  if (hasReach || !contact.needsInterpreter) return {};
  return {
    alerts: [
      ...(before?.alerts ?? []),
      { kind: 'interpreter', text: contact.language === '' ? 'Interpreter needed' : contact.language },
    ],
  };
};

const contactPatch = (cells: RowCells, before: ChildFields | null): Patch => {
  const relation = cells.value(
    'contact_relation',
    relationOf,
    'Write mother, father, parent, foster carer, guardian or other.',
  );
  const needsInterpreter = cells.value('interpreter', yesOrNoOf, 'Write yes or no.');
  const texts = {
    name: cells.text('contact_name'),
    phone: cells.text('contact_phone'),
    email: cells.text('contact_email').toLowerCase(),
    language: cells.text('language'),
  };
  const given = Object.entries({ ...texts, relation, needsInterpreter }).filter(
    ([, value]) => value !== '' && value !== undefined,
  );
  if (given.length === 0) return {};
  if (texts.phone !== '' && !looksLikePhone(texts.phone))
    cells.warn('contact_phone', 'This does not look like a telephone number.');
  const [first = emptyContact, ...others] = before?.contacts ?? [];
  const contact: Contact = { ...first, ...Object.fromEntries(given) };
  const hasReach = contact.phone !== '' || contact.email !== '' || relation !== undefined;
  return contact.name === '' ? unnamedPatch(cells, contact, hasReach, before) : { contacts: [contact, ...others] };
};

const alertPatch = (cells: RowCells, before: ChildFields | null, patch: Patch): Patch => {
  const alerts = alertsOf(cells.text('alerts'));
  if (alerts.length === 0 && patch.alerts === undefined) return {};
  // What is recorded stays: an alert is never taken away by a file.
  const all = [...(before?.alerts ?? []), ...(patch.alerts ?? []), ...alerts];
  return {
    alerts: all.filter(
      (alert, index) => all.findIndex((other) => other.kind === alert.kind && other.text === alert.text) === index,
    ),
  };
};

const sitePatch = (cells: RowCells, sites: readonly string[]): Patch => {
  const text = cells.text('site');
  if (text === '') return {};
  const site = sites.find((one) => one.toLowerCase() === text.toLowerCase());
  if (site === undefined) cells.fault('site', `The team has no such site. Its sites: ${sites.join(', ')}.`);
  return site === undefined ? {} : { site };
};

/** The child as the row leaves it. Problems are added to the cells. */
export const fieldsFromRow = (cells: RowCells, before: ChildFields | null, sites: readonly string[]): ChildFields => {
  const base = before ?? blankChild(sites[0] ?? '');
  const birth = birthPatch(cells);
  const contact = contactPatch(cells, before);
  return {
    ...base,
    ...identityPatch(cells),
    ...birth,
    ...referralPatch(cells, birth.bornOn ?? base.bornOn),
    ...cleftPatch(cells, before),
    ...contact,
    ...alertPatch(cells, before, contact),
    ...sitePatch(cells, sites),
    ...(before === null ? {} : { recordNumber: before.recordNumber }),
  };
};

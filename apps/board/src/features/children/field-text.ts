/** A field of the record in words, for the record, its history and the comparison of two versions. */
import { formatDate } from '@weftway/calendar/format-date';
import { readPlainDate } from '@weftway/calendar/plain-date';
import type { ChildFields, Contact } from '@weftway/contract/child';
import { alertWords, fieldWords, recordWords, relationWords, sexWords } from '../../words/children.ts';
import { flagWords } from '../../words/cleft.ts';

/** Names of members by id. */
export type Names = ReadonlyMap<string, string>;

export const isFieldName = (name: string): name is keyof ChildFields => name in fieldWords;

const dateText = (value: string | null): string => {
  if (value === null) return recordWords.notRecorded;
  const reading = readPlainDate(value);
  return reading.kind === 'date' ? formatDate(reading.date) : value;
};

export const contactText = (contact: Contact): string =>
  [
    `${contact.name} (${relationWords[contact.relation].toLowerCase()})`,
    contact.phone,
    contact.email,
    contact.language,
    contact.needsInterpreter ? recordWords.needsInterpreter : '',
    contact.mayConsent ? recordWords.mayConsent : '',
  ]
    .filter((part) => part !== '')
    .join(', ');

export const alertText = ({ kind, text }: ChildFields['alerts'][number]): string =>
  kind === 'other' || text.toLowerCase().includes(alertWords[kind].toLowerCase())
    ? text
    : `${alertWords[kind]}: ${text}`;

const listText = (lines: readonly string[]): string => (lines.length === 0 ? recordWords.none : lines.join('; '));

type Writers = { readonly [Name in keyof ChildFields]: (value: ChildFields[Name], names: Names) => string };

const plain = (value: string): string => (value === '' ? recordWords.none : value);
const yesOrNo = (value: boolean): string => (value ? recordWords.yes : recordWords.no);

const writers: Writers = {
  firstName: plain,
  familyName: plain,
  recordNumber: plain,
  bornOn: dateText,
  dueOn: dateText,
  isBirthEstimated: yesOrNo,
  gestation: (value) => (value === null ? recordWords.notRecorded : recordWords.weeks(value.weeks, value.days)),
  sex: (value) => sexWords[value],
  cleft: plain,
  isCleftProvisional: yesOrNo,
  flags: (value) => listText(value.map((flag) => flagWords[flag].label)),
  syndromes: listText,
  referredOn: dateText,
  prenatalReferralOn: dateText,
  teamStartOn: dateText,
  site: plain,
  leadClinicianId: (value, names) => (value === null ? recordWords.none : (names.get(value) ?? value)),
  contacts: (value) => listText(value.map(contactText)),
  alerts: (value) => listText(value.map(alertText)),
  notes: plain,
};

export const fieldText = <Name extends keyof ChildFields>(
  name: Name,
  fields: Pick<ChildFields, Name>,
  names: Names,
): string => {
  // The writer was made for this very field; the compiler cannot follow the pairing through the union.
  const write = writers[name] as (value: ChildFields[Name], names: Names) => string;
  return write(fields[name], names);
};

/** The head of a child's page as sentences: cleft, languages, who comes, who leads. */
import { formatDate } from '@weftway/calendar/format-date';
import { ageText } from '@weftway/calendar/age';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Child } from '@weftway/contract/child';
import { formatCleftCode, parseCleftCode } from '@weftway/pathway/cleft-code';
import { cleftForClinicians } from '@weftway/pathway/cleft-words';
import { pathwayWords } from '../../../words/pathway.ts';

export interface ChildSentence {
  readonly name: string;
  readonly age: string;
  readonly cleft: string;
  readonly code: string;
  readonly languages: string | null;
  readonly comesWith: string;
  readonly needsInterpreter: boolean;
}

export const childName = ({ fields }: Child): string => `${fields.firstName} ${fields.familyName}`;

const ageOf = ({ fields }: Child, today: PlainDate): string => {
  if (fields.bornOn !== null && fields.bornOn <= today) return ageText(fields.bornOn, today);
  const due = fields.dueOn ?? fields.bornOn;
  return due === null ? pathwayWords.notBorn : `${pathwayWords.notBorn}, ${pathwayWords.expected(formatDate(due))}`;
};

const cleftOf = (text: string): { cleft: string; code: string } => {
  const reading = parseCleftCode(text);
  if (!reading.ok) return { cleft: pathwayWords.noCleft, code: '' };
  return {
    cleft: cleftForClinicians(reading.code),
    code: pathwayWords.kriens(formatCleftCode(reading.code).slice(1, -1)),
  };
};

export const childSentence = (child: Child, today: PlainDate): ChildSentence => {
  const { contacts, cleft } = child.fields;
  const languages = [...new Set(contacts.map((contact) => contact.language).filter((one) => one !== ''))];
  const [first] = contacts;
  return {
    name: childName(child),
    age: ageOf(child, today),
    ...cleftOf(cleft),
    languages: languages.length === 0 ? null : pathwayWords.atHome(languages.join(' and ')),
    comesWith: first === undefined ? pathwayWords.noContact : pathwayWords.comesWith(first.name, first.relation),
    needsInterpreter: contacts.some((contact) => contact.needsInterpreter),
  };
};

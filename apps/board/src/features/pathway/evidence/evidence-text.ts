/** A value of the record as it is read. */
import { formatDate } from '@weftway/calendar/format-date';
import { readPlainDate } from '@weftway/calendar/plain-date';
import type { EvidenceValue } from '@weftway/contract/pathway';
import type { EvidenceField } from '@weftway/pathway/protocol';
import { isBlank } from '@weftway/pathway/sign-off-evidence';
import { signingWords } from '../../../words/signing.ts';

export const evidenceText = (field: EvidenceField | undefined, { value, emptyBecause }: EvidenceValue): string => {
  if (value === null || isBlank(value))
    return isBlank(emptyBecause) ? signingWords.draft.empty : signingWords.leftEmpty(emptyBecause ?? '');
  switch (field?.kind) {
    case 'yes-no':
      return value === 'yes' ? signingWords.yes : value === 'no' ? signingWords.no : value;
    case 'grade':
      return signingWords.grades[Number(value)] ?? value;
    case 'date': {
      const reading = readPlainDate(value);
      return reading.kind === 'date' ? formatDate(reading.date) : value;
    }
    case 'number':
      return field.unit === undefined ? value : `${value} ${field.unit}`;
    case 'choice':
      return value.charAt(0).toUpperCase() + value.slice(1);
    default:
      return value;
  }
};

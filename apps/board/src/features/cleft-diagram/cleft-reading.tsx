import { cleftWarnings, parseCleftCode } from '@weftway/pathway/cleft-code';
import { cleftLabel } from '@weftway/pathway/cleft-facts';
import { icd10Of } from '@weftway/pathway/cleft-icd10';
import { cleftForClinicians } from '@weftway/pathway/cleft-words';
import type { ChildFlag } from '@weftway/contract/child';
import { cleftWords } from '../../words/cleft.ts';
import { AlertIcon } from '../../ui/icons.tsx';

interface CleftReadingProps {
  readonly code: string;
  readonly flags: readonly ChildFlag[];
}

/** What a code says in words, its label of the trade and its ICD-10 code; warnings where it is rare. */
export function CleftReading({ code, flags }: CleftReadingProps) {
  const reading = parseCleftCode(code);
  if (!reading.ok) return null;
  const icd10 = icd10Of(reading.code, {
    isUvulaOnly: flags.includes('uvula_only'),
    isMidlineLip: flags.includes('midline_lip'),
    isSubmucous: flags.includes('smcp'),
  });
  return (
    <div className="flex flex-col gap-1">
      <p className="text-sentence text-ink m-0" aria-live="polite">
        {cleftForClinicians(reading.code)}. <span className="text-ink-2">{cleftLabel(reading.code)}.</span>
      </p>
      <p className="text-small text-ink-2 m-0">
        {cleftWords.icd10} {icd10 === null ? cleftWords.noIcd10 : `${icd10.code}, ${icd10.title}`}
      </p>
      {cleftWarnings(reading.code).map((warning) => (
        <p key={warning} role="status" className="text-label text-weld m-0 flex items-start gap-1.5">
          <AlertIcon size={14} />
          <span>{warning}</span>
        </p>
      ))}
    </div>
  );
}

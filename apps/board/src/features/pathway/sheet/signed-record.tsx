import { formatDate } from '@weftway/calendar/format-date';
import type { Signature } from '@weftway/contract/pathway';
import type { EvidenceField } from '@weftway/pathway/protocol';
import { Mark } from '../../../marks/mark.tsx';
import { Button } from '../../../ui/actions/button.tsx';
import { pathwayWords } from '../../../words/pathway.ts';
import { signingWords } from '../../../words/signing.ts';
import { valueOf } from '../model/evidence.ts';
import { evidenceText } from '../evidence/evidence-text.ts';

interface SignedRecordProps {
  readonly signature: Signature;
  /** The entries that it amends. */
  readonly earlier?: readonly Signature[];
  readonly fields: readonly EvidenceField[];
  readonly titleOf: (key: string) => string;
  readonly onAmend?: (() => void) | undefined;
}

/** What was signed, by whom, and with which overrides. */
export function SignedRecord({ signature, earlier = [], fields, titleOf, onAmend }: SignedRecordProps) {
  return (
    <div className="flex flex-col gap-2">
      <p className="text-body m-0 flex items-start gap-2.5">
        <span className="flex h-5 w-4 shrink-0 items-center justify-center">
          <Mark state="signed" size={13} title={null} ground="bleached" />
        </span>
        <span>
          {pathwayWords.sheet.signedBy(signature.signerName, formatDate(signature.performedOn))}
          {signature.draftedByName === null ? null : (
            <span className="text-ink-2">, {signingWords.draftedBy(signature.draftedByName)}</span>
          )}
          {signature.amendReason === null ? null : (
            <span className="text-ink-2 block">{signingWords.amend.amended(signature.amendReason)}</span>
          )}
        </span>
      </p>
      <SignedValues signature={signature} fields={fields} titleOf={titleOf} />
      {earlier.map((entry) => (
        <details key={entry.id} className="text-body pl-6.5">
          <summary className="text-ink-2 cursor-pointer">
            {signingWords.amend.earlier(entry.signerName, formatDate(entry.performedOn))}
          </summary>
          <SignedValues signature={entry} fields={fields} titleOf={titleOf} />
        </details>
      ))}
      {onAmend === undefined ? null : (
        <div className="pl-6.5">
          <Button size="small" onClick={onAmend}>
            {signingWords.amend.open}
          </Button>
        </div>
      )}
    </div>
  );
}

function SignedValues({ signature, fields, titleOf }: Pick<SignedRecordProps, 'signature' | 'fields' | 'titleOf'>) {
  return (
    <ul className="text-body m-0 list-none p-0 pl-6.5 in-[details]:pl-0">
      {fields.map((field) => (
        <li key={field.name} className="flex justify-between gap-3 py-0.5">
          <span>{field.label}</span>
          <span className="text-ink-2 min-w-0 text-right break-words">
            {evidenceText(field, valueOf(signature.values, field.name))}
          </span>
        </li>
      ))}
      {signature.overrides.map((override) => (
        <li key={override.check} className="py-0.5">
          {signingWords.overridden(
            fields.find((field) => field.name === override.check)?.label ?? titleOf(override.check),
            override.reason,
          )}
          {override.secondName === null ? null : <span className="text-ink-2"> ({override.secondName})</span>}
        </li>
      ))}
    </ul>
  );
}

import type { Evidence, Signature } from '@weftway/contract/pathway';
import type { EvidenceField } from '@weftway/pathway/protocol';
import { Mark } from '../../../marks/mark.tsx';
import { Button } from '../../../ui/actions/button.tsx';
import { Notice } from '../../../ui/notices/notice.tsx';
import { signingWords } from '../../../words/signing.ts';
import { timeOf } from '../evidence/evidence-form.tsx';
import { evidenceText } from '../evidence/evidence-text.ts';
import { isHere, valueOf } from '../model/evidence.ts';

interface SignedConflictProps {
  readonly signature: Signature;
  readonly fields: readonly EvidenceField[];
  readonly mine: Evidence;
  readonly onAmend?: (() => void) | undefined;
  readonly onLeave: () => void;
}

/** Somebody signed while this was open: the record beside what was typed, and what can be done with it. */
export function SignedConflict({ signature, fields, mine, onAmend, onLeave }: SignedConflictProps) {
  const words = signingWords.conflict;
  const typed = fields.filter((field) => isHere(mine, field));
  return (
    <Notice
      kind="conflict"
      mark={<Mark state="signed" size={14} title={null} ground="bleached" />}
      title={words.title(signature.signerName, timeOf(signature.signedAt))}
      footnote={words.note}
      actions={
        <>
          {onAmend === undefined ? null : (
            <Button look="filled" onClick={onAmend}>
              {words.amend}
            </Button>
          )}
          <Button onClick={onLeave}>{words.leave}</Button>
        </>
      }
    >
      <p className="m-0 pb-2">{words.text}</p>
      <table className="text-body w-full border-collapse text-left">
        <thead>
          <tr>
            <th className="text-fine text-ink-2 py-1 pr-2 font-normal">{words.field}</th>
            <th className="text-fine text-ink-2 py-1 pr-2 font-normal">{words.record}</th>
            <th className="text-fine text-ink-2 py-1 font-normal">{words.mine}</th>
          </tr>
        </thead>
        <tbody>
          {typed.map((field) => {
            const record = evidenceText(field, valueOf(signature.values, field.name));
            const own = evidenceText(field, valueOf(mine, field.name));
            return (
              <tr key={field.name} className="border-hair border-t align-baseline">
                <th scope="row" className="py-1 pr-2 font-normal">
                  {field.label}
                </th>
                <td className="text-ink-2 py-1 pr-2">{record}</td>
                <td className="py-1">
                  {own === record ? (
                    <span className="text-ink-2">{words.same}</span>
                  ) : (
                    <span className="border-ink border-l-4 pl-1.5 font-semibold">{own}</span>
                  )}
                </td>
              </tr>
            );
          })}
        </tbody>
      </table>
    </Notice>
  );
}

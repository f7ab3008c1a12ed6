import { fieldsOfPart } from '@weftway/pathway/sign-off-evidence';
import { useState } from 'react';
import { Button } from '../../../ui/actions/button.tsx';
import { fieldId } from '../../../ui/fields/field-frame.tsx';
import { Section } from '../../../ui/page/section.tsx';
import { signingWords } from '../../../words/signing.ts';
import { EvidenceForm } from '../evidence/evidence-form.tsx';
import { EvidenceList } from '../evidence/evidence-list.tsx';
import type { EvidenceDraft } from '../evidence/use-evidence-draft.ts';
import type { ChildPlan } from '../model/child-plan.ts';
import { countHere } from '../model/evidence.ts';
import { isAbout, type MilestoneView, type PartView } from '../model/milestone-view.ts';
import { milestonePermissions, partPermissions, type Viewer } from '../model/permissions.ts';
import { SignedConflict } from './signed-conflict.tsx';
import { SignedRecord } from './signed-record.tsx';

interface EvidencePartProps {
  readonly of: ChildPlan;
  readonly view: MilestoneView;
  readonly part: PartView;
  readonly viewer: Viewer;
  /** Present for the part that the viewer works on. */
  readonly draft: EvidenceDraft | null;
  readonly isAskedFor: boolean;
  readonly onAmend: (fromTyped: boolean) => void;
}

/** The record of one signature: signed and read-only, or a list of what is here and missing, or the form to fill it in. */
export function EvidencePart(props: EvidencePartProps) {
  const { view, part, draft, viewer } = props;
  const fields = fieldsOfPart(view.rule, part.part);
  const isSigned = part.signature !== null && (view.isFinished || view.planned.state === 'partly-signed');
  const values = draft?.values ?? part.draft?.values ?? {};
  const title = view.parts.length > 1 ? `${signingWords.evidence}: ${part.label.toLowerCase()}` : signingWords.evidence;
  if (!isSigned && view.isFinished) return null;
  return (
    <Section
      title={title}
      level={3}
      aside={
        isSigned || fields.length === 0 ? undefined : signingWords.countHere(countHere(values, fields), fields.length)
      }
    >
      <LostWork {...props} />
      {isSigned ? (
        <Signed {...props} />
      ) : (
        <Unsigned {...props} mayWrite={draft !== null && partPermissions(viewer, view, part).draft === null} />
      )}
    </Section>
  );
}

/** Somebody else signed the visit that was being written up here; the next one is awaited by now. */
function LostWork({ of, view, part, viewer, draft }: EvidencePartProps) {
  const [isLeft, setLeft] = useState(false);
  const lost = draft?.lost ?? null;
  if (lost === null || isLeft) return null;
  const signature = of.pathway.signatures.findLast(
    (one) =>
      isAbout(one.milestone, view.planned) &&
      one.part === part.part &&
      one.occurrence === lost.occurrence &&
      one.signerId !== viewer.me.id,
  );
  if (signature === undefined) return null;
  return (
    <SignedConflict
      signature={signature}
      fields={fieldsOfPart(view.rule, part.part)}
      mine={lost.values}
      onLeave={() => setLeft(true)}
    />
  );
}

function Signed({ of, view, part, viewer, draft, onAmend }: EvidencePartProps) {
  const [isLeft, setLeft] = useState(false);
  const fields = fieldsOfPart(view.rule, part.part);
  if (part.signature === null) return null;
  const mayAmend = milestonePermissions(viewer, view).amend(part);
  const wasTyping = draft !== null && draft.isTouched && part.signature.signerId !== viewer.me.id && !isLeft;
  return (
    <>
      {wasTyping ? (
        <SignedConflict
          signature={part.signature}
          fields={fields}
          mine={draft.values}
          onAmend={mayAmend ? () => onAmend(true) : undefined}
          onLeave={() => setLeft(true)}
        />
      ) : null}
      <SignedRecord
        signature={part.signature}
        earlier={part.earlier}
        fields={fields}
        titleOf={of.titleOf}
        onAmend={mayAmend ? () => onAmend(false) : undefined}
      />
    </>
  );
}

function Unsigned({ of, view, part, draft, isAskedFor, mayWrite }: EvidencePartProps & { readonly mayWrite: boolean }) {
  const [isWriting, setWriting] = useState(false);
  const fields = fieldsOfPart(view.rule, part.part);
  const values = draft?.values ?? part.draft?.values ?? {};
  if (!mayWrite || draft === null) return <EvidenceList fields={fields} values={values} />;
  if (isWriting || isAskedFor || draft.both.length > 0) {
    return (
      <>
        <EvidenceForm
          fields={fields}
          draft={draft}
          birth={of.pathway.facts.birth}
          today={of.today}
          isAskedFor={isAskedFor}
        />
        {isAskedFor ? null : (
          <div>
            <Button look="quiet" size="small" onClick={() => setWriting(false)}>
              {signingWords.backToList}
            </Button>
          </div>
        )}
      </>
    );
  }
  const record = (name: string) => {
    setWriting(true);
    requestAnimationFrame(() => {
      document.getElementById(fieldId(name))?.focus();
    });
  };
  return (
    <>
      <EvidenceList fields={fields} values={values} onRecord={record} />
      <div>
        <Button size="small" onClick={() => record('performedOn')}>
          {signingWords.fillIn}
        </Button>
      </div>
    </>
  );
}

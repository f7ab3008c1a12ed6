import { fieldsOfPart, missingFields, valueFaults } from '@weftway/pathway/sign-off-evidence';
import { lazy, Suspense, useState, type ReactNode } from 'react';
import type { Place } from '../../../queries/pathway-queries.ts';
import { fieldId } from '../../../ui/fields/field-frame.tsx';
import { SideSheet } from '../../../ui/overlays/side-sheet.tsx';
import { useEvidenceDraft } from '../evidence/use-evidence-draft.ts';
import { faultOf, isHere } from '../model/evidence.ts';
import type { PartView } from '../model/milestone-view.ts';
import { partPermissions } from '../model/permissions.ts';
import { EvidencePart } from './evidence-part.tsx';
import { MilestoneExplained } from './milestone-explained.tsx';
import type { MilestoneSheetProps } from './milestone-sheet.tsx';
import { SheetActions } from './sheet-actions.tsx';
import { SheetFacts } from './sheet-facts.tsx';
import type { OpenDialog } from './work-dialog.tsx';

const WorkDialog = lazy(() => import('./work-dialog.tsx').then((file) => ({ default: file.WorkDialog })));

interface MilestoneWorkProps extends MilestoneSheetProps {
  readonly part: PartView;
  readonly mark: ReactNode;
  /** Present where a signed milestone may be recorded once more. */
  readonly onRenew: (() => void) | undefined;
  /** Present while it is being recorded once more: back to what is signed. */
  readonly onLeave: (() => void) | undefined;
}

/** The sheet with the part that the viewer works on: one draft, one set of acts, one dialog at a time. */
export function MilestoneWork(props: MilestoneWorkProps) {
  const { of, view, viewer, part, mark, onClose } = props;
  const { facts, child } = of.pathway;
  const place: Place = { childId: child.id, milestone: view.key };
  const fields = fieldsOfPart(view.rule, part.part);
  const may = partPermissions(viewer, view, part);
  const [open, setOpen] = useState<OpenDialog>(null);
  const [isAskedFor, setAskedFor] = useState(false);
  const draft = useEvidenceDraft({
    place,
    part: part.part,
    draft: part.draft,
    fields,
    birth: facts.birth,
    today: of.today,
    isEditable: may.draft === null,
    occurrence: view.planned.occurrence,
  });
  const missing = missingFields(fields, draft.values).length + (draft.day === null || draft.day > of.today ? 1 : 0);
  const unsure = valueFaults(fields, draft.values).length;
  /** Whether all is here; else each field says what it lacks, and the first of them has the focus. */
  const isWhole = (): boolean => {
    setAskedFor(true);
    if (missing === 0 && unsure === 0) return true;
    const isDayWrong = draft.day === null || draft.day > of.today;
    const [first] = fields.filter((field) => !isHere(draft.values, field) || faultOf(draft.values, field) !== null);
    const name = isDayWrong ? 'performedOn' : first?.name;
    if (name !== undefined) requestAnimationFrame(() => document.getElementById(fieldId(name))?.focus());
    return false;
  };
  const signOff = () => {
    if (isWhole()) void draft.keepNow().then(() => setOpen({ name: 'sign' }));
  };
  const setReady = (isReady: boolean) => {
    if (!isReady || isWhole()) void draft.setReady(isReady);
  };

  return (
    <>
      <SideSheet
        key={view.key}
        title={view.title}
        mark={mark}
        onClose={onClose}
        actions={
          view.isFinished && props.onRenew === undefined ? undefined : (
            <SheetActions
              of={of}
              view={view}
              part={part}
              viewer={viewer}
              place={place}
              missing={missing}
              unsure={unsure}
              draft={draft}
              onReady={setReady}
              onAct={(name) => (name === 'sign' ? signOff() : setOpen({ name }))}
              onRenew={props.onRenew}
              onLeave={props.onLeave}
            />
          )
        }
      >
        <SheetFacts of={of} view={view} isAgain={props.onLeave !== undefined} />
        <MilestoneExplained {...props} isAgain={props.onLeave !== undefined}>
          {view.parts.map((one) => (
            <EvidencePart
              key={one.part}
              of={of}
              view={view}
              part={one}
              viewer={viewer}
              draft={one.part === part.part ? draft : null}
              isAskedFor={isAskedFor}
              onAmend={(fromTyped) => setOpen({ name: 'amend', part: one, fromTyped })}
            />
          ))}
        </MilestoneExplained>
      </SideSheet>
      {open === null ? null : (
        <Suspense fallback={null}>
          <WorkDialog {...props} place={place} open={open} draft={draft} onDone={() => setOpen(null)} />
        </Suspense>
      )}
    </>
  );
}

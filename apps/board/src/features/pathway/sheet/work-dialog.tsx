import { formatDateOfPrecision } from '@weftway/calendar/format-date';
import type { Completion } from '@weftway/pathway/pathway-facts';
import { fieldsOfPart } from '@weftway/pathway/sign-off-evidence';
import type { Place } from '../../../queries/pathway-queries.ts';
import { AmendDialog } from '../dialogs/amend-dialog.tsx';
import { BookDialog } from '../dialogs/book-dialog.tsx';
import { ConfirmDialog } from '../dialogs/confirm-dialog.tsx';
import { HandOverDialog, ReleaseDialog } from '../dialogs/hand-over-dialog.tsx';
import { HoldDialog } from '../dialogs/hold-dialog.tsx';
import { SignFlow } from '../dialogs/sign-flow.tsx';
import { WaiveDialog } from '../dialogs/waive-dialog.tsx';
import type { EvidenceDraft } from '../evidence/use-evidence-draft.ts';
import type { PartView } from '../model/milestone-view.ts';
import { clinicianOption, clinicians } from '../model/clinicians.ts';
import { mayHold } from '../model/permissions.ts';
import { recordsOf } from '../model/records-of.ts';
import type { MilestoneSheetProps } from './milestone-sheet.tsx';
import type { ActName } from './sheet-actions.tsx';

export type OpenDialog =
  { readonly name: ActName } | { readonly name: 'amend'; readonly part: PartView; readonly fromTyped: boolean } | null;

/** As it is read: "Oct 2024" where the day is not known. */
const dayOf = (done: Completion | null): string =>
  done === null ? '' : formatDateOfPrecision(done.on, done.precision ?? 'day');

interface WorkDialogProps extends MilestoneSheetProps {
  readonly part: PartView;
  readonly place: Place;
  readonly open: OpenDialog;
  readonly draft: EvidenceDraft;
  readonly onDone: () => void;
}

/** The one dialog that is open, or none. */
export function WorkDialog({ of, view, viewer, members, part, place, open, draft, onDone }: WorkDialogProps) {
  const { facts } = of.pathway;
  const { me } = viewer;
  const about = { place, title: view.title, onClose: onDone } as const;
  const records = recordsOf(of, view);
  const when = { birth: facts.birth, today: of.today } as const;
  switch (open?.name) {
    case 'sign':
      return draft.day === null ? null : (
        <SignFlow
          {...about}
          part={part.part}
          values={draft.values}
          performedOn={draft.day}
          signer={me.name}
          colleagues={clinicians(members, me.id).map(clinicianOption)}
          titleOf={of.titleOf}
        />
      );
    case 'hold':
      return <HoldDialog {...about} {...when} hold={records.hold} />;
    case 'waive':
      return (
        <WaiveDialog
          place={place}
          view={view}
          {...when}
          me={me}
          isLeadClinician={of.pathway.child.fields.leadClinicianId === me.id}
          members={members}
          onClose={onDone}
        />
      );
    case 'book':
      return <BookDialog {...about} birth={facts.birth} booked={records.booked} window={view.planned.window} />;
    case 'hand-over':
      return (
        <HandOverDialog
          {...about}
          part={part.part}
          from={part.ownerId}
          colleagues={mayHold(viewer, view, part, members)}
        />
      );
    case 'release':
      return <ReleaseDialog {...about} part={part.part} />;
    case 'confirm':
      return <ConfirmDialog {...about} doneOn={dayOf(records.unconfirmed)} signer={me.name} />;
    case 'amend':
      return open.part.signature === null ? null : (
        <AmendDialog
          {...about}
          {...when}
          signature={open.part.signature}
          fields={fieldsOfPart(view.rule, open.part.part)}
          start={open.fromTyped ? draft.values : {}}
          signer={me.name}
        />
      );
    default:
      return null;
  }
}

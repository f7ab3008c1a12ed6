import { pathwayMutations, type Place } from '../../../queries/pathway-queries.ts';
import { Button } from '../../../ui/actions/button.tsx';
import { showToast } from '../../../ui/overlays/toasts.ts';
import { signingWords } from '../../../words/signing.ts';
import { ActError } from '../dialogs/act-dialog.tsx';
import { DraftStatus } from '../evidence/evidence-form.tsx';
import type { EvidenceDraft } from '../evidence/use-evidence-draft.ts';
import type { ChildPlan } from '../model/child-plan.ts';
import type { MilestoneView, PartView } from '../model/milestone-view.ts';
import { milestonePermissions, partPermissions, type Viewer } from '../model/permissions.ts';
import { recordsOf } from '../model/records-of.ts';
import { useAct } from '../use-act.ts';

export type ActName = 'sign' | 'hold' | 'waive' | 'book' | 'hand-over' | 'release' | 'confirm';

interface SheetActionsProps {
  readonly of: ChildPlan;
  readonly view: MilestoneView;
  readonly part: PartView;
  readonly viewer: Viewer;
  readonly place: Place;
  readonly missing: number;
  readonly unsure: number;
  readonly draft: EvidenceDraft;
  readonly onAct: (name: ActName) => void;
  /** A trainee asks for a signature, or takes the draft back. */
  readonly onReady: (isReady: boolean) => void;
  readonly onRenew: (() => void) | undefined;
  readonly onLeave: (() => void) | undefined;
}

/** What can be done, the one thing to do first filled; what cannot be done yet says why. */
export function SheetActions(props: SheetActionsProps) {
  const { view, onRenew, onLeave } = props;
  if (view.isFinished) return onRenew === undefined ? null : <RenewButton onRenew={onRenew} />;
  return onLeave === undefined ? <OpenActions {...props} /> : <RenewActions {...props} onLeave={onLeave} />;
}

function OpenActions(props: SheetActionsProps) {
  const { view, part, viewer, place, draft, onAct } = props;
  const records = recordsOf(props.of, view);
  const may = partPermissions(viewer, view, part);
  const all = milestonePermissions(viewer, view);
  const claim = useAct(pathwayMutations.claim, place);
  const mayClaim = may.claim === null;
  const signReason = may.sign ?? notReady(props);
  const isUnconfirmed = view.planned.state === 'partly-signed' && records.unconfirmed !== null;
  const take = () =>
    claim.mutate(
      { body: { part: part.part } },
      { onSuccess: () => showToast({ text: signingWords.claim.done(view.title) }) },
    );
  const many = view.parts.length > 1;
  return (
    <>
      <ActError error={claim.error} />
      <div className="flex flex-wrap items-center gap-2">
        {mayClaim ? (
          <Button look={signReason === null ? 'plain' : 'filled'} isBusy={claim.isPending} onClick={take}>
            {many ? signingWords.claim.labelPart(part.label) : signingWords.claim.label}
          </Button>
        ) : null}
        {isUnconfirmed ? (
          <Button look="filled" notYet={all.confirm} onClick={() => onAct('confirm')}>
            {signingWords.confirm.label}
          </Button>
        ) : (
          <SignButton {...props} reason={signReason} />
        )}
        <TraineeReady {...props} />
        <Button notYet={all.hold} reasonPlace="elsewhere" onClick={() => onAct('hold')}>
          {records.hold === null ? signingWords.hold.label : signingWords.hold.change}
        </Button>
        <Button notYet={all.waive} reasonPlace="elsewhere" onClick={() => onAct('waive')}>
          {signingWords.waive.label}
        </Button>
        <Button notYet={all.book} reasonPlace="elsewhere" onClick={() => onAct('book')}>
          {records.booked === null ? signingWords.book.label : signingWords.book.move}
        </Button>
        {may.handOver === null ? (
          <Button onClick={() => onAct('hand-over')}>{signingWords.handOver.label}</Button>
        ) : null}
        {may.release === null ? <Button onClick={() => onAct('release')}>{signingWords.release.label}</Button> : null}
      </div>
      <Reasons
        sign={isUnconfirmed ? null : signReason}
        claim={part.ownerId === null ? may.claim : null}
        hold={all.hold}
        waive={all.waive}
        book={all.book}
      />
      {may.draft === null ? <DraftStatus status={draft.status} keptAt={draft.keptAt} /> : null}
    </>
  );
}

const notReady = ({ view, missing, unsure }: SheetActionsProps): string | null => {
  const gates = view.planned.waitsFor.filter((wait) => wait.type === 'gate' && !wait.isMet).length;
  if (gates > 0 || missing > 0) return signingWords.why.notReady(gates, missing);
  return unsure > 0 ? signingWords.why.unlikely(unsure) : null;
};

function RenewButton({ onRenew }: { readonly onRenew: () => void }) {
  return (
    <>
      <div>
        <Button onClick={onRenew}>{signingWords.renew.label}</Button>
      </div>
      <p className="text-fine text-ink-3 m-0">{signingWords.renew.why}</p>
    </>
  );
}

/** While it is recorded once more there is only that to do, or to leave it. */
function RenewActions(props: SheetActionsProps & { readonly onLeave: () => void }) {
  const { view, part, viewer, draft } = props;
  const reason = partPermissions(viewer, view, part).sign ?? notReady(props);
  return (
    <>
      <div className="flex flex-wrap items-center gap-2">
        <SignButton {...props} reason={reason} />
        <TraineeReady {...props} />
        <Button onClick={props.onLeave}>{signingWords.renew.leave}</Button>
      </div>
      {reason === null ? null : <p className="text-small text-ink-2 m-0">{reason}</p>}
      <DraftStatus status={draft.status} keptAt={draft.keptAt} />
    </>
  );
}

/** Pressing it before it is ready shows at each field what is missing. */
function SignButton({ view, part, viewer, reason, onAct }: SheetActionsProps & { readonly reason: string | null }) {
  const may = partPermissions(viewer, view, part);
  const label = view.parts.length > 1 ? signingWords.signOffPart(part.label) : signingWords.signOff;
  return (
    <Button
      look={reason === null ? 'filled' : 'plain'}
      notYet={reason}
      reasonPlace="elsewhere"
      onClick={() => onAct('sign')}
      onClickCapture={may.sign === null && reason !== null ? () => onAct('sign') : undefined}
    >
      {label}
    </Button>
  );
}

function TraineeReady({ viewer, view, part, draft, onReady }: SheetActionsProps) {
  if (viewer.me.standing !== 'trainee' || partPermissions(viewer, view, part).draft !== null) return null;
  return (
    <Button look={draft.isReady ? 'plain' : 'filled'} onClick={() => onReady(!draft.isReady)}>
      {draft.isReady ? signingWords.notReady : signingWords.ready}
    </Button>
  );
}

interface ReasonsProps {
  readonly sign: string | null;
  readonly claim: string | null;
  readonly hold: string | null;
  readonly waive: string | null;
  readonly book: string | null;
}

/** Each reason once, with the buttons that it is for. */
function Reasons({ sign, claim, hold, waive, book }: ReasonsProps) {
  const named: readonly (readonly [string, string | null])[] = [
    [signingWords.hold.label, hold],
    [signingWords.waive.label, waive],
    [signingWords.book.label, book],
    [signingWords.claim.label, claim],
  ];
  const byReason = new Map<string, string[]>();
  for (const [label, reason] of named)
    if (reason !== null) byReason.set(reason, [...(byReason.get(reason) ?? []), label]);
  return (
    <>
      {sign === null ? null : <p className="text-small text-ink-2 m-0">{sign}</p>}
      {[...byReason].map(([reason, labels]) =>
        reason === sign ? null : (
          <p key={reason} className="text-fine text-ink-3 m-0">
            {signingWords.blocked(labels, reason)}
          </p>
        ),
      )}
    </>
  );
}

import type { ReactNode } from 'react';
import { pathwayMutations } from '../../../queries/pathway-queries.ts';
import { showToast } from '../../../ui/overlays/toasts.ts';
import { signingWords } from '../../../words/signing.ts';
import { namingOf } from '../model/child-plan.ts';
import { isAbout, viewNamed, type MilestoneView } from '../model/milestone-view.ts';
import { partPermissions } from '../model/permissions.ts';
import { useAct } from '../use-act.ts';
import { MilestoneHistory } from './milestone-history.tsx';
import type { MilestoneSheetProps } from './milestone-sheet.tsx';
import { Reckoning } from './reckoning.tsx';
import { WaitsFor, WillMove, type WaitLine } from './waits-for.tsx';
import { WhatIf } from './what-if.tsx';

type MilestoneExplainedProps = MilestoneSheetProps & {
  /** Recorded once more: its dates are those of the first time and explain nothing now. */
  readonly isAgain: boolean;
  readonly children: ReactNode;
};

/** Why these dates, what it waits for, the record, what would move, what happened. */
export function MilestoneExplained(props: MilestoneExplainedProps) {
  const { of, views, view, onOpen, children } = props;
  const { planned } = view;
  const moved = [...new Set(planned.moves.flatMap((id) => viewNamed(views, id, planned.side) ?? []))].filter(
    (one) => !one.isFinished,
  );
  const history = (
    <MilestoneHistory
      entries={of.pathway.history.filter((entry) => entry.milestone !== null && isAbout(entry.milestone, planned))}
      past={planned.past}
    />
  );
  if (props.isAgain)
    return (
      <>
        {children}
        <WillMove views={moved} onOpen={onOpen} />
        {history}
      </>
    );
  const sources = view.rule.sources.flatMap((name) => of.protocol.sources[name] ?? []);
  return (
    <>
      {view.isFinished ? null : (
        <>
          <Reckoning
            planned={planned}
            naming={namingOf(of)}
            protocolVersion={of.pathway.protocolVersion}
            sources={sources}
          />
          <Waits {...props} />
        </>
      )}
      {children}
      {view.isFinished ? (
        <Reckoning
          planned={planned}
          naming={namingOf(of)}
          protocolVersion={of.pathway.protocolVersion}
          sources={sources}
        />
      ) : null}
      <WillMove views={moved} onOpen={onOpen} />
      {view.isFinished ? null : <WhatIf of={of} milestone={view.key} />}
      {history}
    </>
  );
}

function Waits({ of, views, view, viewer, onOpen }: MilestoneExplainedProps) {
  const lines = view.planned.waitsFor.map((wait): Omit<WaitLine, 'onClaim'> => ({
    wait,
    title: of.titleOf(wait.milestone),
    view: viewNamed(views, wait.milestone, view.planned.side),
  }));
  return (
    <ClaimableWaits
      lines={lines}
      childId={of.pathway.child.id}
      partFor={(other) =>
        other.parts.find((part) => part.ownerId === null && partPermissions(viewer, other, part).claim === null)
          ?.part ?? null
      }
      onOpen={onOpen}
    />
  );
}

interface ClaimableWaitsProps {
  readonly lines: readonly Omit<WaitLine, 'onClaim'>[];
  readonly childId: string;
  /** The part that the viewer may claim, or null. */
  readonly partFor: (view: MilestoneView) => string | null;
  readonly onOpen: (key: string) => void;
}

function ClaimableWaits({ lines, childId, partFor, onOpen }: ClaimableWaitsProps) {
  const claimable = lines.find(
    ({ wait, view }) => !wait.isMet && view !== undefined && view.unowned && partFor(view) !== null,
  )?.view;
  const claim = useAct(pathwayMutations.claim, { childId, milestone: claimable?.key ?? '' });
  const take = (view: MilestoneView) =>
    claim.mutate(
      { body: { part: partFor(view) ?? '' } },
      { onSuccess: () => showToast({ text: signingWords.claim.done(view.title) }) },
    );
  return (
    <WaitsFor
      lines={lines.map((line) =>
        line.view !== undefined && line.view === claimable ? { ...line, onClaim: () => take(claimable) } : line,
      )}
      onOpen={onOpen}
    />
  );
}

import type { Member } from '@weftway/contract/member';
import { useState } from 'react';
import { Mark } from '../../../marks/mark.tsx';
import { SideSheet } from '../../../ui/overlays/side-sheet.tsx';
import type { ChildPlan } from '../model/child-plan.ts';
import { isAbout, type ChildViews, type MilestoneView } from '../model/milestone-view.ts';
import type { Viewer } from '../model/permissions.ts';
import { mayRenew, renewedView } from '../model/renewal.ts';
import { MilestoneWork } from './milestone-work.tsx';
import { partToWorkOn } from './use-work.ts';

export interface MilestoneSheetProps {
  readonly of: ChildPlan;
  readonly views: ChildViews;
  readonly view: MilestoneView;
  readonly viewer: Viewer;
  readonly members: readonly Member[];
  readonly onOpen: (key: string) => void;
  readonly onClose: () => void;
}

/** Everything about one milestone, beside the ruler; a signed one that goes stale can be recorded once more. */
export function MilestoneSheet(props: MilestoneSheetProps) {
  const { of, view, viewer } = props;
  const signed = of.pathway.signatures.filter((one) => isAbout(one.milestone, view.planned)).length;
  const isBegun = view.planned.isRenewable && view.parts.some((part) => part.draft !== null);
  // Once the new record is signed there is one signature more, and the sheet shows it as signed again.
  const [renewedAfter, setRenewedAfter] = useState<number | null>(isBegun ? signed : null);
  const isRenewing = view.planned.isRenewable && renewedAfter === signed;
  return (
    <SheetOfPart
      {...props}
      key={isRenewing ? 'again' : 'as-planned'}
      view={isRenewing ? renewedView(view) : view}
      onRenew={!isRenewing && mayRenew(viewer, view) ? () => setRenewedAfter(signed) : undefined}
      onLeave={isRenewing ? () => setRenewedAfter(null) : undefined}
    />
  );
}

interface SheetOfPartProps extends MilestoneSheetProps {
  readonly onRenew: (() => void) | undefined;
  readonly onLeave: (() => void) | undefined;
}

function SheetOfPart(props: SheetOfPartProps) {
  const { view, viewer, onClose } = props;
  // The part stays the same while the sheet is open, so that nothing typed goes when somebody else signs it.
  const [chosen] = useState(() => partToWorkOn(viewer, view)?.part);
  const part = view.parts.find((one) => one.part === chosen);
  const mark = <Mark state={view.planned.state} unowned={view.unowned} size={20} title={null} ground="bleached" />;
  if (part === undefined) return <SideSheet title={view.title} mark={mark} onClose={onClose} children={null} />;
  return <MilestoneWork {...props} part={part} mark={mark} />;
}

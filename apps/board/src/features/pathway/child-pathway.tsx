import { useQuery } from '@tanstack/react-query';
import type { Member } from '@weftway/contract/member';
import type { Session } from '@weftway/contract/session';
import { lazy, Suspense, useMemo, useState } from 'react';
import { pathwayQueries } from '../../queries/pathway-queries.ts';
import { PeriodChoice } from '../../ruler/period-choice.tsx';
import { Button } from '../../ui/actions/button.tsx';
import { Menu } from '../../ui/actions/menu.tsx';
import { Segment } from '../../ui/actions/segment.tsx';
import { PrintIcon } from '../../ui/icons.tsx';
import { EmptyState } from '../../ui/notices/empty-state.tsx';
import { SheetLayout } from '../../ui/overlays/side-sheet.tsx';
import { pathwayWords } from '../../words/pathway.ts';
import { ChildHead } from './head/child-head.tsx';
import { childName } from './head/child-sentence.ts';
import { PathwayList } from './list/pathway-list.tsx';
import { childPlan, type ChildPlan } from './model/child-plan.ts';
import { childViews, viewNamed, type ChildViews, type MilestoneView } from './model/milestone-view.ts';
import { childPermissions, viewerOf, type Viewer } from './model/permissions.ts';
import { PrintPart } from './print/print-part.tsx';
import { MovedList } from './ruler/moved-list.tsx';
import { PathwayRuler } from './ruler/pathway-ruler.tsx';
import { whatMoved, type WhatMoved } from './ruler/what-moved.ts';
import { MilestoneSheet } from './sheet/milestone-sheet.tsx';
import { useIsPrinting, usePageState, type PageState } from './use-page-state.ts';

// Dialogs come when they are first opened: they bring the catalogue and the search field with them.
const FindingDialog = lazy(() =>
  import('./dialogs/finding-dialog.tsx').then((file) => ({ default: file.FindingDialog })),
);
const OwnMilestoneDialog = lazy(() =>
  import('./dialogs/own-milestone-dialog.tsx').then((file) => ({ default: file.OwnMilestoneDialog })),
);

interface ChildPathwayProps {
  readonly of: ChildPlan;
  readonly session: Session;
  readonly members: readonly Member[];
}

/** The child's page below the frame: head, ruler or list, and the sheet of the milestone that is open. */
export function ChildPathway({ of, session, members }: ChildPathwayProps) {
  const { me } = session;
  const page = usePageState();
  const names = useMemo(() => new Map(members.map((member) => [member.id, member.name])), [members]);
  const views = useMemo(() => childViews(of, (id) => names.get(id) ?? ''), [of, names]);
  if (me === null) return null;
  const viewer = viewerOf(me, of.pathway);
  const { child } = of.pathway;
  const selected = page.milestone === null ? undefined : viewNamed(views, page.milestone);
  const lead = child.fields.leadClinicianId;
  return (
    <>
      <ChildHead
        child={child}
        today={of.today}
        leadName={lead === null ? null : (names.get(lead) ?? null)}
        alarms={alarmsOf(of)}
        actions={<HeadActions of={of} viewer={viewer} />}
      />
      <SheetLayout
        sheet={
          selected === undefined ? null : (
            <div className="no-print bg-bleached flex shrink-0 self-start md:sticky md:top-15 md:z-10 md:h-[calc(100vh-3.75rem)]">
              <MilestoneSheet
                key={selected.key}
                of={of}
                views={views}
                view={selected}
                viewer={viewer}
                members={members}
                onOpen={page.open}
                onClose={() => page.open(null)}
              />
            </div>
          )
        }
      >
        {page.milestone !== null && selected === undefined ? (
          <p role="status" className="text-body m-0 px-6 pt-2 max-sm:px-5">
            {pathwayWords.states.noMilestone}
          </p>
        ) : null}
        <Pathway of={of} views={views} viewer={viewer} page={page} selected={selected} />
        <PrintPart of={of} views={views} team={session.team.name} who={me.name} />
      </SheetLayout>
    </>
  );
}

/** Each alarm once; two years without a review say more than one. */
const alarmsOf = ({ plan }: ChildPlan): string[] => {
  const names = new Set(plan.alarms.map((alarm) => alarm.name));
  if (names.has('lost-to-follow-up')) names.delete('review-overdue');
  return [...names].map((name) => pathwayWords.alarms[name]);
};

function HeadActions({ of, viewer }: { readonly of: ChildPlan; readonly viewer: Viewer }) {
  const [open, setOpen] = useState<'finding' | 'own' | null>(null);
  const may = childPermissions(viewer);
  const entries = [
    ...(may.recordFinding
      ? [{ key: 'finding', label: pathwayWords.finding.open, onAction: () => setOpen('finding') }]
      : []),
    ...(may.addMilestone ? [{ key: 'own', label: pathwayWords.own.open, onAction: () => setOpen('own') }] : []),
  ];
  const isOpenForActs = of.pathway.child.transferredOn === null && of.pathway.child.careEnded === null;
  return (
    <>
      {entries.length === 0 || !isOpenForActs ? null : <Menu label={pathwayWords.moreActs} entries={entries} />}
      <Button onClick={() => window.print()}>
        <PrintIcon size={14} />
        {pathwayWords.print}
      </Button>
      <Suspense fallback={null}>
        {open === 'finding' ? <FindingDialog of={of} onClose={() => setOpen(null)} /> : null}
        {open === 'own' ? <OwnMilestoneDialog of={of} onClose={() => setOpen(null)} /> : null}
      </Suspense>
    </>
  );
}

interface PathwayProps {
  readonly of: ChildPlan;
  readonly views: ChildViews;
  readonly viewer: Viewer;
  readonly page: PageState;
  readonly selected: MilestoneView | undefined;
}

function Pathway({ of, views, viewer, page, selected }: PathwayProps) {
  const isPrinting = useIsPrinting();
  const act = useQuery(pathwayQueries.lastAct(of.pathway.child.id)).data ?? null;
  const moved = useMemo(() => whatMoved(of, act, (before) => childPlan(before, of.protocol, of.today)), [of, act]);
  // What one's own act moved is shown at once; it stays until it is dismissed.
  const [shown, setShown] = useState<{ readonly act: typeof act; readonly isShown: boolean }>({ act, isShown: false });
  const isShown = moved !== null && (shown.act === act ? shown.isShown : act !== null);
  const name = childName(of.pathway.child);
  if (views.all.length === 0) {
    return (
      <div className="px-6 max-sm:px-5">
        <EmptyState kind="time" title={pathwayWords.emptyTitle}>
          {pathwayWords.emptyText}
        </EmptyState>
      </div>
    );
  }
  return (
    <div className="flex flex-col gap-2 px-6 py-2 max-sm:px-5">
      <Controls
        of={of}
        page={page}
        moved={moved}
        isShown={isShown}
        onShow={(next) => setShown({ act, isShown: next })}
      />
      {isShown && moved !== null ? <MovedList of={of} moved={moved} onOpen={page.open} /> : null}
      {page.view === 'list' && !isPrinting ? (
        <PathwayList
          views={views.all}
          today={of.today}
          selectedKey={selected?.key ?? null}
          titleOf={of.titleOf}
          hrefOf={page.hrefOf}
        />
      ) : (
        <PathwayRuler
          of={of}
          views={views}
          viewer={viewer}
          name={name}
          selected={isPrinting ? undefined : selected}
          moves={isShown && moved !== null ? moved.moves : noMoves}
          period={isPrinting ? 'all' : page.period}
          onPeriodChange={page.setPeriod}
          onSelect={page.open}
        />
      )}
    </div>
  );
}

const noMoves: WhatMoved['moves'] = [];

interface ControlsProps {
  readonly of: ChildPlan;
  readonly page: PageState;
  readonly moved: WhatMoved | null;
  readonly isShown: boolean;
  readonly onShow: (isShown: boolean) => void;
}

function Controls({ of, page, moved, isShown, onShow }: ControlsProps) {
  const words = pathwayWords.moved;
  return (
    <div className="no-print flex flex-wrap items-center justify-between gap-x-4 gap-y-2">
      {page.view === 'ruler' ? <PeriodChoice value={page.period} onChange={page.setPeriod} /> : <span />}
      <div className="flex flex-wrap items-center gap-x-3 gap-y-2">
        {moved === null ? null : (
          <span className="text-small text-ink-2" role="status">
            {moved.by === null
              ? words.summary(moved.moves.length)
              : words.byWhat(of.titleOf(moved.by), moved.moves.length)}{' '}
            <Button look="quiet" size="small" aria-expanded={isShown} onClick={() => onShow(!isShown)}>
              {isShown ? words.hide : words.show}
            </Button>
          </span>
        )}
        <Segment
          label={pathwayWords.view}
          value={page.view}
          onChange={page.setView}
          options={[
            { value: 'ruler', label: pathwayWords.ruler },
            { value: 'list', label: pathwayWords.list },
          ]}
        />
      </div>
    </div>
  );
}

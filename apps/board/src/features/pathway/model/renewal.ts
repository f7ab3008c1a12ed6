/** A signed milestone that others need fresh (an airway screen, a hearing test) is recorded once more. */
import type { MilestoneView } from './milestone-view.ts';
import { partPermissions, type Viewer } from './permissions.ts';

/** The milestone as its next occurrence sees it: nothing of it is signed yet, and it waits for nothing. */
export const renewedView = (view: MilestoneView): MilestoneView => ({
  ...view,
  planned: { ...view.planned, state: 'open', occurrence: view.planned.occurrence + 1, waitsFor: [] },
  parts: view.parts.map((part) => ({ ...part, signature: null, earlier: [] })),
  doneOn: null,
  isFinished: false,
});

/** Whether this person may record it once more. */
export const mayRenew = (viewer: Viewer, view: MilestoneView): boolean => {
  if (!view.planned.isRenewable) return false;
  const renewed = renewedView(view);
  return renewed.parts.some((part) => partPermissions(viewer, renewed, part).draft === null);
};

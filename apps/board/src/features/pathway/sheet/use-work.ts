/** What the open milestone needs to be worked on: which part, its fields, what is missing, what may be done. */
import type { Viewer } from '../model/permissions.ts';
import { partPermissions } from '../model/permissions.ts';
import type { MilestoneView, PartView } from '../model/milestone-view.ts';

const isOpen = (view: MilestoneView, part: PartView): boolean =>
  view.planned.state !== 'partly-signed' || part.signature === null;

/** The part to work on: one that the viewer may sign, else may prepare, else the first that is not signed. */
export const partToWorkOn = (viewer: Viewer, view: MilestoneView): PartView | undefined => {
  const open = view.parts.filter((part) => isOpen(view, part));
  const may = open.map((part) => ({ part, may: partPermissions(viewer, view, part) }));
  return (
    (may.find((one) => one.may.sign === null) ?? may.find((one) => one.may.draft === null))?.part ??
    open[0] ??
    view.parts[0]
  );
};

import type { PlainDate } from '@weftway/calendar/plain-date';
import type { MilestoneState } from '@weftway/pathway/milestone-state';
import type { Lane } from '@weftway/team/lanes';

export interface RulerWindow {
  readonly earliest: PlainDate;
  readonly target: PlainDate;
  readonly latest: PlainDate;
  /** First day of the closing part. */
  readonly closing: PlainDate;
}

export interface RulerLane {
  readonly lane: Lane;
  readonly name: string;
  /** `null`: no one holds the lane. */
  readonly ownerName: string | null;
  /** The viewer's own thread, the only dyed one. */
  readonly isOwn: boolean;
}

export interface RulerItem {
  readonly key: string;
  readonly lane: Lane;
  readonly label: string;
  readonly state: MilestoneState;
  readonly unowned: boolean;
  readonly window: RulerWindow | null;
  /** The date it was signed for, or the day of the decision to waive. */
  readonly knotOn: PlainDate | null;
  /** An earlier occurrence of something that repeats. */
  readonly isPast: boolean;
  /** Where the window was before it moved. */
  readonly ghostWindow?: RulerWindow | null | undefined;
  /** Who holds it, for its accessible name; the lane's owner when absent. */
  readonly ownerName?: string | null | undefined;
  /** Fixes the track; absent: the first free one. */
  readonly track?: number | undefined;
}

export interface RulerDependency {
  readonly key: string;
  readonly isMet: boolean;
}

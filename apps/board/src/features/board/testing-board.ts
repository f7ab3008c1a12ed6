/** Rows and boards for tests, naming only what matters to them. */
import type { MilestoneState } from '@weftway/pathway/milestone-state';
import {
  inBoardOrder,
  plainText,
  rowIdOf,
  type BoardColleague,
  type BoardModel,
  type BoardRow,
  type Holder,
  type MilestoneHead,
} from '../../queries/board-model.ts';

export const testDay = 20_788;

export const speechAtTwo: MilestoneHead = {
  key: 'SPCH-02',
  id: 'SPCH-02',
  title: 'Speech at 18 months',
  lane: 'speech',
  parts: [{ name: 'milestone', label: 'Sign-off', mayClaim: ['speech-therapist'], maySign: ['speech-therapist'] }],
};
export const palateRepair: MilestoneHead = {
  key: 'SURG-03',
  id: 'SURG-03',
  title: 'Palate repair',
  lane: 'surgery',
  parts: [{ name: 'milestone', label: 'Sign-off', mayClaim: ['surgeon'], maySign: ['surgeon'] }],
};

interface RowWish {
  readonly childId?: string;
  readonly firstName?: string;
  readonly familyName?: string;
  readonly site?: string;
  readonly milestone?: MilestoneHead;
  readonly state?: MilestoneState;
  /** Days from today to the close. */
  readonly closesIn?: number | null;
  readonly holders?: readonly Holder[];
}

export const aRow = (wish: RowWish = {}): BoardRow => {
  const {
    childId = 'c-1',
    firstName = 'Hamza',
    familyName = 'Siddiqui',
    site = 'Tern Quay',
    milestone = speechAtTwo,
    state = 'open',
    closesIn = 30,
    holders = ['m-shirin'],
  } = wish;
  const closes = closesIn === null ? null : testDay + closesIn;
  return {
    id: rowIdOf(childId, milestone.key),
    child: {
      id: childId,
      familyName,
      firstName,
      shortName: `${familyName}, ${firstName.charAt(0)}`,
      searchText: plainText(`${firstName} ${familyName}`),
      site,
      birthDay: testDay - 500,
      leadId: null,
      traineeIds: [],
    },
    milestone,
    state,
    isDue: false,
    isSqueezed: false,
    opens: closes === null ? null : closes - 60,
    closes,
    holders,
    isUnowned: holders.includes(null),
  };
};

const colleague = (
  id: string,
  name: string,
  initials: string,
  discipline: BoardColleague['disciplines'][number],
): BoardColleague => ({ id, name, initials, standing: 'member', disciplines: [discipline], isActive: true });

export const aBoard = (rows: readonly BoardRow[]): BoardModel => ({
  version: 7,
  day: testDay,
  team: '4.4',
  colleagues: new Map(
    [
      colleague('m-shirin', 'Shirin Vaziri', 'SV', 'speech-therapist'),
      colleague('m-hana', 'Hana Dvořák', 'HD', 'speech-therapist'),
      colleague('m-obed', 'Obed Nkansah', 'ON', 'surgeon'),
      colleague('m-ruth', 'Ruth Alder', 'RA', 'coordinator'),
    ].map((one) => [one.id, one]),
  ),
  rows: [...rows].sort(inBoardOrder),
  fresh: new Set(),
});

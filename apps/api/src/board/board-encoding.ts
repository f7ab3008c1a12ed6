/** Puts rows of the projection into the columns of the contract. */
import { holdersOfPart } from '@weftway/abilities/milestone-subject';
import { toEpochDay } from '@weftway/calendar/plain-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { BoardChild, BoardMember, BoardMilestone, BoardPart } from '@weftway/contract/board';
import { nobody, partSigned } from '@weftway/contract/board';
import { milestoneStates } from '@weftway/pathway/milestone-state';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import { disciplines } from '@weftway/team/disciplines';
import { lanes } from '@weftway/team/lanes';
import { standings } from '@weftway/team/standings';
import { ruleIdOf } from '../pathways/whole-protocol.ts';

/** child, milestone, state, marks, earliest, latest, owners */
export type RowColumns = readonly [string, string, string, number, string | null, string | null, string];

export interface ChildOnBoard {
  readonly id: string;
  readonly familyName: string;
  readonly firstName: string;
  readonly site: string;
  readonly bornOn: string | null;
  readonly leadId: string | null;
  readonly trainees: readonly string[];
  /** Rules of this child's protocol by id, with those added for the child alone. */
  readonly rules: ReadonlyMap<string, MilestoneRule>;
  readonly rows: readonly RowColumns[];
}

export interface MemberOnBoard {
  readonly id: string;
  readonly name: string;
  readonly standing: string;
  readonly disciplines: readonly string[];
  readonly isActive: boolean;
}

const statePlaces = new Map<string, number>(milestoneStates.map((state, place) => [state, place]));
const disciplinePlaces = new Map<string, number>(disciplines.map((one, place) => [one, place]));

/** "Sunniva Vik" is SV, "Ole" is O. */
export const initialsOf = (name: string): string => {
  const words = name.split(/\s+/).filter((word) => word !== '');
  const ends = words.length > 1 ? [words[0], words[words.length - 1]] : words;
  return ends
    .map((word) => [...(word ?? '')][0] ?? '')
    .join('')
    .toUpperCase();
};

const placesOf = (signers: readonly string[]): number[] => signers.map((one) => disciplinePlaces.get(one) ?? -1);

const memberColumns = (member: MemberOnBoard): BoardMember => [
  member.id,
  member.name,
  initialsOf(member.name),
  standings.indexOf(member.standing as (typeof standings)[number]), // guarded by the column's check
  member.disciplines.map((one) => disciplinePlaces.get(one) ?? -1),
  member.isActive ? 1 : 0,
];

const milestoneColumns = (key: string, rule: MilestoneRule): BoardMilestone => [
  key,
  rule.id,
  rule.shortTitle,
  lanes.indexOf(rule.lane),
  rule.signatures.map(({ part, label, disciplines: signers }): BoardPart => [
    part,
    label,
    placesOf(holdersOfPart(rule, part)),
    placesOf(signers),
  ]),
];

type OwnerPairs = readonly (readonly [string, string | null])[];
type Columns = readonly [number[], number[], number[], number[], number[], (number | number[])[]];

/** A milestone of the list, with what its owners look like for each way in which they are written down. */
interface Place {
  readonly at: number;
  readonly rule: MilestoneRule;
  readonly owners: Map<string, number | number[]>;
}

/** The lists that children refer to by place; they only ever grow, so places stay good for as long as the encoder lives. */
export class BoardEncoder {
  readonly milestones: BoardMilestone[] = [];
  /** By the rules of a protocol, then by key; the same few are asked for thousands of times. */
  readonly #places = new WeakMap<ReadonlyMap<string, MilestoneRule>, Map<string, Place | null>>();
  readonly #memberIds: string[] = [];
  readonly #memberPlaces = new Map<string, number>();
  readonly #listed = new Map<string, number>();
  readonly #days = new Map<string, number>();

  child(child: ChildOnBoard): BoardChild {
    const columns: Columns = [[], [], [], [], [], []];
    const places = this.#places.get(child.rules) ?? new Map<string, Place | null>();
    this.#places.set(child.rules, places);
    for (const row of child.rows) this.#addRow(places, child.rules, row, columns);
    const lead = child.leadId === null ? nobody : this.#memberPlace(child.leadId);
    const trainees = child.trainees.map((id) => this.#memberPlace(id));
    const birthDay = child.bornOn === null ? -1 : this.#day(child.bornOn);
    return [child.id, child.familyName, child.firstName, child.site, birthDay, lead, trainees, ...columns];
  }

  /** Everybody that a child named so far, in their places. */
  members(all: ReadonlyMap<string, MemberOnBoard>): BoardMember[] {
    const gone = (id: string): MemberOnBoard => ({
      id,
      name: '',
      standing: 'member',
      disciplines: [],
      isActive: false,
    });
    return this.#memberIds.map((id) => memberColumns(all.get(id) ?? gone(id)));
  }

  /** Gives everyone a place, so that a colleague without any work can be offered some. */
  know(ids: Iterable<string>): void {
    for (const id of ids) this.#memberPlace(id);
  }

  #addRow(
    places: Map<string, Place | null>,
    rules: ReadonlyMap<string, MilestoneRule>,
    row: RowColumns,
    columns: Columns,
  ): void {
    const [, key, state, marks, earliest, latest, ownersText] = row;
    let place = places.get(key);
    if (place === undefined) {
      place = this.#newPlace(key, rules.get(ruleIdOf(key)));
      places.set(key, place);
    }
    if (place === null) return;
    const closes = latest === null ? -1 : this.#day(latest);
    columns[0].push(place.at);
    columns[1].push(statePlaces.get(state) ?? 0);
    columns[2].push(marks);
    columns[3].push(closes);
    columns[4].push(latest === null || earliest === null ? 0 : closes - this.#day(earliest));
    columns[5].push(place.owners.get(ownersText) ?? this.#ownersOf(place, ownersText));
  }

  #ownersOf({ rule, owners }: Place, text: string): number | number[] {
    const pairs = JSON.parse(text) as OwnerPairs; // written by the projection
    const ofParts = rule.signatures.map(({ part }) => {
      const pair = pairs.find(([name]) => name === part);
      if (pair === undefined) return partSigned;
      return pair[1] === null ? nobody : this.#memberPlace(pair[1]);
    });
    const encoded = ofParts.length === 1 ? (ofParts[0] ?? nobody) : ofParts;
    owners.set(text, encoded);
    return encoded;
  }

  #newPlace(key: string, rule: MilestoneRule | undefined): Place | null {
    if (rule === undefined) return null;
    const columns = milestoneColumns(key, rule);
    const text = JSON.stringify(columns);
    const at = this.#listed.get(text) ?? this.milestones.push(columns) - 1;
    this.#listed.set(text, at);
    return { at, rule, owners: new Map() };
  }

  #day(date: string): number {
    const known = this.#days.get(date);
    if (known !== undefined) return known;
    const day = toEpochDay(date as PlainDate); // dates of the record were checked when they were stored
    this.#days.set(date, day);
    return day;
  }

  #memberPlace(id: string): number {
    const known = this.#memberPlaces.get(id);
    if (known !== undefined) return known;
    this.#memberIds.push(id);
    this.#memberPlaces.set(id, this.#memberIds.length - 1);
    return this.#memberIds.length - 1;
  }
}

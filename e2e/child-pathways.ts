/** Finds children of the demo by what is on their path, and fills in the record of a milestone as a person would. */
import type { Board } from '@weftway/contract/board';
import type { Pathway } from '@weftway/contract/pathway';
import { milestoneStates, type MilestoneState } from '@weftway/pathway/milestone-state';
import type { EvidenceField, Protocol } from '@weftway/pathway/protocol';
import type { Locator, Page } from '@playwright/test';
import { readApi } from './fixtures.ts';

export interface Found {
  readonly childId: string;
  readonly key: string;
}

/** Children that a journey registers for itself; no other journey takes them. */
export const ownFamilyName = 'Ferry ACT-';

/** Children on whose path a milestone is in one of the states, in the order of the board. */
export const childrenWith = async (
  page: Page,
  milestone: RegExp,
  states: readonly MilestoneState[],
): Promise<readonly Found[]> => {
  const board = await readApi<Board>(page, '/board');
  return board.children.flatMap((child) => {
    const [childId, familyName] = child;
    if (familyName.startsWith(ownFamilyName)) return [];
    const [places, stateOf] = [child[7], child[8]];
    return places.flatMap((place, at): Found[] => {
      const key = board.milestones[place]?.[0] ?? '';
      const state = milestoneStates[stateOf[at] ?? -1];
      return state !== undefined && milestone.test(key) && states.includes(state) ? [{ childId, key }] : [];
    });
  });
};

export const firstWith = async (page: Page, milestone: RegExp, states: readonly MilestoneState[]): Promise<Found> => {
  const [found] = await childrenWith(page, milestone, states);
  if (found === undefined) throw new Error(`The demo has nobody with ${String(milestone)} ${states.join(' or ')}`);
  return found;
};

export const fieldsOf = async (
  page: Page,
  { childId, key }: Found,
  part: string,
): Promise<readonly EvidenceField[]> => {
  const { protocolVersion } = await readApi<Pathway>(page, `/children/${childId}/pathway`);
  const { protocol } = await readApi<{ protocol: Protocol }>(page, `/protocols/${String(protocolVersion)}`);
  const rule = protocol.milestones.find((one) => one.id === key.split(':')[0]);
  return (rule?.evidence ?? []).filter((field) => (field.part ?? rule?.signatures[0]?.part) === part);
};

const likelyNumber = ({ likely, min = 0 }: EvidenceField): string =>
  String(likely === undefined ? min : Math.round((likely[0] + likely[1]) / 2));

const fillField = async (sheet: Locator, field: EvidenceField): Promise<void> => {
  const group = sheet.getByRole('group', { name: field.label, exact: true });
  const input = sheet.getByLabel(field.label, { exact: true });
  if (await group.count()) {
    const wanted =
      field.kind === 'yes-no'
        ? group.getByRole('radio', { name: 'No', exact: true })
        : group.getByRole('radio').first();
    await wanted.check();
  } else if ((await input.evaluate((element) => element.tagName)) === 'SELECT') await input.selectOption({ index: 1 });
  else if ((await input.inputValue()) !== '') return;
  else if (field.kind === 'number') await input.fill(likelyNumber(field));
  else if (field.kind === 'date') await input.fill('20 Nov 2026');
  else await input.fill('As planned');
};

/** Opens the form in the sheet and fills in every field. */
export const fillRecord = async (sheet: Locator, fields: readonly EvidenceField[], doneOn: string): Promise<void> => {
  await sheet.getByRole('button', { name: 'Fill in the record' }).click();
  await sheet.getByLabel('Done on').fill(doneOn);
  for (const field of fields) await fillField(sheet, field);
};

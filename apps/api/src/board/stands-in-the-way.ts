/** What stands in the way of a milestone, in words: first what it is held for, then its waits, then what is to be entered. */
import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Evidence } from '@weftway/contract/pathway';
import type { PlannedMilestone, Wait } from '@weftway/pathway/pathway-plan';
import type { MilestoneRule } from '@weftway/pathway/protocol';

export interface WayWords {
  readonly planned: PlannedMilestone;
  readonly rule: MilestoneRule;
  readonly part: string;
  readonly hold: { readonly reason: string; readonly reviewOn: string } | null;
  readonly bookedOn: string | null;
  /** What has been entered for this part so far. */
  readonly drafted: Evidence | null;
  /** Short title of another milestone of the child. */
  readonly titleOf: (key: string) => string;
  /** Who holds another milestone of the child; null when nobody does or nobody needs to. */
  readonly holderOf: (key: string) => string | null;
}

const day = (text: string): string => formatDate(text as PlainDate); // dates of the record were checked when they were stored

const waitWords = (wait: Wait, { titleOf, holderOf }: WayWords): string => {
  const title = titleOf(wait.milestone);
  if (wait.cause === 'too-soon')
    return wait.until === undefined
      ? `Too soon after ${title}`
      : `Not before ${formatDate(wait.until)}, after ${title}`;
  if (wait.cause === 'stale')
    return wait.until === undefined ? `${title} is too old` : `${title} is too old since ${formatDate(wait.until)}`;
  if (wait.cause === 'result') return `The result of ${title} does not allow it`;
  if (wait.cause === 'unverified') return `${title} was done elsewhere and is not confirmed`;
  if (wait.cause === 'waived-decide') return `${title} was waived: decide how to go on`;
  const holder = holderOf(wait.milestone);
  return holder === null ? `Waits for ${title}, which no one holds` : `Waits for ${title}, with ${holder}`;
};

const isEntered = (drafted: Evidence | null, name: string): boolean => {
  const value = drafted?.[name];
  if (value === undefined) return false;
  return (value.value !== null && value.value !== '') || (value.emptyBecause ?? '') !== '';
};

/** Labels of the evidence of a part that is neither entered nor left empty for a reason. */
export const missingEvidence = (rule: MilestoneRule, part: string, drafted: Evidence | null): string[] =>
  rule.evidence
    .filter((field) => (field.part ?? rule.signatures[0]?.part) === part && !isEntered(drafted, field.name))
    .map((field) => field.label);

const evidenceWords = (labels: readonly string[], hasDraft: boolean): string => {
  const [first, ...others] = labels;
  if (first === undefined) return hasDraft ? 'Evidence complete' : 'Nothing stands in the way';
  if (others.length === 0) return `${first} to enter`;
  return hasDraft ? `${first} and ${others.length} more still to enter` : `${first} and ${others.length} more to enter`;
};

export const standsInTheWay = (words: WayWords): string => {
  const { planned, rule, part, hold, bookedOn, drafted } = words;
  if (hold !== null) return `Held: ${hold.reason}. Review on ${day(hold.reviewOn)}`;
  const unmet = planned.waitsFor.filter((wait) => !wait.isMet && wait.type !== 'soft');
  if (unmet.length > 0) {
    const told = unmet.slice(0, 2).map((wait) => waitWords(wait, words));
    return unmet.length > 2 ? `${told.join('. ')}. And ${unmet.length - 2} more` : told.join('. ');
  }
  const booked = bookedOn === null ? '' : `Booked for ${day(bookedOn)}. `;
  return booked + evidenceWords(missingEvidence(rule, part, drafted), drafted !== null);
};

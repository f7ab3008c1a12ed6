import { formatDate } from '@weftway/calendar/format-date';
import type { Member } from '@weftway/contract/member';
import { SelectField } from '../../ui/fields/select-field.tsx';
import { teamWords } from '../../words/team.ts';
import { GiveAll } from './give-all.tsx';
import { chosen, claimKey, type Choices, type OpenClaim } from './hand-over-choices.ts';
import { namesOf } from './member-lines.ts';

interface HandOverListProps {
  readonly claims: readonly OpenClaim[];
  readonly everyone: readonly Member[];
  readonly choices: Choices;
  readonly onChange: (choices: Choices) => void;
  /** What stands in a row while nothing is chosen. */
  readonly unchosen: string;
  /** Faults of the server by the key of the claim. */
  readonly faults: ReadonlyMap<string, string>;
}

const letGo = 'let-go';

/** One row a milestone, one choice a row; above it a way to give many at once. */
export function HandOverList({ claims, everyone, choices, onChange, unchosen, faults }: HandOverListProps) {
  const names = namesOf(everyone);
  const valueOf = (claim: OpenClaim): string => {
    const to = choices.get(claimKey(claim));
    return to === undefined ? '' : (to ?? letGo);
  };
  return (
    <div className="flex flex-col gap-4">
      <GiveAll claims={claims} everyone={everyone} choices={choices} onChange={onChange} />
      <ul aria-label={teamWords.work} className="m-0 flex list-none flex-col p-0">
        {claims.map((claim) => (
          <li
            key={claimKey(claim)}
            className="border-hair grid items-center gap-x-4 gap-y-1 border-t py-2 sm:grid-cols-[minmax(0,1fr)_6.5rem_13.5rem]"
          >
            <span className="text-body flex min-w-0 flex-col">
              <span className="font-semibold">{claim.childName}</span>
              <span className="text-small text-ink-2">{claim.title}</span>
            </span>
            <span className="text-small text-ink-2 figures">
              {claim.latest === null ? '' : teamWords.closesOn(formatDate(claim.latest))}
            </span>
            <SelectField
              label={`${teamWords.goesTo}: ${claim.title}, ${claim.childName}`}
              isLabelHidden
              value={valueOf(claim)}
              placeholder={unchosen}
              options={[
                ...claim.mayHold.map((id) => ({ value: id, label: names.get(id) ?? id })),
                { value: letGo, label: teamWords.letGo },
              ]}
              error={faults.get(claimKey(claim))}
              onChange={(next) =>
                onChange(chosen(choices, claim, next === '' ? undefined : next === letGo ? null : next))
              }
            />
          </li>
        ))}
      </ul>
    </div>
  );
}

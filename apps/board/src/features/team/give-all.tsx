import { useState } from 'react';
import type { Member } from '@weftway/contract/member';
import { Button } from '../../ui/actions/button.tsx';
import { SelectField } from '../../ui/fields/select-field.tsx';
import { teamWords } from '../../words/team.ts';
import { giveAll, titlesOf, type Choices, type OpenClaim } from './hand-over-choices.ts';
import { namesOf } from './member-lines.ts';

interface GiveAllProps {
  readonly claims: readonly OpenClaim[];
  readonly everyone: readonly Member[];
  readonly choices: Choices;
  readonly onChange: (choices: Choices) => void;
}

/** "Give all of … to …": everything, or every milestone of one kind. */
export function GiveAll({ claims, everyone, choices, onChange }: GiveAllProps) {
  const [title, setTitle] = useState('');
  const [to, setTo] = useState('');
  const [said, setSaid] = useState('');
  const names = namesOf(everyone);
  const wanted = title === '' ? claims : claims.filter((claim) => claim.title === title);
  const colleagues = everyone.filter(({ id }) => wanted.some((claim) => claim.mayHold.includes(id)));
  const isPossible = colleagues.some(({ id }) => id === to);

  const give = () => {
    const result = giveAll(choices, wanted, to);
    onChange(result.choices);
    setSaid(
      result.given === 0
        ? teamWords.givenNone(names.get(to) ?? '')
        : teamWords.given(result.given, names.get(to) ?? ''),
    );
  };
  return (
    <div className="bg-linen flex flex-wrap items-end gap-3 px-4 py-3">
      <div className="w-64 max-w-full">
        <SelectField
          label={teamWords.give}
          value={title}
          placeholder={teamWords.everything(claims.length)}
          options={titlesOf(claims).map((one) => ({
            value: one.title,
            label: teamWords.giveAllOf(one.title, one.count),
          }))}
          onChange={setTitle}
        />
      </div>
      <div className="w-52 max-w-full">
        <SelectField
          label={teamWords.giveTo}
          value={isPossible ? to : ''}
          placeholder={colleagues.length === 0 ? teamWords.nobodyMay : teamWords.choose}
          options={colleagues.map(({ id, name }) => ({ value: id, label: name }))}
          onChange={setTo}
        />
      </div>
      <Button onClick={give} notYet={isPossible ? null : teamWords.choose} reasonPlace="elsewhere">
        {teamWords.giveButton}
      </Button>
      <p role="status" className="text-small text-ink-2 m-0 self-center">
        {said}
      </p>
    </div>
  );
}

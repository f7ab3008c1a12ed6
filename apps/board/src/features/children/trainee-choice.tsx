import { useState } from 'react';
import { Button } from '../../ui/actions/button.tsx';
import { Checkbox } from '../../ui/fields/checkbox.tsx';
import { Section } from '../../ui/page/section.tsx';
import { recordWords } from '../../words/children.ts';
import type { Names } from './field-text.ts';

interface TraineeChoiceProps {
  readonly assigned: readonly string[];
  readonly trainees: readonly { readonly id: string; readonly name: string }[];
  readonly names: Names;
  readonly mayChoose: boolean;
  readonly isBusy: boolean;
  readonly onSave: (memberIds: string[]) => void;
}

/** Which trainees work with the child; a change is saved by its own button. */
export function TraineeChoice({ assigned, trainees, names, mayChoose, isBusy, onSave }: TraineeChoiceProps) {
  const [chosen, setChosen] = useState<readonly string[] | null>(null);
  const shown = chosen ?? assigned;
  const isChanged = chosen !== null && [...chosen].toSorted().join() !== [...assigned].toSorted().join();
  if (!mayChoose) {
    return (
      <Section title={recordWords.traineesHead}>
        <p className="text-body m-0">
          {assigned.length === 0 ? recordWords.noTrainees : assigned.map((id) => names.get(id) ?? id).join(', ')}
        </p>
      </Section>
    );
  }
  const toggle = (id: string, isOn: boolean) => setChosen(isOn ? [...shown, id] : shown.filter((one) => one !== id));
  return (
    <Section title={recordWords.traineesHead}>
      {trainees.length === 0 ? <p className="text-body text-ink-3 m-0">{recordWords.noTraineesOnTeam}</p> : null}
      {trainees.map(({ id, name }) => (
        <Checkbox key={id} label={name} value={shown.includes(id)} onChange={(isOn) => toggle(id, isOn)} />
      ))}
      {isChanged ? (
        <div>
          <Button isBusy={isBusy} onClick={() => onSave([...shown])}>
            {recordWords.doAssign}
          </Button>
        </div>
      ) : null}
    </Section>
  );
}

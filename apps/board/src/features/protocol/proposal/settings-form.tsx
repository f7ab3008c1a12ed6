import { rootStages } from '@weftway/pathway/protocol';
import { Checkbox } from '../../../ui/fields/checkbox.tsx';
import { SelectField } from '../../../ui/fields/select-field.tsx';
import { TextField } from '../../../ui/fields/text-field.tsx';
import { protocolWords } from '../../../words/protocol.ts';
import { withValue } from './draft-protocol.ts';
import type { NumberFormProps } from './number-form.tsx';

const words = protocolWords.proposal;

/** A bound that is no usual stage stays possible. */
const stagesWith = (value: string) =>
  [...new Set<string>([...rootStages, value])].map((stage) => ({ value: stage, label: stage }));

export function SettingsForm({ draft, onChange, faults }: NumberFormProps) {
  const { settings } = draft;
  const set = (name: keyof typeof settings, value: unknown) => onChange(withValue(draft, ['settings', name], value));
  return (
    <div className="flex flex-col gap-3">
      <div className="max-w-120">
        <TextField
          label={words.name}
          name="/name"
          value={draft.name}
          onChange={(name) => onChange({ ...draft, name })}
          error={faults.get('/name')}
          maxLength={120}
        />
      </div>
      <Checkbox
        label={words.offersMolding}
        value={settings.offersMolding}
        onChange={(value) => set('offersMolding', value)}
      />
      <div className="flex flex-wrap gap-4">
        <SelectField
          label={words.rootLower}
          value={settings.graftRootLower}
          onChange={(value) => set('graftRootLower', value)}
          options={stagesWith(settings.graftRootLower)}
          placeholder={null}
          error={faults.get('/settings/graftRootLower')}
        />
        <SelectField
          label={words.rootUpper}
          value={settings.graftRootUpper}
          onChange={(value) => set('graftRootUpper', value)}
          options={stagesWith(settings.graftRootUpper)}
          placeholder={null}
          error={faults.get('/settings/graftRootUpper')}
        />
      </div>
    </div>
  );
}

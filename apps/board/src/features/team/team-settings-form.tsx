import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { teamSettingsSchema, type TeamSettings, type TeamSettingsFields } from '@weftway/contract/team-settings';
import { isProblem, type ProblemDocument } from '../../api/api-client.ts';
import { placeFaults } from '../../api/form-faults.ts';
import { teamSettingsMutations } from '../../queries/team-settings-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { ComboboxField } from '../../ui/fields/combobox-field.tsx';
import { TextArea } from '../../ui/fields/text-area.tsx';
import { TextField } from '../../ui/fields/text-field.tsx';
import { Notice } from '../../ui/notices/notice.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { showToast } from '../../ui/overlays/toasts.ts';
import { teamSettingsWords } from '../../words/team-settings.ts';

const names = ['name', 'zone', 'sites'] as const;

const fieldsIn = ({ name, zone, sites }: TeamSettings): TeamSettingsFields => ({ name, zone, sites });

const sitesIn = (text: string): string[] =>
  text
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '');

const zonesWith = (zone: string): readonly { readonly value: string; readonly label: string }[] =>
  [...new Set(['UTC', zone, ...Intl.supportedValuesOf('timeZone')])].sort().map((value) => ({ value, label: value }));

/** Based on the version that was opened; when somebody was faster, nothing that was typed is lost. */
export function TeamSettingsForm({ settings }: { readonly settings: TeamSettings }) {
  const [base, setBase] = useState(settings);
  const [name, setName] = useState(settings.name);
  const [zone, setZone] = useState(settings.zone);
  const [sites, setSites] = useState(settings.sites.join('\n'));
  const [faults, setFaults] = useState<Readonly<Record<string, string>>>({});
  const [problem, setProblem] = useState<ProblemDocument | null>(null);
  const [current, setCurrent] = useState<TeamSettings | null>(null);
  const edit = useMutation(teamSettingsMutations.edit(useQueryClient()));
  const typed: TeamSettingsFields = { name, zone, sites: sitesIn(sites) };
  const isChanged = JSON.stringify(typed) !== JSON.stringify(fieldsIn(base));

  const take = (one: TeamSettings) => {
    setBase(one);
    setName(one.name);
    setZone(one.zone);
    setSites(one.sites.join('\n'));
    setCurrent(null);
  };
  const save = async (version: number) => {
    setFaults({});
    setProblem(null);
    setCurrent(null);
    try {
      take(await edit.mutateAsync({ fields: typed, version }));
      showToast({ text: teamSettingsWords.saved });
    } catch (error) {
      const theirs = isProblem(error, 'changed-meanwhile') ? teamSettingsSchema.safeParse(error.problem.current) : null;
      if (theirs?.success === true) return setCurrent(theirs.data);
      const found: Record<string, string> = {};
      // A fault of one site stands at the list.
      const setFault = (field: string, message: string) => (found[field.split('.')[0] ?? field] ??= message);
      setProblem(placeFaults(error, { names, setFault }));
      setFaults(found);
      const first = names.find((field) => found[field] !== undefined);
      if (first !== undefined) document.getElementById(`field-${first}`)?.focus();
    }
  };
  const send = (event: FormEvent) => {
    event.preventDefault();
    if (isChanged && !edit.isPending) void save(base.version);
  };

  return (
    <form noValidate onSubmit={send} className="flex w-full max-w-[480px] flex-col gap-4">
      <TextField
        label={teamSettingsWords.name}
        name="name"
        value={name}
        onChange={setName}
        error={faults['name']}
        maxLength={80}
      />
      <ComboboxField
        label={teamSettingsWords.zone}
        hint={teamSettingsWords.zoneHint}
        name="zone"
        value={zone}
        onChange={(next) => setZone(next ?? '')}
        options={zonesWith(base.zone)}
        error={faults['zone']}
      />
      <TextArea
        label={teamSettingsWords.sites}
        hint={teamSettingsWords.sitesHint}
        name="sites"
        value={sites}
        onChange={setSites}
        error={faults['sites']}
        rows={Math.max(3, Math.min(10, base.sites.length + 1))}
      />
      {problem === null ? null : <ProblemNotice problem={problem} />}
      {current === null ? null : (
        <Notice
          kind="conflict"
          title={teamSettingsWords.conflictTitle}
          actions={
            <>
              <Button onClick={() => void save(current.version)}>{teamSettingsWords.saveMine}</Button>
              <Button onClick={() => take(current)}>{teamSettingsWords.takeTheirs}</Button>
            </>
          }
        >
          {teamSettingsWords.conflictText} {current.name}; {current.zone}; {current.sites.join(', ')}.
        </Notice>
      )}
      <div className="flex flex-wrap items-center gap-2">
        <Button
          type="submit"
          look="filled"
          isBusy={edit.isPending}
          notYet={isChanged ? null : teamSettingsWords.nothingChanged}
        >
          {teamSettingsWords.save}
        </Button>
      </div>
    </form>
  );
}

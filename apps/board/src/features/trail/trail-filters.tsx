import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { trailQueries } from '../../queries/trail-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { Segment } from '../../ui/actions/segment.tsx';
import { ComboboxField } from '../../ui/fields/combobox-field.tsx';
import { DateField } from '../../ui/fields/date-field.tsx';
import { SelectField } from '../../ui/fields/select-field.tsx';
import { kindOptions, trailWords } from '../../words/trail.ts';
import type { FilterState } from './trail-filter.ts';

interface TrailFiltersProps {
  readonly state: FilterState;
  readonly members: readonly { readonly id: string; readonly name: string }[];
  /** Only those who may see names can look for one. */
  readonly seesContent: boolean;
  /** Name of the child that is filtered by, as far as a line tells it. */
  readonly childName: string | null;
}

const logs = [
  { value: 'changes', label: trailWords.changes },
  { value: 'reads', label: trailWords.reads },
] as const;

function ChildFilter({ state }: { readonly state: FilterState }) {
  const [text, setText] = useState('');
  const found = useQuery(trailQueries.children(text));
  const options = (found.data?.items ?? []).map((row) => ({
    value: row.id,
    label: `${row.firstName} ${row.familyName}`,
    detail: row.recordNumber,
  }));
  return (
    <ComboboxField
      label={trailWords.child}
      hint={trailWords.childHint}
      look="search"
      isLabelHidden
      value={null}
      onChange={(id) => state.set('child', id ?? '')}
      options={options}
      onSearch={setText}
      isSearching={found.isFetching}
    />
  );
}

/** A date goes into the address once it is whole. */
function DayFilter({
  state,
  name,
  label,
}: {
  readonly state: FilterState;
  readonly name: 'from' | 'to';
  readonly label: string;
}) {
  const [typed, setTyped] = useState<string | null>(null);
  const change = (value: string) => {
    setTyped(value);
    if (value === '' || /^\d{4}-\d{2}-\d{2}$/.test(value)) state.set(name, value);
  };
  return <DateField label={label} value={typed ?? state.filter[name] ?? ''} onChange={change} />;
}

export function TrailFilters({ state, members, seesContent, childName }: TrailFiltersProps) {
  const { filter, isNarrowed, set, setLog, clear } = state;
  return (
    <div role="search" aria-label={trailWords.filters} className="no-print flex flex-col gap-3">
      <div className="flex flex-wrap items-center gap-3">
        <Segment label={trailWords.log} options={logs} value={filter.log} onChange={setLog} />
        {seesContent ? (
          <div className="w-64 max-w-full">
            <ChildFilter key={filter.child ?? ''} state={state} />
          </div>
        ) : null}
        {isNarrowed ? <Button onClick={clear}>{trailWords.clear}</Button> : null}
      </div>
      {filter.child === undefined ? null : (
        <p className="text-body m-0">{trailWords.onlyChild(childName ?? trailWords.thisChild)}</p>
      )}
      <div className="flex flex-wrap items-start gap-4 max-sm:grid max-sm:grid-cols-2 max-sm:gap-3">
        <SelectField
          label={trailWords.member}
          value={filter.member ?? ''}
          onChange={(value) => set('member', value)}
          placeholder={trailWords.memberAll}
          options={members.map((member) => ({ value: member.id, label: member.name }))}
        />
        <SelectField
          label={filter.log === 'changes' ? trailWords.kind : trailWords.kindRead}
          value={filter.kind ?? ''}
          onChange={(value) => set('kind', value)}
          placeholder={trailWords.kindAll}
          options={kindOptions(filter.log)}
        />
        <DayFilter key={`from ${filter.from ?? ''}`} state={state} name="from" label={trailWords.from} />
        <DayFilter key={`to ${filter.to ?? ''}`} state={state} name="to" label={trailWords.to} />
      </div>
    </div>
  );
}

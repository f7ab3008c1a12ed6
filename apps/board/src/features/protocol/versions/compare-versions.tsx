import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { protocolQueries } from '../../../queries/protocol-queries.ts';
import { SelectField } from '../../../ui/fields/select-field.tsx';
import { Loading } from '../../../ui/notices/loading.tsx';
import { Section } from '../../../ui/page/section.tsx';
import { protocolWords } from '../../../words/protocol.ts';
import { ChangeList } from './change-list.tsx';
import { protocolChanges } from './protocol-changes.ts';
import type { VersionHead } from './version-table.tsx';

/** The versions chosen in the address, else the two newest. */
const chosenIn = (search: URLSearchParams, heads: readonly VersionHead[]): { from: number; to: number } => {
  const known = (name: string): number | null =>
    heads.find((head) => String(head.version) === search.get(name))?.version ?? null;
  return { from: known('from') ?? heads[1]?.version ?? 1, to: known('to') ?? heads[0]?.version ?? 1 };
};

function Differences({ from, to }: { readonly from: number; readonly to: number }) {
  const before = useQuery(protocolQueries.version(from));
  const after = useQuery(protocolQueries.version(to));
  if (before.data === undefined || after.data === undefined) return <Loading label={protocolWords.loading} />;
  const changes = protocolChanges(before.data.protocol, after.data.protocol);
  if (changes.length === 0) return <p className="text-body text-ink-2 m-0">{protocolWords.noDifference}</p>;
  return (
    <>
      <p className="text-body text-ink-2 m-0" role="status">
        {protocolWords.differences(changes.length)}
      </p>
      <ChangeList changes={changes} version={to} />
    </>
  );
}

/** What changed between two versions, in words. `heads` newest first. */
export function CompareVersions({ heads }: { readonly heads: readonly VersionHead[] }) {
  const [search, setSearch] = useSearchParams();
  if (heads.length < 2) {
    return (
      <Section title={protocolWords.compare}>
        <p className="text-body text-ink-2 m-0">{protocolWords.onlyOne}</p>
      </Section>
    );
  }
  const { from, to } = chosenIn(search, heads);
  const options = heads.map((head) => ({
    value: String(head.version),
    label: protocolWords.compareOption(head.version, protocolWords.statuses[head.status]),
  }));
  const choose = (name: string, value: string) =>
    setSearch((now) => new URLSearchParams([...[...now].filter(([key]) => key !== name), [name, value]]), {
      replace: true,
    });
  return (
    <Section title={protocolWords.compare}>
      <div className="flex flex-wrap gap-4">
        <SelectField
          label={protocolWords.compareFrom}
          value={String(from)}
          onChange={(value) => choose('from', value)}
          options={options}
          placeholder={null}
        />
        <SelectField
          label={protocolWords.compareTo}
          value={String(to)}
          onChange={(value) => choose('to', value)}
          options={options}
          placeholder={null}
        />
      </div>
      <Differences from={from} to={to} />
    </Section>
  );
}

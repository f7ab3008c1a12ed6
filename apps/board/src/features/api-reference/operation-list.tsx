import { useCallback, useState } from 'react';
import { useLocation, useSearchParams } from 'react-router-dom';
import type { ApiDocument } from '@weftway/contract/api-document';
import { Button } from '../../ui/actions/button.tsx';
import { TextField } from '../../ui/fields/text-field.tsx';
import { EmptyState } from '../../ui/notices/empty-state.tsx';
import { Section } from '../../ui/page/section.tsx';
import { apiReferenceWords as words } from '../../words/api-reference.ts';
import { OperationEntry, type ListedOperation } from './operation-entry.tsx';

const listed = (document: ApiDocument): ListedOperation[] =>
  Object.entries(document.paths).flatMap(([path, item]) =>
    Object.entries(item).map(([method, operation]) => ({ method, path, operation })),
  );

const textOf = ({ method, path, operation }: ListedOperation): string =>
  `${method} ${path} ${operation.operationId} ${operation.summary} ${operation.tags.join(' ')}`.toLowerCase();

const holds = (text: string, asked: string): boolean =>
  asked
    .toLowerCase()
    .split(/\s+/)
    .every((word) => text.includes(word));

/** Every operation by its group. `#signMilestone` opens one. */
export function OperationList({ document }: { readonly document: ApiDocument }) {
  const [search, setSearch] = useSearchParams();
  const { hash } = useLocation();
  const [open, setOpen] = useState<ReadonlySet<string>>(new Set(hash === '' ? [] : [hash.slice(1)]));
  const asked = search.get('q') ?? '';
  const found = listed(document).filter((one) => holds(textOf(one), asked));
  const ask = (text: string) =>
    setSearch(
      (now) => {
        const next = new URLSearchParams(now);
        if (text === '') next.delete('q');
        else next.set('q', text);
        return next;
      },
      { replace: true, preventScrollReset: true },
    );
  const toggle = useCallback((name: string) => {
    setOpen((now) => {
      const next = new Set(now);
      if (!next.delete(name)) next.add(name);
      return next;
    });
  }, []);
  return (
    <div className="flex flex-col gap-6">
      <div className="no-print flex flex-wrap items-end gap-3">
        <div className="w-full max-w-96">
          <TextField label={words.search} hint={words.searchHint} type="search" value={asked} onChange={ask} />
        </div>
        <span role="status" className="text-small text-ink-2 pb-5">
          {words.found(found.length)}
        </span>
      </div>
      {found.length === 0 ? (
        <EmptyState
          kind="filter"
          title={words.nothingFound}
          actions={<Button onClick={() => ask('')}>{words.clear}</Button>}
        />
      ) : null}
      {document.tags.map(({ name }) => {
        const ofGroup = found.filter((one) => one.operation.tags.includes(name));
        return ofGroup.length === 0 ? null : (
          <Section key={name} title={name} aside={ofGroup.length}>
            <ul className="m-0 list-none p-0">
              {ofGroup.map((one) => (
                <OperationEntry
                  key={one.operation.operationId}
                  listed={one}
                  isOpen={open.has(one.operation.operationId)}
                  onToggle={toggle}
                />
              ))}
            </ul>
          </Section>
        );
      })}
    </div>
  );
}

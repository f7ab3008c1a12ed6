import { memo } from 'react';
import type { ApiOperation } from '@weftway/contract/api-document';
import { permissionTable, type PermissionRow } from '@weftway/abilities/permission-table';
import { ChevronIcon } from '../../ui/icons.tsx';
import { TextLink } from '../../ui/actions/text-link.tsx';
import { apiReferenceWords as words, whoWords } from '../../words/api-reference.ts';
import { fieldRows, schemaWords, type FieldRow, type Schema } from './schema-words.ts';

export interface ListedOperation {
  readonly method: string;
  readonly path: string;
  readonly operation: ApiOperation;
}

const whoMay = (who: ApiOperation['x-who-may']): readonly string[] => {
  if (who === 'anyone') return [words.anyone];
  if (who === 'signed-in') return [words.signedIn];
  const row = (permissionTable as readonly PermissionRow[]).find(
    (one) => one.action === who.action && one.subject === who.subject,
  );
  return row === undefined ? [words.row(who.action, who.subject)] : whoWords(row);
};

function Fields({
  title,
  rows,
}: {
  readonly title: string;
  readonly rows: readonly (FieldRow & { readonly where?: string | undefined; readonly note?: string | undefined })[];
}) {
  if (rows.length === 0) return null;
  return (
    <div>
      <h4 className="text-label text-ink-2 m-0">{title}</h4>
      <dl className="m-0">
        {rows.map((row) => (
          <div
            key={`${row.where ?? ''} ${row.name}`}
            className="border-hair grid grid-cols-[16rem_minmax(0,1fr)] gap-x-4 border-t py-0.5 max-sm:grid-cols-1"
          >
            <dt className="text-body font-semibold [overflow-wrap:anywhere]">
              {row.name}{' '}
              {row.where === undefined ? null : <span className="text-small text-ink-3 font-normal">{row.where}</span>}
            </dt>
            <dd className="text-body m-0 [overflow-wrap:anywhere]">
              {row.what}
              {row.isRequired ? null : <span className="text-small text-ink-3"> · {words.optional}</span>}
              {row.note === undefined ? null : <span className="text-small text-ink-2 block">{row.note}</span>}
            </dd>
          </div>
        ))}
      </dl>
    </div>
  );
}

const success = (operation: ApiOperation): [string, Schema | undefined] => {
  const [status, response] = Object.entries(operation.responses).find(([code]) => code.startsWith('2')) ?? [
    '200',
    undefined,
  ];
  return [status, response?.content?.['application/json']?.schema];
};

function OperationDetails({ operation }: { readonly operation: ApiOperation }) {
  const body = operation.requestBody?.content['application/json']?.schema;
  const [status, answer] = success(operation);
  return (
    <div className="flex flex-col gap-3 py-2 pl-5">
      <div>
        <h4 className="text-label text-ink-2 m-0">{words.whoMay}</h4>
        <p className="text-body m-0">{whoMay(operation['x-who-may']).join(' · ')}</p>
      </div>
      <Fields
        title={words.parameters}
        rows={operation.parameters.map((one) => ({
          name: one.name,
          where: words.where[one.in],
          what: schemaWords(one.schema),
          isRequired: one.required,
          note: one.description,
        }))}
      />
      {body === undefined ? null : <Fields title={words.body} rows={fieldRows(body)} />}
      {answer === undefined ? null : <Fields title={words.answer(status)} rows={fieldRows(answer)} />}
      <div>
        <h4 className="text-label text-ink-2 m-0">{words.problems}</h4>
        <ul className="m-0 flex list-none flex-wrap gap-x-4 gap-y-2 p-0">
          {operation['x-problems'].map((name) => (
            <li key={name}>
              <TextLink to={`/problems/${name}`}>{name}</TextLink>
            </li>
          ))}
        </ul>
      </div>
    </div>
  );
}

interface OperationEntryProps {
  readonly listed: ListedOperation;
  readonly isOpen: boolean;
  readonly onToggle: (name: string) => void;
}

/** Method, path and purpose; opened: who may, parameters, fields, answer, problems. */
export const OperationEntry = memo(function OperationEntry({
  listed: { method, path, operation },
  isOpen,
  onToggle,
}: OperationEntryProps) {
  return (
    <li id={operation.operationId} className="border-hair scroll-mt-20 border-t py-1">
      <h3 className="m-0">
        <button
          type="button"
          aria-expanded={isOpen}
          onClick={() => onToggle(operation.operationId)}
          className="text-body text-ink grid min-h-8 w-full grid-cols-[1rem_4rem_minmax(0,26rem)_minmax(0,1fr)] items-center gap-x-2 rounded text-left font-normal hover:bg-linen max-md:grid-cols-[1rem_4rem_minmax(0,1fr)] max-sm:min-h-11"
        >
          <span className={`text-ink-2 ${isOpen ? '' : '-rotate-90'}`}>
            <ChevronIcon size={12} />
          </span>
          <span className="text-small text-ink-2 font-semibold">{method.toUpperCase()}</span>
          <span className="font-semibold [overflow-wrap:anywhere]">{path}</span>
          <span className="text-ink-2 max-md:col-start-3">{operation.summary}</span>
        </button>
      </h3>
      {isOpen ? <OperationDetails operation={operation} /> : null}
    </li>
  );
});

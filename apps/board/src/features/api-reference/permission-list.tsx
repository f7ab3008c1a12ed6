import { permissionTable, subjects, type PermissionRow } from '@weftway/abilities/permission-table';
import { Cell, ColumnHead, Row, Table } from '../../ui/page/table.tsx';
import { apiReferenceWords as words, whoWords } from '../../words/api-reference.ts';

const { columns } = words;

const rowsOf = (subject: string): readonly PermissionRow[] =>
  (permissionTable as readonly PermissionRow[]).filter((row) => row.subject === subject);

/** Who may do what, for whoever answers for privacy. */
export function PermissionList() {
  return (
    <div className="flex flex-col gap-3">
      <p className="text-body text-ink-2 m-0 max-w-[72ch]">{words.permissionsText}</p>
      <Table
        label={words.permissions}
        head={
          <>
            <ColumnHead>{columns.subject}</ColumnHead>
            <ColumnHead>{columns.action}</ColumnHead>
            <ColumnHead>{columns.who}</ColumnHead>
          </>
        }
      >
        {subjects.flatMap((subject) =>
          rowsOf(subject).map((row) => (
            <Row key={`${row.action} ${row.subject}`}>
              <Cell>
                <span className="whitespace-nowrap">{row.subject}</span>
              </Cell>
              <Cell kind="head">
                <span className="block min-w-56">
                  <span className="font-semibold">{row.meaning}</span>{' '}
                  <span className="text-fine text-ink-3">{row.action}</span>
                </span>
              </Cell>
              <Cell>
                <span className="block min-w-56">{whoWords(row).join(' · ')}</span>
              </Cell>
            </Row>
          )),
        )}
      </Table>
    </div>
  );
}

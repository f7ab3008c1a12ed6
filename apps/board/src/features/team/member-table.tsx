import { Link } from 'react-router-dom';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Member } from '@weftway/contract/member';
import { Cell, ColumnHead, Row, RowLink, Table } from '../../ui/page/table.tsx';
import { teamWords } from '../../words/team.ts';
import { disciplineLine, namesOf, presenceLine, standingLine, type Names } from './member-lines.ts';

interface MemberTableProps {
  readonly label: string;
  readonly members: readonly Member[];
  /** Everyone, for the names of supervisors and covering colleagues. */
  readonly everyone: readonly Member[];
  readonly today: PlainDate;
}

interface LinesProps extends Pick<MemberTableProps, 'label' | 'members' | 'today'> {
  readonly names: Names;
}

/** A table where there is room for its columns, a list of the same on a phone. */
export function MemberTable({ label, members, everyone, today }: MemberTableProps) {
  const names = namesOf(everyone);
  const lines = { label, members, today, names };
  return (
    <>
      <div className="max-sm:hidden">
        <WideLines {...lines} />
      </div>
      <div className="sm:hidden">
        <NarrowLines {...lines} />
      </div>
    </>
  );
}

function WideLines({ label, members, today, names }: LinesProps) {
  const { columns } = teamWords;
  return (
    <Table
      label={label}
      head={
        <>
          <ColumnHead>{columns.name}</ColumnHead>
          <ColumnHead>{columns.disciplines}</ColumnHead>
          <ColumnHead>{columns.standing}</ColumnHead>
          <ColumnHead>{columns.presence}</ColumnHead>
          <ColumnHead kind="number">{columns.work}</ColumnHead>
        </>
      }
    >
      {members.map((member) => (
        <Row key={member.id}>
          <Cell kind="head">
            <RowLink to={`/team/${member.id}`}>{member.name}</RowLink>
          </Cell>
          <Cell>{disciplineLine(member)}</Cell>
          <Cell>{standingLine(member, names)}</Cell>
          <Cell>{presenceLine(member, names, today)}</Cell>
          <Cell kind="number">
            {member.openClaims === 0 ? <span className="text-ink-3">{teamWords.noWork}</span> : member.openClaims}
          </Cell>
        </Row>
      ))}
    </Table>
  );
}

function NarrowLines({ label, members, today, names }: LinesProps) {
  return (
    <ul aria-label={label} className="m-0 flex list-none flex-col p-0">
      {members.map((member) => {
        const presence = presenceLine(member, names, today);
        const parts = [
          disciplineLine(member),
          standingLine(member, names),
          presence === teamWords.active ? '' : presence,
        ];
        return (
          <li key={member.id} className="border-hair border-t">
            <Link to={`/team/${member.id}`} className="flex min-h-11 items-center justify-between gap-4 py-2">
              <span className="flex min-w-0 flex-col">
                <span className="text-body font-semibold">{member.name}</span>
                <span className="text-small text-ink-2">{parts.filter((part) => part !== '').join(' · ')}</span>
              </span>
              {member.openClaims === 0 ? null : (
                <span className="text-small text-ink-2 figures shrink-0">{teamWords.openCount(member.openClaims)}</span>
              )}
            </Link>
          </li>
        );
      })}
    </ul>
  );
}

import type { Member } from '@weftway/contract/member';
import { standingNames } from '@weftway/team/standings';
import { Button } from '../../ui/actions/button.tsx';
import { Notice } from '../../ui/notices/notice.tsx';
import { Cell, ColumnHead, Row, Table } from '../../ui/page/table.tsx';
import { teamWords } from '../../words/team.ts';
import { disciplineLine, namesOf } from './member-lines.ts';
import type { MemberInput } from './use-member-form.ts';

interface MemberConflictProps {
  readonly current: Member;
  readonly typed: MemberInput;
  readonly everyone: readonly Member[];
  readonly onSaveMine: () => void;
  readonly onTakeTheirs: () => void;
}

/** What stands there now beside what was typed; differences carry an ink bar. */
export function MemberConflict({ current, typed, everyone, onSaveMine, onTakeTheirs }: MemberConflictProps) {
  const names = namesOf(everyone);
  const nameOf = (id: string | null): string => (id === null ? '' : (names.get(id) ?? ''));
  const { fields } = teamWords;
  const rows = [
    { label: fields.name, theirs: current.name, mine: typed.name },
    { label: fields.email, theirs: current.email, mine: typed.email },
    { label: fields.standing, theirs: standingNames[current.standing], mine: standingNames[typed.standing] },
    { label: fields.disciplines, theirs: disciplineLine(current), mine: disciplineLine(typed) },
    { label: fields.supervisor, theirs: nameOf(current.supervisorId), mine: nameOf(typed.supervisorId) },
  ];
  return (
    <Notice
      kind="conflict"
      title={teamWords.conflictTitle(current.name)}
      actions={
        <>
          <Button look="filled" onClick={onSaveMine}>
            {teamWords.saveMine}
          </Button>
          <Button onClick={onTakeTheirs}>{teamWords.takeTheirs}</Button>
        </>
      }
    >
      <p className="m-0 pb-2">{teamWords.conflictText}</p>
      <Table
        label={teamWords.conflictTitle(current.name)}
        head={
          <>
            <ColumnHead>{''}</ColumnHead>
            <ColumnHead>{teamWords.nowThere}</ColumnHead>
            <ColumnHead>{teamWords.yours}</ColumnHead>
          </>
        }
      >
        {rows.map(({ label, theirs, mine }) => (
          <Row key={label}>
            <Cell kind="head">{label}</Cell>
            <Cell>{theirs}</Cell>
            <Cell>{theirs === mine ? mine : <strong className="border-ink border-l-3 pl-2">{mine}</strong>}</Cell>
          </Row>
        ))}
      </Table>
    </Notice>
  );
}

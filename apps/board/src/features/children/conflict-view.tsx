import { useState } from 'react';
import type { ChildFields } from '@weftway/contract/child';
import { Button } from '../../ui/actions/button.tsx';
import { Segment } from '../../ui/actions/segment.tsx';
import { Notice } from '../../ui/notices/notice.tsx';
import { Cell, ColumnHead, Row, Table } from '../../ui/page/table.tsx';
import { conflictWords, fieldWords } from '../../words/children.ts';
import { fieldText, type Names } from './field-text.ts';
import { differencesBetween, mergedFields, type Difference, type Side } from './merge-versions.ts';

interface ConflictViewProps {
  readonly was: ChildFields;
  readonly mine: ChildFields;
  readonly theirs: ChildFields;
  readonly names: Names;
  readonly isBusy: boolean;
  readonly onSave: (fields: ChildFields) => void;
  readonly onBack: (fields: ChildFields) => void;
  readonly onLeave: () => void;
}

/** Three columns of what differs: mine, theirs, as it was. Only where both changed is a choice asked for. */
export function ConflictView({ was, mine, theirs, names, isBusy, onSave, onBack, onLeave }: ConflictViewProps) {
  const [choices, setChoices] = useState<ReadonlyMap<string, Side>>(new Map());
  const differences = differencesBetween(was, mine, theirs);
  const choose = (field: string, side: Side) => setChoices(new Map([...choices, [field, side]]));
  const merged = mergedFields({ mine, theirs }, differences, choices);
  return (
    <div className="flex flex-col gap-5">
      <Notice kind="conflict" title={conflictWords.title}>
        {conflictWords.lead}
      </Notice>
      <Table
        label={conflictWords.title}
        head={
          <>
            <ColumnHead>{conflictWords.field}</ColumnHead>
            <ColumnHead>{conflictWords.mine}</ColumnHead>
            <ColumnHead>{conflictWords.theirs}</ColumnHead>
            <ColumnHead>{conflictWords.was}</ColumnHead>
          </>
        }
      >
        {differences.map((difference) => {
          const { field, changedBy } = difference;
          const isMine = changedBy === 'me' || (changedBy === 'both' && choices.get(field) !== 'theirs');
          return (
            <Row key={field}>
              <Cell kind="head">
                <span className="font-semibold">{fieldWords[field]}</span>
                <Chosen
                  difference={difference}
                  side={choices.get(field) ?? 'mine'}
                  onChoose={(side) => choose(field, side)}
                />
              </Cell>
              <Cell>
                <Version text={fieldText(field, mine, names)} isTaken={isMine} />
              </Cell>
              <Cell>
                <Version text={fieldText(field, theirs, names)} isTaken={!isMine} />
              </Cell>
              <Cell>{fieldText(field, was, names)}</Cell>
            </Row>
          );
        })}
      </Table>
      <div className="flex flex-wrap items-center gap-2">
        <Button look="filled" isBusy={isBusy} onClick={() => onSave(merged)}>
          {conflictWords.save}
        </Button>
        <Button onClick={() => onBack(merged)}>{conflictWords.back}</Button>
        <Button look="quiet" onClick={onLeave}>
          {conflictWords.leave}
        </Button>
      </div>
    </div>
  );
}

/** What will be saved stands under an ink bar. */
function Version({ text, isTaken }: { readonly text: string; readonly isTaken: boolean }) {
  return (
    <span
      className={
        isTaken ? 'border-ink block border-t-2 font-semibold' : 'text-ink-2 block border-t-2 border-transparent'
      }
    >
      {text}
    </span>
  );
}

function Chosen({
  difference,
  side,
  onChoose,
}: {
  readonly difference: Difference;
  readonly side: Side;
  readonly onChoose: (side: Side) => void;
}) {
  if (difference.changedBy !== 'both') {
    return (
      <span className="text-fine text-ink-3 block">
        {difference.changedBy === 'me' ? conflictWords.mergedMine : conflictWords.mergedTheirs}
      </span>
    );
  }
  return (
    <div className="py-1">
      <Segment
        label={conflictWords.chooseFor(fieldWords[difference.field])}
        value={side}
        onChange={onChoose}
        options={[
          { value: 'mine', label: conflictWords.mine },
          { value: 'theirs', label: conflictWords.theirs },
        ]}
      />
    </div>
  );
}

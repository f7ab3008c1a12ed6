import { formatDate } from '@weftway/calendar/format-date';
import { milestoneStates } from '@weftway/pathway/milestone-state';
import { Mark } from '../../marks/mark.tsx';
import { Cell, ColumnHead, Row, RowLink, Table } from '../../ui/page/table.tsx';
import { teamWords } from '../../words/team.ts';
import { claimKey, type OpenClaim } from './hand-over-choices.ts';

interface OpenWorkProps {
  readonly claims: readonly OpenClaim[];
  /** Whether the reader opens children. */
  readonly mayOpen: boolean;
}

/** What a member holds, soonest to close first. */
export function OpenWork({ claims, mayOpen }: OpenWorkProps) {
  return (
    <Table
      label={teamWords.work}
      head={
        <>
          <ColumnHead>{teamWords.child}</ColumnHead>
          <ColumnHead>{teamWords.milestone}</ColumnHead>
          <ColumnHead>{teamWords.closes}</ColumnHead>
        </>
      }
    >
      {claims.map((claim) => (
        <Row key={claimKey(claim)}>
          <Cell kind="head">
            {mayOpen ? <RowLink to={`/children/${claim.childId}`}>{claim.childName}</RowLink> : claim.childName}
          </Cell>
          <Cell>
            <span className="inline-flex items-center gap-2">
              <StateMark state={claim.state} />
              {claim.title}
            </span>
          </Cell>
          <Cell>
            {claim.latest === null ? '' : <span className="figures whitespace-nowrap">{formatDate(claim.latest)}</span>}
          </Cell>
        </Row>
      ))}
    </Table>
  );
}

function StateMark({ state }: { readonly state: string }) {
  const known = milestoneStates.find((one) => one === state);
  return known === undefined ? null : <Mark state={known} size={14} />;
}

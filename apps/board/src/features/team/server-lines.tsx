import { formatDate } from '@weftway/calendar/format-date';
import type { TeamSettings } from '@weftway/contract/team-settings';
import { Cell, ColumnHead, Row, Table } from '../../ui/page/table.tsx';
import { limitLines, teamSettingsWords } from '../../words/team-settings.ts';

/** How the server runs: decided where it is started. */
export function ServerLines({ settings }: { readonly settings: TeamSettings }) {
  const day = formatDate(settings.today);
  const lines = [
    [teamSettingsWords.mode, teamSettingsWords.modes[settings.mode]],
    [teamSettingsWords.today, settings.isTodayFixed ? teamSettingsWords.fixedDay(day) : day],
    [teamSettingsWords.mail, teamSettingsWords.mails[settings.mail]],
  ] as const;
  return (
    <dl className="text-body m-0 flex flex-col gap-2">
      {lines.map(([label, value]) => (
        <div key={label} className="grid gap-x-4 sm:grid-cols-[8rem_1fr]">
          <dt className="text-ink-2">{label}</dt>
          <dd className="m-0">{value}</dd>
        </div>
      ))}
    </dl>
  );
}

export function LimitTable({ settings }: { readonly settings: TeamSettings }) {
  return (
    <div className="max-w-[640px]">
      <Table
        label={teamSettingsWords.limits}
        head={
          <>
            <ColumnHead>{teamSettingsWords.limit}</ColumnHead>
            <ColumnHead kind="number">{teamSettingsWords.value}</ColumnHead>
          </>
        }
      >
        {limitLines(settings.limits).map(({ label, value }) => (
          <Row key={label}>
            <Cell>{label}</Cell>
            <Cell kind="number">{value}</Cell>
          </Row>
        ))}
      </Table>
    </div>
  );
}

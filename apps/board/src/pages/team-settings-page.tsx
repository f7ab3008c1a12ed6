import { useQuery } from '@tanstack/react-query';
import { abilityFor, canSome } from '@weftway/abilities/ability-for';
import { problemOf } from '../api/form-faults.ts';
import { LimitTable, ServerLines } from '../features/team/server-lines.tsx';
import { TeamSettingsForm } from '../features/team/team-settings-form.tsx';
import { sessionQueries } from '../queries/session-queries.ts';
import { teamSettingsQueries } from '../queries/team-settings-queries.ts';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { EmptyState } from '../ui/notices/empty-state.tsx';
import { Loading } from '../ui/notices/loading.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { PageHead } from '../ui/page/page-head.tsx';
import { Section } from '../ui/page/section.tsx';
import { teamSettingsWords } from '../words/team-settings.ts';

export function Component() {
  const session = useQuery(sessionQueries.current()).data;
  const mayManage = canSome(abilityFor(session?.me ?? null), 'manage', 'Team');
  const { data: settings, error, refetch } = useQuery({ ...teamSettingsQueries.read(), enabled: mayManage });
  const problem = problemOf(error);
  const back = <LinkButton to="/team">{teamSettingsWords.backToTeam}</LinkButton>;
  return (
    <>
      <title>{teamSettingsWords.title}</title>
      <PageHead title={teamSettingsWords.title} sentence={teamSettingsWords.sentence} actions={back} />
      <div className="flex flex-col gap-8 px-6 py-5 max-sm:px-5">
        {mayManage ? null : (
          <EmptyState kind="time" title={teamSettingsWords.adminsOnly}>
            {teamSettingsWords.adminsOnlyText}
          </EmptyState>
        )}
        {problem === null ? null : <ProblemNotice problem={problem} onRetry={() => void refetch()} />}
        {mayManage && settings === undefined && problem === null ? <Loading label={teamSettingsWords.loading} /> : null}
        {settings === undefined ? null : (
          <>
            <Section title={teamSettingsWords.team}>
              <TeamSettingsForm settings={settings} />
            </Section>
            <Section title={teamSettingsWords.server}>
              <p className="text-small text-ink-2 m-0">{teamSettingsWords.serverSentence}</p>
              <ServerLines settings={settings} />
            </Section>
            <Section title={teamSettingsWords.limits}>
              <p className="text-small text-ink-2 m-0">{teamSettingsWords.limitsSentence}</p>
              <LimitTable settings={settings} />
            </Section>
          </>
        )}
      </div>
    </>
  );
}

import { useQuery } from '@tanstack/react-query';
import { ChangePasswordForm } from '../features/account/change-password-form.tsx';
import { MySessions } from '../features/account/my-sessions.tsx';
import { sessionQueries } from '../queries/session-queries.ts';
import { PageHead } from '../ui/page/page-head.tsx';
import { Section } from '../ui/page/section.tsx';
import { accountWords } from '../words/account.ts';

export function Component() {
  const me = useQuery(sessionQueries.current()).data?.me ?? null;
  if (me === null) return null;
  return (
    <>
      <title>{accountWords.title}</title>
      <PageHead title={accountWords.title} sentence={`${me.name}, ${me.email}. ${accountWords.wrongHere}`} />
      <div className="flex flex-col gap-8 px-6 py-5 max-sm:px-5">
        <Section title={accountWords.passwordTitle}>
          <ChangePasswordForm email={me.email} />
        </Section>
        <Section title={accountWords.sessionsTitle}>
          <p className="text-small text-ink-2 m-0">{accountWords.sessionsSentence}</p>
          <MySessions />
        </Section>
      </div>
    </>
  );
}

import { useQuery } from '@tanstack/react-query';
import { MyWorkScreen } from '../features/my-work/my-work-screen.tsx';
import { sessionQueries } from '../queries/session-queries.ts';

export function Component() {
  const { data: session } = useQuery(sessionQueries.current());
  return session === undefined || session.me === null ? null : <MyWorkScreen me={session.me} today={session.today} />;
}

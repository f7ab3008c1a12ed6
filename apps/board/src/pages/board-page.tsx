import { useQuery } from '@tanstack/react-query';
import { BoardScreen } from '../features/board/board-screen.tsx';
import { sessionQueries } from '../queries/session-queries.ts';

export function Component() {
  const { data: session } = useQuery(sessionQueries.current());
  const me = session?.me ?? null;
  return me === null ? null : <BoardScreen me={me} />;
}

import { useQuery } from '@tanstack/react-query';
import { laneNames, lanes } from '@weftway/team/lanes';
import type { ReactNode } from 'react';
import { ApiProblem } from '../../api/api-client.ts';
import { memberQueries } from '../../queries/member-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { LinkButton } from '../../ui/actions/link-button.tsx';
import { Loading } from '../../ui/notices/loading.tsx';
import { Notice } from '../../ui/notices/notice.tsx';
import { kitWords } from '../../words/kit.ts';
import { pathwayWords } from '../../words/pathway.ts';

const rows = lanes.map((lane) => laneNames[lane]);

export function PathwayLoading() {
  return (
    <div className="px-6 max-sm:px-5">
      <Loading label={pathwayWords.loading} rows={rows} />
    </div>
  );
}

interface PathwayProblemProps {
  readonly error: unknown;
  readonly onRetry: () => void;
}

/** Closed to this person, not there, or not reachable: three different things, said differently. */
export function PathwayProblem({ error, onRetry }: PathwayProblemProps) {
  const words = pathwayWords.states;
  const back = <LinkButton to="/children">{words.toChildren}</LinkButton>;
  const kind = error instanceof ApiProblem ? error.kind : '';
  if (kind === 'not-allowed') return <NotAllowed back={back} />;
  if (kind === 'not-found')
    return <Stated kind="note" title={words.notFoundTitle} text={words.notFoundText} actions={back} />;
  const retry = (
    <Button look="filled" onClick={onRetry}>
      {kitWords.tryAgain}
    </Button>
  );
  const reference = error instanceof ApiProblem ? error.problem.instance : undefined;
  return (
    <Stated
      kind="error"
      title={words.failedTitle}
      text={words.failedText}
      actions={retry}
      footnote={reference === undefined ? undefined : kitWords.reference(reference)}
    />
  );
}

/** Says who can open the record, and leads to whoever may let this person in. */
function NotAllowed({ back }: { readonly back: ReactNode }) {
  const words = pathwayWords.states;
  const members = useQuery(memberQueries.list()).data ?? [];
  const coordinators = members.filter(
    ({ status, disciplines }) => status === 'active' && disciplines.includes('coordinator'),
  );
  const ask = coordinators.map(({ id, name, email }) => (
    <LinkButton key={id} to={`mailto:${email}`}>
      {words.askWho(name)}
    </LinkButton>
  ));
  return (
    <Stated
      kind="note"
      title={words.notAllowedTitle}
      text={words.notAllowedText}
      actions={
        <>
          {ask}
          {back}
        </>
      }
    />
  );
}

interface StatedProps {
  readonly kind: 'note' | 'error';
  readonly title: string;
  readonly text: string;
  readonly actions: ReactNode;
  readonly footnote?: string | undefined;
}

function Stated({ kind, title, text, actions, footnote }: StatedProps) {
  return (
    <div className="px-6 py-8 max-sm:px-5">
      <Notice kind={kind} title={title} actions={actions} footnote={footnote}>
        {text}
      </Notice>
    </div>
  );
}

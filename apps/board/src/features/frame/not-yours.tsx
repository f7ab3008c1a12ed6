import { LinkButton } from '../../ui/actions/link-button.tsx';
import { EmptyState } from '../../ui/notices/empty-state.tsx';
import { PageHead } from '../../ui/page/page-head.tsx';
import { frameWords } from '../../words/frame.ts';

/** A place that exists and belongs to other roles: said without asking the server for what it would refuse. */
export function NotYours({ place }: { readonly place: string }) {
  return (
    <>
      <title>{place}</title>
      <PageHead title={place} />
      <div className="px-6 py-4 max-sm:px-5">
        <EmptyState
          kind="time"
          title={frameWords.notYours(place)}
          actions={<LinkButton to="/">{frameWords.toHome}</LinkButton>}
        >
          {frameWords.notYoursText}
        </EmptyState>
      </div>
    </>
  );
}

import { LinkButton } from '../ui/actions/link-button.tsx';
import { EmptyState } from '../ui/notices/empty-state.tsx';
import { PageHead } from '../ui/page/page-head.tsx';
import { frameWords } from '../words/frame.ts';

export function Component() {
  return (
    <>
      <title>{frameWords.nothingTitle}</title>
      <PageHead title={frameWords.nothingTitle} />
      <div className="px-6 py-4 max-sm:px-5">
        <EmptyState kind="time" actions={<LinkButton to="/">{frameWords.toHome}</LinkButton>}>
          {frameWords.nothingText}
        </EmptyState>
      </div>
    </>
  );
}

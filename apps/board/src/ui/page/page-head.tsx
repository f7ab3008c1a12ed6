import type { ReactNode } from 'react';

interface PageHeadProps {
  readonly title: string;
  /** Stands on the line of the title: an age, a count. */
  readonly beside?: ReactNode;
  /** One or two sentences under the title. */
  readonly sentence?: ReactNode;
  readonly actions?: ReactNode;
  /** Tabs; they sit on the lower edge of the head. */
  readonly tabs?: ReactNode;
  /** `person` for a child's name, `page` for all else. */
  readonly kind?: 'person' | 'page';
}

/** The head of every screen, on linen, with a hairline under it. */
export function PageHead({ title, beside, sentence, actions, tabs, kind = 'page' }: PageHeadProps) {
  return (
    <header className="bg-linen border-hair border-b px-6 max-sm:px-5">
      <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-1.5 pt-3">
        <div className="flex min-w-0 flex-wrap items-baseline gap-x-3.5">
          <h1 className={`m-0 ${kind === 'person' ? 'text-title' : 'text-page'}`}>{title}</h1>
          {beside ? <div className="text-sentence text-ink-2">{beside}</div> : null}
        </div>
        {sentence ? <div className="text-sentence text-ink w-full sm:order-1">{sentence}</div> : null}
        {actions ? <div className="no-print flex flex-wrap items-center gap-2">{actions}</div> : null}
      </div>
      {tabs ? <div className="no-print -mb-px pt-1">{tabs}</div> : <div className="pb-3" />}
    </header>
  );
}

import type { ReactNode } from 'react';
import { kitWords } from '../../words/kit.ts';

interface PageFrameProps {
  readonly topBar: ReactNode;
  readonly children: ReactNode;
}

/** Top bar, then the screen on paper; a link over the bar leads straight to the content. */
export function PageFrame({ topBar, children }: PageFrameProps) {
  return (
    <div className="bg-paper flex min-h-screen flex-col">
      <a
        href="#content"
        className="bg-ink text-paper text-body sr-only z-50 rounded px-4 py-2 focus:not-sr-only focus:fixed focus:top-2 focus:left-2"
      >
        {kitWords.skipToContent}
      </a>
      {topBar}
      <main id="content" tabIndex={-1} className="flex grow flex-col">
        {children}
      </main>
    </div>
  );
}

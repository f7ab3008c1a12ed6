import { useId, type ReactNode } from 'react';

interface SectionProps {
  readonly title: string;
  /** At the right end of the title's line: a count, a link. */
  readonly aside?: ReactNode;
  readonly children: ReactNode;
  readonly level?: 2 | 3;
}

/** A part of a page or sheet under its own heading. */
export function Section({ title, aside, children, level = 2 }: SectionProps) {
  const id = useId();
  const look = level === 2 ? 'text-head m-0' : 'text-body m-0 font-semibold';
  return (
    <section aria-labelledby={id} className="flex min-w-0 flex-col gap-2">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        {level === 2 ? (
          <h2 id={id} className={look}>
            {title}
          </h2>
        ) : (
          <h3 id={id} className={look}>
            {title}
          </h3>
        )}
        {aside ? <div className="text-small text-ink-2">{aside}</div> : null}
      </div>
      {children}
    </section>
  );
}

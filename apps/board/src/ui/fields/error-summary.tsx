import { useEffect, useRef, type MouseEvent } from 'react';
import { kitWords } from '../../words/kit.ts';
import { fieldId } from './field-frame.tsx';

interface ErrorSummaryProps {
  readonly errors: readonly { readonly name: string; readonly message: string }[];
  /** Counts the tries to send, so that each one moves the focus here again. */
  readonly attempt?: number;
}

/** Stands above a form that was sent with mistakes: how many, and a link to each. */
export function ErrorSummary({ errors, attempt = 1 }: ErrorSummaryProps) {
  const box = useRef<HTMLDivElement>(null);
  const isEmpty = errors.length === 0;
  useEffect(() => {
    if (!isEmpty) box.current?.focus();
  }, [attempt, isEmpty]);
  if (isEmpty) return null;

  const goTo = (event: MouseEvent, name: string) => {
    event.preventDefault();
    document.getElementById(fieldId(name))?.focus();
  };
  return (
    <div ref={box} role="alert" tabIndex={-1} className="border-madder flex flex-col gap-1 border-l-5 py-1 pl-4">
      <p className="text-head text-ink m-0">{kitWords.fieldsToMend(errors.length)}</p>
      <ul className="m-0 list-none p-0">
        {errors.map((error) => (
          <li key={error.name}>
            <a
              href={`#${fieldId(error.name)}`}
              onClick={(event) => goTo(event, error.name)}
              className="text-body text-madder underline underline-offset-3"
            >
              {error.message}
            </a>
          </li>
        ))}
      </ul>
    </div>
  );
}

import { useEffect, useRef, useState, type ComponentType, type ComponentProps } from 'react';
import { inputClass } from '../../ui/fields/field-frame.tsx';
import { SearchIcon } from '../../ui/icons.tsx';
import { frameWords } from '../../words/frame.ts';
import type { ChildFinder } from './child-finder.tsx';

const isTypedInto = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement &&
  (target.isContentEditable || target.closest('input, textarea, select, [role=textbox], [role=dialog]') !== null);

type Finder = ComponentType<ComponentProps<typeof ChildFinder>>;

/** The field that goes to a child; `/` comes here from anywhere. What searches is fetched when somebody comes near. */
export function GoToChild() {
  const input = useRef<HTMLInputElement>(null);
  const [typed, setTyped] = useState('');
  const [late, setLate] = useState<{ readonly Finder: Finder; readonly hadFocus: boolean } | null>(null);
  const fetchFinder = () => {
    import('./child-finder.tsx').then(
      ({ ChildFinder: Finder }) =>
        setLate((known) => known ?? { Finder, hadFocus: document.activeElement === input.current }),
      () => undefined, // not reached: the next approach asks again
    );
  };

  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key !== '/' || event.ctrlKey || event.metaKey || event.altKey || isTypedInto(event.target)) return;
      if (input.current === null || input.current.offsetParent === null) return;
      event.preventDefault();
      input.current.focus();
    };
    document.addEventListener('keydown', onKeyDown);
    return () => document.removeEventListener('keydown', onKeyDown);
  }, []);

  return (
    <div className="relative" onPointerEnter={fetchFinder}>
      {late === null ? (
        <div className="relative">
          <span className="text-ink-2 pointer-events-none absolute inset-y-0 left-2.5 flex items-center">
            <SearchIcon size={14} />
          </span>
          <input
            ref={input}
            type="text"
            aria-label={frameWords.goToChild}
            placeholder={frameWords.goToChild}
            autoComplete="off"
            value={typed}
            onFocus={fetchFinder}
            onChange={(event) => {
              setTyped(event.target.value);
              fetchFinder();
            }}
            className={`${inputClass(false)} pl-8`}
          />
        </div>
      ) : (
        <late.Finder input={input} typed={typed} hadFocus={late.hadFocus} />
      )}
      <kbd
        aria-hidden="true"
        className="border-thread-2 text-ink-2 text-initials pointer-events-none absolute top-1/2 right-2 hidden -translate-y-1/2 rounded border px-1.5 font-sans sm:block"
      >
        /
      </kbd>
    </div>
  );
}

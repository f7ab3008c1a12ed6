import { useId, type ComponentPropsWithRef, type MouseEvent } from 'react';
import { kitWords } from '../../words/kit.ts';
import { buttonClass, type ButtonLook, type ButtonSize } from './button-look.ts';

type NativeProps = Omit<ComponentPropsWithRef<'button'>, 'disabled' | 'className' | 'style'>;

interface ButtonProps extends NativeProps {
  readonly look?: ButtonLook;
  readonly size?: ButtonSize;
  /** Something is under way: the label stays, pressing again does nothing. */
  readonly isBusy?: boolean | undefined;
  /** Why it cannot be pressed yet; it stays focusable and the reason is its description. */
  readonly notYet?: string | null | undefined;
  /** `elsewhere`: the screen shows the reason in its own place. */
  readonly reasonPlace?: 'beside' | 'elsewhere';
}

export function Button(props: ButtonProps) {
  const { look = 'plain', size = 'mouse', isBusy = false, notYet, reasonPlace = 'beside', ...native } = props;
  const { children, onClick, type = 'button', ...rest } = native;
  const reasonId = useId();
  const hasReason = notYet !== undefined && notYet !== null && notYet !== '';
  const isBlocked = hasReason || isBusy;

  const press = (event: MouseEvent<HTMLButtonElement>) => {
    if (isBlocked) event.preventDefault();
    else onClick?.(event);
  };

  return (
    <>
      <button
        {...rest}
        type={type}
        onClick={press}
        aria-disabled={isBlocked ? true : undefined}
        aria-describedby={hasReason ? reasonId : rest['aria-describedby']}
        aria-busy={isBusy ? true : undefined}
        className={buttonClass({ look, size, isNotYet: hasReason })}
      >
        {children}
        {isBusy ? (
          <span aria-hidden="true" className="-ml-2">
            {kitWords.busyMark}
          </span>
        ) : null}
      </button>
      {hasReason ? (
        <span id={reasonId} className={reasonPlace === 'beside' ? 'text-small text-ink-3 self-center' : 'sr-only'}>
          {notYet}
        </span>
      ) : null}
    </>
  );
}

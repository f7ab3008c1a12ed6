import { useEffect, useRef } from 'react';
import { Button } from '../../ui/actions/button.tsx';
import { Dialog, DialogActions } from '../../ui/overlays/dialog.tsx';
import { frameWords } from '../../words/frame.ts';

interface SessionWarningProps {
  readonly because: 'quiet' | 'day';
  readonly secondsLeft: number;
  readonly onStay: () => void;
  readonly onSignInAgain: () => void;
  readonly onSignOut: () => void;
}

/** The last whole minutes in minutes, the last one in seconds. */
const leftText = (seconds: number): string =>
  seconds > 60 ? frameWords.minutes(Math.ceil(seconds / 60)) : frameWords.seconds(seconds);

/** Two minutes before the session ends. Closing it is a sign of life too. */
export function SessionWarning({ because, secondsLeft, onStay, onSignInAgain, onSignOut }: SessionWarningProps) {
  const first = useRef<HTMLButtonElement>(null);
  useEffect(() => first.current?.focus(), []);
  const left = leftText(secondsLeft);
  const isQuiet = because === 'quiet';
  return (
    <Dialog
      isOpen
      role="alertdialog"
      onClose={isQuiet ? onStay : onSignInAgain}
      title={isQuiet ? frameWords.warnTitle : frameWords.dayEndsTitle}
    >
      <p className="text-body figures m-0">{isQuiet ? frameWords.warnText(left) : frameWords.dayEndsText(left)}</p>
      <DialogActions>
        <Button look="filled" ref={first} onClick={isQuiet ? onStay : onSignInAgain}>
          {isQuiet ? frameWords.stay : frameWords.signInAgain}
        </Button>
        <Button onClick={onSignOut}>{frameWords.signOut}</Button>
      </DialogActions>
    </Dialog>
  );
}

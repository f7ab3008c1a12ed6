import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef, useState, type FormEvent } from 'react';
import { Dialog } from 'react-aria-components/Dialog';
import { Modal, ModalOverlay } from 'react-aria-components/Modal';
import type { Me } from '@weftway/contract/session';
import { placeFaults } from '../../api/form-faults.ts';
import { Logo } from '../../marks/logo.tsx';
import { sessionMutations } from '../../queries/session-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { FieldError } from '../../ui/fields/field-error.tsx';
import { PasswordField } from '../../ui/fields/password-field.tsx';
import { frameWords } from '../../words/frame.ts';

interface LockedScreenProps {
  readonly me: Me;
  readonly onUnlocked: () => void;
  readonly onSomebodyElse: () => void;
}

/** A modal of its own, so that it also lies over a dialog that was open. Covers everything; the page behind it stays as it was, with what was typed. */
export function LockedScreen({ me, onUnlocked, onSomebodyElse }: LockedScreenProps) {
  const client = useQueryClient();
  const [password, setPassword] = useState('');
  const [fault, setFault] = useState('');
  const input = useRef<HTMLInputElement>(null);
  const signIn = useMutation(sessionMutations.signInAgain(client));

  useEffect(() => input.current?.focus(), []);

  const send = async (event: FormEvent) => {
    event.preventDefault();
    if (signIn.isPending) return;
    try {
      await signIn.mutateAsync({ email: me.email, password });
      onUnlocked();
    } catch (error) {
      const found: string[] = [];
      const problem = placeFaults(error, { names: ['password'], setFault: (_name, message) => found.push(message) });
      setFault(found[0] ?? `${problem?.title ?? ''}. ${problem?.detail ?? ''}`);
      input.current?.focus();
      input.current?.select();
    }
  };

  return (
    <ModalOverlay
      isOpen
      isKeyboardDismissDisabled
      className="bg-linen fixed inset-0 z-50 flex items-start justify-center overflow-y-auto px-5 pt-[14vh]"
    >
      <Modal className="w-full max-w-[420px]">
        <Dialog aria-labelledby="locked-title" className="outline-none">
          <form noValidate onSubmit={(event) => void send(event)} className="flex w-full max-w-[420px] flex-col gap-4">
            <Logo size={30} />
            <h1 id="locked-title" className="text-title m-0">
              {frameWords.lockedTitle}
            </h1>
            <p className="text-sentence m-0">{frameWords.lockedText(me.name)}</p>
            <input type="email" name="username" autoComplete="username" value={me.email} readOnly hidden />
            <PasswordField
              ref={input}
              label={frameWords.password}
              name="unlock"
              value={password}
              onChange={setPassword}
              error=""
            />
            <div role="alert">
              <FieldError message={fault} />
            </div>
            <div className="flex flex-wrap items-center gap-3">
              <Button type="submit" look="filled" size="touch" isBusy={signIn.isPending}>
                {frameWords.goOn}
              </Button>
              <Button look="quiet" size="touch" onClick={onSomebodyElse}>
                {frameWords.somebodyElse}
              </Button>
            </div>
            <p className="text-fine text-ink-3 m-0">{frameWords.somebodyElseNote}</p>
          </form>
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}

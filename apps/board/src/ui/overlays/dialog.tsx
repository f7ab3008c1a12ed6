import type { ReactNode } from 'react';
import { Dialog as AriaDialog } from 'react-aria-components/Dialog';
import { Heading } from 'react-aria-components/Heading';
import { Modal, ModalOverlay } from 'react-aria-components/Modal';

interface DialogProps {
  readonly isOpen: boolean;
  /** Escape and the scrim both cancel. */
  readonly onClose: () => void;
  readonly title: string;
  /** Text and fields; end it with `DialogActions`, inside the form when there is one. */
  readonly children: ReactNode;
  /** `alertdialog` when something is about to be lost. */
  readonly role?: 'dialog' | 'alertdialog';
  /** 480 for signing and its like; wide for a list to choose from. */
  readonly width?: 'narrow' | 'wide';
}

export function Dialog({ isOpen, onClose, title, children, role = 'dialog', width = 'narrow' }: DialogProps) {
  return (
    <ModalOverlay
      isOpen={isOpen}
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      isDismissable
      className="bg-scrim fixed inset-0 z-40 flex items-start justify-center overflow-y-auto p-4 pt-[10vh] max-sm:items-end max-sm:p-0"
    >
      <Modal
        className={`bg-paper shadow-lift w-full rounded max-sm:rounded-none ${width === 'wide' ? 'max-w-[720px]' : 'max-w-[480px]'}`}
      >
        <AriaDialog
          role={role}
          className="flex max-h-[84vh] scroll-pb-20 flex-col gap-4 overflow-y-auto p-6 outline-none"
        >
          <Heading slot="title" className="text-sheet m-0">
            {title}
          </Heading>
          {children}
        </AriaDialog>
      </Modal>
    </ModalOverlay>
  );
}

/** The row of buttons at the foot of a dialog, in sight however long it is: the one that acts first. */
export function DialogActions({ children }: { readonly children: ReactNode }) {
  return (
    <div className="bg-paper sticky -bottom-6 z-10 -mx-6 -mb-6 flex flex-wrap items-center gap-2 px-6 pt-3 pb-6">
      {children}
    </div>
  );
}

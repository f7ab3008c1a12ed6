import { useEffect, useEffectEvent, type RefObject } from 'react';

const elsewhere = '[role=dialog],[role=alertdialog],[role=menu],[role=listbox]';

/** Escape closes, F6 changes sides, the focus comes in on opening and goes back on closing. */
export function useSheetKeyboard(sheet: RefObject<HTMLElement | null>, onClose: () => void): void {
  const close = useEffectEvent(onClose);
  useEffect(() => {
    const region = sheet.current;
    let outside = focusedElement();
    const start = region?.querySelector<HTMLElement>('[data-sheet-start]');
    start?.focus({ preventScroll: true });

    const onKeyDown = (event: KeyboardEvent) => {
      const target = event.target instanceof Element ? event.target : null;
      const isBusyElsewhere =
        (target !== null && target.closest(elsewhere) !== null) || target?.getAttribute('aria-expanded') === 'true';
      if (event.defaultPrevented || isBusyElsewhere) return;
      if (event.key === 'Escape') close();
      if (event.key !== 'F6') return;
      event.preventDefault();
      if (region?.contains(document.activeElement) === true) outside?.focus();
      else {
        outside = focusedElement();
        start?.focus();
      }
    };
    document.addEventListener('keydown', onKeyDown);
    return () => {
      document.removeEventListener('keydown', onKeyDown);
      // React has taken the sheet away by now: the focus fell to the body, or someone else took it on purpose.
      const isLost = document.activeElement === document.body || region?.contains(document.activeElement) === true;
      if (isLost) outside?.focus();
    };
  }, [sheet]);
}

function focusedElement(): HTMLElement | SVGElement | null {
  const active = document.activeElement;
  return active instanceof HTMLElement || active instanceof SVGElement ? active : null;
}

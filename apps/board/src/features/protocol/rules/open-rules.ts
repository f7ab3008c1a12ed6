/** Which rules are unfolded: the one that the address names, those that were pressed, all of them while printing. */
import { useCallback, useEffect, useState } from 'react';
import { flushSync } from 'react-dom';
import { useLocation } from 'react-router-dom';

export interface OpenRules {
  readonly isOpen: (id: string) => boolean;
  readonly toggle: (id: string) => void;
  readonly areAllOpen: boolean;
  readonly openAll: (open: boolean) => void;
}

export const useOpenRules = (): OpenRules => {
  const { hash } = useLocation();
  const named = decodeURIComponent(hash.slice(1));
  const [open, setOpen] = useState<ReadonlySet<string>>(new Set(named === '' ? [] : [named]));
  const [areAllOpen, setAllOpen] = useState(false);
  const [isPrinting, setPrinting] = useState(false);

  // The rules come after the page, so the browser could not scroll to the address by itself.
  useEffect(() => {
    if (named === '') return;
    setOpen((now) => new Set([...now, named]));
    const place = document.getElementById(named);
    place?.scrollIntoView({ block: 'start' });
    place?.querySelector<HTMLElement>('button[data-rule]')?.focus({ preventScroll: true });
  }, [named]);

  useEffect(() => {
    const before = () => flushSync(() => setPrinting(true));
    const after = () => setPrinting(false);
    window.addEventListener('beforeprint', before);
    window.addEventListener('afterprint', after);
    return () => {
      window.removeEventListener('beforeprint', before);
      window.removeEventListener('afterprint', after);
    };
  }, []);

  const toggle = useCallback((id: string) => {
    setOpen((now) => {
      const next = new Set(now);
      if (!next.delete(id)) next.add(id);
      return next;
    });
  }, []);

  const openAll = useCallback((all: boolean) => {
    setAllOpen(all);
    if (!all) setOpen(new Set());
  }, []);

  return { isOpen: (id) => areAllOpen || isPrinting || open.has(id), toggle, areAllOpen, openAll };
};

import { useEffect, useEffectEvent } from 'react';

/** `?` shows all keys, unless it is being typed into something. */
export function useKeysKey(onKeys: () => void): void {
  const show = useEffectEvent(onKeys);
  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => {
      const isTyping =
        event.target instanceof HTMLElement &&
        event.target.closest('input,textarea,select,[contenteditable],[role=dialog]') !== null;
      if (event.key !== '?' || isTyping || event.ctrlKey || event.metaKey) return;
      event.preventDefault();
      show();
    };
    document.addEventListener('keydown', onKeyDown);
    return () => document.removeEventListener('keydown', onKeyDown);
  }, []);
}

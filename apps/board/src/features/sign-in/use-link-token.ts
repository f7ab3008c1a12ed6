import { useState } from 'react';
import { useLocation } from 'react-router-dom';

/**
 * The token of a mailed link stands behind `#`, where no server log sees it. It is read once and taken out of the
 * address, so that it stays neither in the history nor over somebody's shoulder.
 */
export function useLinkToken(): string {
  const { hash, pathname } = useLocation();
  const [token] = useState(() => hash.replace(/^#/, ''));
  if (hash !== '') window.history.replaceState(window.history.state, '', pathname);
  return token;
}

import { useState, type ReactNode } from 'react';
import { useNavigate } from 'react-router-dom';
import type { Session, Me } from '@weftway/contract/session';
import { Menu, type MenuEntry } from '../../ui/actions/menu.tsx';
import { applyTheme, chosenTheme, themes } from '../../ui/theme.ts';
import { frameWords } from '../../words/frame.ts';
import { mayReadReference } from './places.ts';

interface WhoMenuListProps {
  readonly me: Me;
  readonly session: Session;
  readonly onSignOut: () => void;
  readonly children: ReactNode;
}

/** What belongs to the person: account, light or dark, the way out. Fetched when it is pressed. */
export function WhoMenuList({ me, session, onSignOut, children }: WhoMenuListProps) {
  const navigate = useNavigate();
  const [theme, setTheme] = useState(chosenTheme);
  const go = (to: string) => () => void navigate(to);
  const entries: MenuEntry[] = [
    { key: 'account', label: frameWords.account, onAction: go('/account') },
    ...themes.map((one) => ({
      key: one,
      label: frameWords.themes[one],
      detail: one === theme ? frameWords.chosen : undefined,
      onAction: () => {
        applyTheme(one);
        setTheme(one);
      },
    })),
    ...(mayReadReference(me)
      ? [{ key: 'reference', label: frameWords.apiReference, onAction: go('/api-reference') }]
      : []),
    ...(session.isDemo ? [{ key: 'inbox', label: frameWords.localInbox, onAction: go('/inbox') }] : []),
    { key: 'sign-out', label: frameWords.signOut, onAction: onSignOut },
  ];
  return (
    <Menu label={frameWords.yourMenu(me.name)} entries={entries} look="bare" opensAtOnce>
      {children}
    </Menu>
  );
}

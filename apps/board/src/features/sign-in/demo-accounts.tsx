import type { Session } from '@weftway/contract/session';
import { TextLink } from '../../ui/actions/text-link.tsx';
import { signInWords } from '../../words/sign-in.ts';

type Account = Session['demoAccounts'][number];

interface DemoAccountsProps {
  readonly accounts: readonly Account[];
  readonly onChoose: (account: Account) => void;
}

/** A quiet list: choosing somebody fills the form in, nothing more. */
export function DemoAccounts({ accounts, onChoose }: DemoAccountsProps) {
  return (
    <section aria-labelledby="demo-accounts" className="flex flex-col gap-3">
      <h2 id="demo-accounts" className="text-head m-0">
        {signInWords.demoTitle}
      </h2>
      <p className="text-body text-ink-2 m-0 max-w-[60ch]">{signInWords.demoText}</p>
      <ul className="m-0 grid list-none grid-cols-1 gap-x-8 p-0 sm:grid-cols-2">
        {accounts.map((account) => (
          <li key={account.email} className="border-hair border-t">
            <button
              type="button"
              onClick={() => onChoose(account)}
              className="hover:bg-paper flex min-h-11 w-full flex-col items-start justify-center rounded py-1 text-left"
            >
              <span className="text-body text-indigo font-semibold">{account.name}</span>
              <span className="text-fine text-ink-3">{account.role}</span>
            </button>
          </li>
        ))}
      </ul>
      <p className="text-small text-ink-2 m-0">
        <TextLink to="/inbox">{signInWords.openInbox}</TextLink>: {signInWords.openInboxText}
      </p>
    </section>
  );
}

import type { AnswerOf } from '@weftway/contract/operation';
import type { readLocalInbox } from '@weftway/contract/session';
import { signInWords } from '../../words/sign-in.ts';

type Letter = AnswerOf<typeof readLocalInbox>['mails'][number];

const link = /(https?:\/\/\S+)/;

/** Letters as they would lie on a table: one below the other, newest first. */
export function LetterList({ letters }: { readonly letters: readonly Letter[] }) {
  return (
    <ol className="m-0 flex list-none flex-col gap-8 p-0">
      {letters.map((letter) => (
        <li key={letter.id}>
          <article
            aria-labelledby={`letter-${letter.id}`}
            className="bg-bleached border-hair max-w-[680px] border px-8 py-6 max-sm:px-5"
          >
            <h2 id={`letter-${letter.id}`} className="text-head m-0">
              {letter.subject}
            </h2>
            <dl className="text-small text-ink-2 m-0 flex flex-wrap gap-x-6 pt-1 pb-4">
              <div className="flex gap-1.5">
                <dt>{signInWords.to}</dt>
                <dd className="text-ink m-0 break-all">{letter.to}</dd>
              </div>
              <div className="flex gap-1.5">
                <dt>{signInWords.sentAt}</dt>
                <dd className="text-ink figures m-0">
                  <time dateTime={letter.at}>
                    {new Date(letter.at).toLocaleString('en-GB', { dateStyle: 'medium', timeStyle: 'short' })}
                  </time>
                </dd>
              </div>
            </dl>
            <LetterText text={letter.text} />
          </article>
        </li>
      ))}
    </ol>
  );
}

/** Links of a letter open within this window; everything else is plain text. */
function LetterText({ text }: { readonly text: string }) {
  return (
    <p className="text-sentence m-0 whitespace-pre-wrap">
      {text.split(link).map((part, index) =>
        link.test(part) ? (
          <a key={part} href={ownPath(part)} className="text-indigo break-all underline underline-offset-3">
            {part}
          </a>
        ) : (
          <span key={`${String(index)} ${part.slice(0, 12)}`}>{part}</span>
        ),
      )}
    </p>
  );
}

/** The path alone: the demonstration may be looked at under another name than the one in the letter. */
const ownPath = (address: string): string => {
  const { pathname, hash } = new URL(address);
  return pathname + hash;
};

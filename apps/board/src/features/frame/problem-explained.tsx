import { problems, type ProblemName } from '@weftway/contract/problems';
import { frameWords } from '../../words/frame.ts';
import { problemWords } from '../../words/problems.ts';

/** One kind of problem in plain words. */
export function ProblemExplained({ name }: { readonly name: ProblemName }) {
  const { happened, helps } = problemWords[name];
  return (
    <div className="flex max-w-[72ch] flex-col gap-4">
      <div>
        <h2 className="text-head m-0">{frameWords.whatHappened}</h2>
        <p className="text-sentence m-0 pt-1">{happened}</p>
      </div>
      <div>
        <h2 className="text-head m-0">{frameWords.whatHelps}</h2>
        <p className="text-sentence m-0 pt-1">{helps}</p>
      </div>
      <p className="text-fine text-ink-3 m-0">{frameWords.problemFor(problems[name].status)}</p>
    </div>
  );
}

import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { problemNames, problems } from '@weftway/contract/problems';
import { ProblemExplained } from '../features/frame/problem-explained.tsx';
import { OutsideFrame } from '../features/sign-in/outside-frame.tsx';
import { sessionQueries } from '../queries/session-queries.ts';
import { TextLink } from '../ui/actions/text-link.tsx';
import { frameWords } from '../words/frame.ts';

/** The page behind the `type` of each problem; anybody may read it. */
export function Component() {
  const session = useQuery(sessionQueries.current()).data;
  const { name } = useParams();
  const known = problemNames.find((one) => one === name);
  return (
    <OutsideFrame team={session?.team.name}>
      <title>{frameWords.problemTitle}</title>
      <div className="flex flex-col gap-8">
        <h1 className="text-title m-0">{known === undefined ? frameWords.unknownProblem : problems[known].title}</h1>
        {known === undefined ? null : <ProblemExplained name={known} />}
        <nav aria-labelledby="all-problems">
          <h2 id="all-problems" className="text-head m-0 pb-2">
            {frameWords.allProblems}
          </h2>
          <ul className="text-body m-0 grid list-none gap-x-8 gap-y-1.5 p-0 sm:grid-cols-2">
            {problemNames.map((one) => (
              <li key={one}>
                <TextLink to={`/problems/${one}`} aria-current={one === known ? 'page' : undefined}>
                  {problems[one].title}
                </TextLink>
              </li>
            ))}
          </ul>
        </nav>
      </div>
    </OutsideFrame>
  );
}

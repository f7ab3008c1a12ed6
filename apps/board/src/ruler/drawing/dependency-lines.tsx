import { branchPath, type DependencyBranch } from '../layout/dependency-branches.ts';

interface DependencyLinesProps {
  readonly branches: readonly DependencyBranch[];
}

/** From each prerequisite along a common trunk to the chosen window: solid when met, dashed while not. */
export function DependencyLines({ branches }: DependencyLinesProps) {
  const first = branches[0];
  if (first === undefined) return null;
  const { end, toY } = first;
  return (
    <g fill="none" aria-hidden="true">
      {branches.map((branch) => (
        <path key={branch.key} d={branchPath(branch)} className="stroke-paper" strokeWidth="6" />
      ))}
      {branches.map((branch) => (
        <path
          key={branch.key}
          d={branchPath(branch)}
          className="stroke-indigo"
          strokeWidth="2"
          strokeDasharray={branch.isMet ? undefined : '7 3'}
        />
      ))}
      <path
        d={`M${String(end - 6)} ${String(toY - 5)}L${String(end)} ${String(toY)}L${String(end - 6)} ${String(toY + 5)}`}
        className="stroke-indigo"
        strokeWidth="2"
      />
    </g>
  );
}

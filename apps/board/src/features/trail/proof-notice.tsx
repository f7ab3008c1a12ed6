import type { ChainProof } from '@weftway/contract/trail';
import { Notice } from '../../ui/notices/notice.tsx';
import { trailWords } from '../../words/trail.ts';

type Proof = ChainProof & { readonly reads: ChainProof };

/** The outcome of a proof: how many lines hold, or the first that does not. */
export function ProofNotice({ proof }: { readonly proof: Proof }) {
  const [log, broken] = proof.brokenAt !== null ? (['changes', proof] as const) : (['reads', proof.reads] as const);
  if (broken.brokenAt === null) {
    return (
      <Notice kind="note" title={trailWords.holds}>
        {trailWords.holdsText(proof.lines, proof.reads.lines)}
      </Notice>
    );
  }
  return (
    <Notice kind="error" title={trailWords.broken} footnote={trailWords.brokenText}>
      {trailWords.brokenLog(log, broken.brokenAt)} {broken.why}
    </Notice>
  );
}

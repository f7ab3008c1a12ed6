import type { ProtocolFault } from '@weftway/pathway/protocol-faults';
import { protocolWords } from '../../../words/protocol.ts';

interface FaultListProps {
  readonly faults: readonly ProtocolFault[];
  /** Line of a pointer in the file; absent while the file is not shown. */
  readonly lineOf?: ((pointer: string) => number) | undefined;
  readonly onGoTo?: ((line: number) => void) | undefined;
}

/** Every fault with its milestone and place. */
export function FaultList({ faults, lineOf, onGoTo }: FaultListProps) {
  const words = protocolWords.proposal;
  return (
    <div role="alert" className="border-madder flex flex-col gap-1 border-l-5 py-0.5 pl-4">
      <p className="text-head m-0">{words.faults(faults.length)}</p>
      <ul className="m-0 list-none p-0">
        {faults.map((fault) => {
          const line = lineOf?.(fault.pointer);
          return (
            <li key={`${fault.pointer} ${fault.message}`} className="text-body py-0.5">
              <span className="font-semibold">{fault.milestone ?? words.whole}</span>
              <span className="text-small text-ink-3"> {fault.pointer}</span>
              {line === undefined || onGoTo === undefined ? null : (
                <button
                  type="button"
                  onClick={() => onGoTo(line)}
                  className="text-small text-indigo ml-2 min-h-6 rounded underline underline-offset-3"
                >
                  {words.atLine(line)}
                </button>
              )}
              <span className="block">{fault.message}</span>
            </li>
          );
        })}
      </ul>
    </div>
  );
}

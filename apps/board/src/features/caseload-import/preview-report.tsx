import type { ImportPreview } from '@weftway/contract/caseload-import';
import { Button } from '../../ui/actions/button.tsx';
import { Notice } from '../../ui/notices/notice.tsx';
import { importWords } from '../../words/import.ts';
import { FaultTable } from './fault-table.tsx';
import { SampleTable } from './sample-table.tsx';

interface PreviewReportProps {
  readonly preview: ImportPreview;
  /** The file or the order was changed after the check. */
  readonly isStale: boolean;
  readonly isBusy: boolean;
  readonly onAccept: () => void;
}

const reasonAgainst = (preview: ImportPreview, isStale: boolean): string | null => {
  if (isStale) return importWords.fileChanged;
  return preview.faultCount > 0 ? importWords.haveFaults : null;
};

/** What the check found: counts, problems, how rows were understood, and the one button that writes. */
export function PreviewReport({ preview, isStale, isBusy, onAccept }: PreviewReportProps) {
  const { rows, added, updated, unchanged, faultCount, warningCount } = preview;
  const isNothing = faultCount === 0 && added + updated === 0;
  const counts = [
    faultCount === 0 ? importWords.noFaults : importWords.faults(faultCount),
    ...(warningCount === 0 ? [] : [importWords.warnings(warningCount)]),
  ].join(', ');
  return (
    <div className="flex flex-col gap-6">
      <Notice kind={faultCount > 0 ? 'error' : 'note'} title={`${importWords.found(rows)}. ${counts}.`}>
        <p className="m-0">{importWords.outcome(added, updated, unchanged)}</p>
        <p className="m-0">
          {faultCount > 0
            ? importWords.faultsFirst
            : isNothing
              ? importWords.nothingToDo
              : warningCount > 0
                ? importWords.warningsOnly
                : null}
        </p>
      </Notice>
      {isNothing ? null : (
        <div className="flex flex-wrap items-center gap-2">
          <Button look="filled" isBusy={isBusy} notYet={reasonAgainst(preview, isStale)} onClick={onAccept}>
            {importWords.accept(added + updated)}
          </Button>
        </div>
      )}
      <FaultTable key={preview.id} preview={preview} />
      <SampleTable sample={preview.sample} />
    </div>
  );
}

import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { abilityFor, canSome } from '@weftway/abilities/ability-for';
import type { DateOrder } from '@weftway/calendar/written-date';
import { problemOf } from '../api/form-faults.ts';
import { BusyLine } from '../features/caseload-import/busy-line.tsx';
import { ColumnGuide } from '../features/caseload-import/column-guide.tsx';
import { FileChoice } from '../features/caseload-import/file-choice.tsx';
import { PreviewReport } from '../features/caseload-import/preview-report.tsx';
import type { TextFile } from '../features/caseload-import/read-text-file.ts';
import { importMutations, type ImportFile } from '../queries/import-queries.ts';
import { sessionQueries } from '../queries/session-queries.ts';
import { Button } from '../ui/actions/button.tsx';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { Notice } from '../ui/notices/notice.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { PageHead } from '../ui/page/page-head.tsx';
import { importWords } from '../words/import.ts';

/** Bring a caseload in: choose, check, take in. */
export function Component() {
  const session = useQuery(sessionQueries.current()).data;
  const [round, setRound] = useState(0);
  if (session === undefined) return null;
  const mayRun = canSome(abilityFor(session.me), 'run', 'Import');
  return (
    <>
      <title>{importWords.title}</title>
      <PageHead title={importWords.title} sentence={importWords.lead} />
      <div className="flex flex-col gap-8 px-6 py-5 max-sm:px-5">
        {mayRun ? (
          <ImportSteps key={round} onAnother={() => setRound(round + 1)} />
        ) : (
          <Notice kind="note" title={importWords.onlyCoordinator} />
        )}
        <ColumnGuide />
      </div>
    </>
  );
}

function ImportSteps({ onAnother }: { readonly onAnother: () => void }) {
  const client = useQueryClient();
  const [file, setFile] = useState<TextFile | null>(null);
  const [dateOrder, setDateOrder] = useState<DateOrder>('day-first');
  const [checked, setChecked] = useState<ImportFile | null>(null);
  const preview = useMutation(importMutations.preview());
  const accept = useMutation(importMutations.accept(client));
  const problem = problemOf(preview.error ?? accept.error);

  const check = () => {
    if (file === null) return;
    const asked = { fileName: file.name, text: file.text, dateOrder };
    accept.reset();
    setChecked(asked);
    preview.mutate(asked);
  };
  const isStale = checked === null || checked.text !== file?.text || checked.dateOrder !== dateOrder;

  if (accept.data !== undefined) {
    return (
      <Notice
        kind="note"
        title={importWords.taken(accept.data.added, accept.data.updated)}
        actions={
          <>
            <LinkButton look="filled" to="/children">
              {importWords.seeChildren}
            </LinkButton>
            <Button onClick={onAnother}>{importWords.another}</Button>
          </>
        }
      />
    );
  }
  return (
    <>
      <FileChoice
        file={file}
        dateOrder={dateOrder}
        isChecked={preview.data !== undefined && !isStale}
        isBusy={preview.isPending}
        onFile={setFile}
        onOrder={setDateOrder}
        onCheck={check}
      />
      {preview.isPending ? <BusyLine phase={importWords.checking} /> : null}
      {accept.isPending ? <BusyLine phase={importWords.writing} note={importWords.writingNote} /> : null}
      {problem === null ? null : <ProblemNotice problem={problem} />}
      {preview.data === undefined || preview.isPending ? null : (
        <PreviewReport
          preview={preview.data}
          isStale={isStale}
          isBusy={accept.isPending}
          onAccept={() => accept.mutate(preview.data.id)}
        />
      )}
    </>
  );
}

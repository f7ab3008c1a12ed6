import { useId, useState, type ChangeEvent } from 'react';
import { dateOrders, importColumns } from '@weftway/contract/caseload-import';
import type { DateOrder } from '@weftway/calendar/written-date';
import { Button } from '../../ui/actions/button.tsx';
import { FieldError } from '../../ui/fields/field-error.tsx';
import { RadioField } from '../../ui/fields/radio-field.tsx';
import { Notice } from '../../ui/notices/notice.tsx';
import { importWords } from '../../words/import.ts';
import { readTextFile, type TextFile } from './read-text-file.ts';

interface FileChoiceProps {
  readonly file: TextFile | null;
  readonly dateOrder: DateOrder;
  readonly isChecked: boolean;
  readonly isBusy: boolean;
  readonly onFile: (file: TextFile | null) => void;
  readonly onOrder: (order: DateOrder) => void;
  readonly onCheck: () => void;
}

const orders = dateOrders.map((value) => ({ value, label: importWords.orders[value] }));

/** A header and nothing else, made here: no request is needed for it. */
const saveTemplate = (): void => {
  const url = URL.createObjectURL(new Blob([`${importColumns.join(',')}\r\n`], { type: 'text/csv;charset=utf-8' }));
  const link = document.createElement('a');
  link.href = url;
  link.download = importWords.templateName;
  link.click();
  URL.revokeObjectURL(url);
};

export function FileChoice({ file, dateOrder, isChecked, isBusy, onFile, onOrder, onCheck }: FileChoiceProps) {
  const id = useId();
  const [trouble, setTrouble] = useState<string | undefined>(undefined);
  const choose = async (event: ChangeEvent<HTMLInputElement>) => {
    const chosen = event.target.files?.[0];
    if (chosen === undefined) return;
    const reading = await readTextFile(chosen);
    setTrouble(
      reading.kind === 'text'
        ? undefined
        : reading.kind === 'too-large'
          ? importWords.tooLarge
          : importWords.unreadable,
    );
    onFile(reading.kind === 'text' ? reading.file : null);
  };
  return (
    <div className="flex max-w-2xl flex-col gap-4">
      <div className="flex flex-col gap-1">
        <label htmlFor={id} className="text-label text-ink">
          {importWords.file}
        </label>
        <input
          id={id}
          type="file"
          accept=".csv,.txt,.tsv,text/csv"
          aria-describedby={`${id}-hint ${id}-error`}
          aria-invalid={trouble === undefined ? undefined : true}
          onChange={(event) => void choose(event)}
          // Choosing the same file again, after it was mended, must count as a choice.
          onClick={(event) => (event.currentTarget.value = '')}
          className="border-thread-2 bg-bleached text-body text-ink file:border-thread-2 file:text-ink w-full rounded border py-1.5 pl-1.5 file:mr-3 file:min-h-7 file:cursor-pointer file:rounded file:border file:border-solid file:bg-transparent file:px-3 file:font-semibold"
        />
        <p id={`${id}-hint`} className="text-fine text-ink-3 m-0">
          {importWords.fileHint}
        </p>
        <FieldError id={`${id}-error`} message={trouble} />
      </div>
      {file === null || file.otherEncoding === null ? null : (
        <Notice kind="conflict" title={importWords.otherEncoding(file.otherEncoding)} />
      )}
      <RadioField
        label={importWords.dateOrder}
        value={dateOrder}
        options={orders}
        direction="across"
        onChange={(order) => (order === '' ? undefined : onOrder(order))}
      />
      <div className="flex flex-wrap items-center gap-2">
        <Button
          look={isChecked ? 'plain' : 'filled'}
          isBusy={isBusy}
          notYet={file === null ? importWords.chooseFirst : null}
          onClick={onCheck}
        >
          {isChecked ? importWords.checkAgain : importWords.check}
        </Button>
        <Button look="quiet" onClick={saveTemplate}>
          {importWords.template}
        </Button>
      </div>
    </div>
  );
}

import type { SigningSheet } from './signing-sheet.ts';
import { useState } from 'react';
import { isProblem } from '../../../api/api-client.ts';
import { ComboboxField, type ComboboxOption } from '../../../ui/fields/combobox-field.tsx';
import { PasswordField } from '../../../ui/fields/password-field.tsx';
import { TextArea } from '../../../ui/fields/text-area.tsx';
import { Notice } from '../../../ui/notices/notice.tsx';
import { Section } from '../../../ui/page/section.tsx';
import { signingWords } from '../../../words/signing.ts';
import { ActDialog } from './act-dialog.tsx';

export interface OverrideText {
  readonly check: string;
  readonly reason: string;
  readonly secondName: string | null;
}

interface SignDialogProps {
  readonly sheet: SigningSheet;
  readonly signer: string;
  /** Who may stand by it as the second clinician. */
  readonly colleagues: readonly ComboboxOption[];
  /** Title of a check by its key. */
  readonly titleOf: (key: string) => string;
  readonly isBusy: boolean;
  readonly error: unknown;
  /** The record changed between reading and signing. */
  readonly isChanged: boolean;
  readonly onClose: () => void;
  readonly onSign: (of: { readonly password: string; readonly overrides: readonly OverrideText[] }) => void;
}

/** Repeats in one sentence what is signed, shows the evidence, and asks for the password. */
export function SignDialog(props: SignDialogProps) {
  const { sheet, signer, isBusy, error, isChanged, onClose, onSign } = props;
  const [password, setPassword] = useState('');
  const [overrides, setOverrides] = useState<Readonly<Record<string, OverrideText>>>({});
  const [isTried, setTried] = useState(false);
  const refusals = sheet.refusals.filter((refusal) => !isAnswerable(refusal.code));
  const asked = askedFor(sheet);
  const given = asked.map(({ check }) => overrides[check] ?? { check, reason: '', secondName: null });
  const needsSecond = new Set(asked.filter((one) => one.needsSecondName).map((one) => one.check));
  const isLacking = given.some(
    (one) => one.reason.trim().length < 3 || (needsSecond.has(one.check) && (one.secondName ?? '').trim() === ''),
  );
  const wrong = isProblem(error, 'wrong-password') ? (error.problem.detail ?? signingWords.wrongPassword) : undefined;
  const submit = () => {
    setTried(true);
    if (password === '' || isLacking || refusals.length > 0) return;
    onSign({
      password,
      overrides: given.map((one) => ({
        ...one,
        reason: one.reason.trim(),
        secondName: (one.secondName ?? '').trim() || null,
      })),
    });
  };
  return (
    <ActDialog
      title={signingWords.signTitle}
      onClose={onClose}
      onSubmit={submit}
      submitLabel={signingWords.signAs(signer)}
      isBusy={isBusy}
      error={isChanged ? null : error}
    >
      <p className="text-sentence m-0 font-semibold">{sheet.sentence}</p>
      {isChanged ? <Notice kind="conflict" title={signingWords.contentChanged} /> : null}
      {refusals.length === 0 ? null : (
        <Notice kind="error" title={signingWords.cannotYet}>
          <ul className="m-0 list-none p-0">
            {refusals.map((refusal) => (
              <li key={`${refusal.code} ${refusal.text}`}>{withTitles(refusal.text, props.titleOf)}</li>
            ))}
          </ul>
        </Notice>
      )}
      <SheetEvidence sheet={sheet} />
      <Overrides
        titleOf={props.titleOf}
        colleagues={props.colleagues}
        asked={asked}
        overrides={given}
        isTried={isTried}
        onChange={(one) => setOverrides((was) => ({ ...was, [one.check]: one }))}
      />
      <p className="text-body text-ink-2 m-0">
        {signingWords.meaning(sheet.meaning)} {signingWords.final}
      </p>
      <PasswordField
        label={signingWords.password}
        hint={signingWords.passwordHint}
        value={password}
        onChange={setPassword}
        error={wrong ?? (isTried && password === '' ? signingWords.passwordMissing : undefined)}
      />
    </ActDialog>
  );
}

/** Refusals that the person answers in this very dialog, by a reason or a second name. */
const isAnswerable = (code: string): boolean =>
  code === 'check-override-reason-needed' || code === 'second-name-needed';

interface Asked {
  readonly check: string;
  readonly text: string;
  readonly needsSecondName: boolean;
}

/** Checks that are signed past, and values that a second clinician must stand by. */
const askedFor = (sheet: SigningSheet): readonly Asked[] => [
  ...sheet.overridable,
  ...sheet.refusals.flatMap(({ code, field, text }) =>
    code === 'second-name-needed' && field !== null ? [{ check: field, text, needsSecondName: true }] : [],
  ),
];

const milestoneKey = /[A-Z]{3,5}-\d{2,3}(:(R|L|[A-Z]{3,5}-\d{2,3}))?/g;

/** The server names milestones by their key; people read their titles. */
const withTitles = (text: string, titleOf: (key: string) => string): string =>
  text.replace(milestoneKey, (key) => titleOf(key));

function SheetEvidence({ sheet }: Pick<SignDialogProps, 'sheet'>) {
  if (sheet.evidence.length === 0) return null;
  return (
    <Section title={signingWords.evidence} level={3}>
      <dl className="text-body m-0 grid grid-cols-[auto_1fr] gap-x-4 gap-y-1">
        {sheet.evidence.map((line) => (
          <div key={line.name} className="contents">
            <dt className="text-ink-2">{line.label}</dt>
            <dd className="m-0 min-w-0 break-words">{line.text}</dd>
          </div>
        ))}
      </dl>
    </Section>
  );
}

interface OverridesProps extends Pick<SignDialogProps, 'titleOf' | 'colleagues'> {
  readonly asked: readonly Asked[];
  readonly overrides: readonly OverrideText[];
  readonly isTried: boolean;
  readonly onChange: (one: OverrideText) => void;
}

function Overrides({ asked, titleOf, colleagues, overrides, isTried, onChange }: OverridesProps) {
  if (asked.length === 0) return null;
  return (
    <Section title={signingWords.overridesTitle} level={3}>
      {asked.map((one, at) => {
        const now = overrides[at] ?? { check: one.check, reason: '', secondName: null };
        return (
          <div key={one.check} className="flex flex-col gap-2">
            <p className="text-body m-0">{withTitles(one.text, titleOf)}</p>
            <TextArea
              label={signingWords.overrideReason}
              rows={2}
              value={now.reason}
              onChange={(reason) => onChange({ ...now, reason })}
              error={isTried && now.reason.trim().length < 3 ? signingWords.hold.reasonError : undefined}
            />
            {one.needsSecondName ? (
              <ComboboxField
                label={signingWords.secondName}
                value={now.secondName}
                onChange={(secondName) => onChange({ ...now, secondName })}
                options={colleagues}
                error={isTried && (now.secondName ?? '').trim() === '' ? signingWords.waive.secondError : undefined}
              />
            ) : null}
          </div>
        );
      })}
    </Section>
  );
}

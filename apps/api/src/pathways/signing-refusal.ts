/** What the sign-off rules refuse, as the problem that the caller gets. */
import type { FieldFault } from '@weftway/contract/problems';
import type { SigningRefusal, SigningRefusalCode } from '@weftway/pathway/sign-off';
import { refused } from '../http/outcome.ts';
import type { Refused } from '../http/outcome.ts';

/** Where in the body each refusal points to; `value` and `isConfirmed` are members of the field that is meant. */
const pointers: Readonly<Record<SigningRefusalCode, string | null>> = {
  'evidence-missing': 'value',
  'evidence-impossible': 'value',
  'evidence-unlikely': 'isConfirmed',
  'in-the-future': '/performedOn',
  'before-birth': '/performedOn',
  'check-override-reason-needed': '/overrides',
  'second-name-needed': '/overrides',
  'unknown-part': '/part',
  'same-person-twice': '/part',
  'same-discipline-twice': '/part',
  'not-on-path': null,
  transferred: null,
  waived: null,
  'already-signed': null,
  'trainee-cannot-sign': null,
  'not-your-discipline': null,
  'gate-unmet': null,
};

const pointerOf = (fault: SigningRefusal): string | null => {
  const pointer = pointers[fault.code];
  return pointer === null || pointer.startsWith('/') ? pointer : `/values/${fault.field ?? ''}/${pointer}`;
};

export const refusalLines = (faults: readonly SigningRefusal[]) =>
  faults.map((fault) => ({
    code: fault.code,
    text: fault.message,
    field: fault.field ?? null,
    ...(fault.milestone === undefined ? {} : { milestone: fault.milestone }),
  }));

const pointed = (faults: readonly SigningRefusal[]): FieldFault[] =>
  faults.flatMap((fault) => {
    const pointer = pointerOf(fault);
    return pointer === null ? [] : [{ pointer, detail: fault.message }];
  });

/** The most telling problem of several faults, or null when there are none. */
export const signingRefusal = (faults: readonly SigningRefusal[]): Refused | null => {
  const [first] = faults;
  if (first === undefined) return null;
  const of = (...codes: SigningRefusal['code'][]): SigningRefusal | undefined =>
    faults.find((fault) => codes.includes(fault.code));
  const who = of('trainee-cannot-sign', 'not-your-discipline');
  if (who !== undefined) return refused('not-allowed', { detail: who.message });
  const signed = of('already-signed');
  if (signed !== undefined) return refused('milestone-already-signed', { detail: signed.message });
  const state = of('not-on-path', 'transferred', 'waived');
  if (state !== undefined)
    return refused('milestone-state-refuses', { detail: state.message, extra: { reason: state.code } });
  const day = faults.filter(
    (fault) => fault.code === 'in-the-future' || fault.code === 'before-birth' || fault.code === 'unknown-part',
  );
  if (day.length > 0) return refused('bad-input', { errors: pointed(day) });
  return refused('milestone-not-ready', {
    detail: first.message,
    errors: pointed(faults),
    extra: { refusals: refusalLines(faults) },
  });
};

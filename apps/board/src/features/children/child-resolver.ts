/** Joins the reading of the form to the form library: faults by field name. */
import { set, type FieldErrors, type Resolver } from 'react-hook-form';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { readChildForm, type ChildFormValues, type ChildKind, type FormFault } from './child-form-values.ts';

export const childResolver =
  (today: PlainDate, kind: ChildKind): Resolver<ChildFormValues> =>
  (values) => {
    const reading = readChildForm(values, today, kind);
    if (reading.kind === 'fields') return { values, errors: {} };
    const errors: FieldErrors<ChildFormValues> = {};
    for (const { name, message } of reading.faults) set(errors, name, { type: 'fault', message });
    return { values: {}, errors };
  };

/** Every message of a tree of errors with the name of its field. */
export const flatFaults = (errors: object, above = ''): FormFault[] =>
  Object.entries(errors).flatMap(([key, value]: [string, unknown]) => {
    if (typeof value !== 'object' || value === null) return [];
    const name = above === '' ? key : `${above}.${key}`;
    return 'message' in value && typeof value.message === 'string'
      ? [{ name, message: value.message }]
      : key === 'ref'
        ? []
        : flatFaults(value, name);
  });

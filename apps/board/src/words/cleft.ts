/** Words of the cleft diagram and its code. */
import type { ChildFlag } from '@weftway/contract/child';
import type { Severity } from '@weftway/pathway/cleft-code';

export const severityWords: Readonly<Record<Severity, string>> = {
  none: 'whole',
  microform: 'minimal',
  incomplete: 'incomplete',
  complete: 'complete',
};

export const flagWords: Readonly<Record<ChildFlag, { readonly label: string; readonly hint?: string }>> = {
  robin: { label: 'Robin sequence', hint: 'Small jaw, tongue falls back, breathing blocked' },
  airway: { label: 'Airway at risk' },
  smcp: { label: 'Submucous cleft palate', hint: 'The skin of the palate is whole, the muscle beneath is not' },
  syndrome: { label: 'Syndrome suspected' },
  stickler_risk: { label: 'Stickler syndrome possible' },
  uvula_only: { label: 'Only the uvula is split' },
  midline_lip: { label: 'Cleft in the middle of the lip', hint: 'The code cannot write it' },
  early_incisor_track: { label: 'Graft before the incisor', hint: 'Planned for the incisor instead of the canine' },
  jaw_surgery_planned: { label: 'Jaw surgery planned' },
};

export const cleftWords = {
  drawing: 'Drawing of lip, gum and palate',
  keys: 'Press a part to open it further: whole, minimal, incomplete, complete. With the keyboard: Tab to a part, then the arrow keys.',
  rightSide: 'Child’s right',
  leftSide: 'Child’s left',
  lip: 'Lip',
  gum: 'Gum',
  hardPalate: 'Hard palate',
  softPalate: 'Soft palate',
  code: 'Cleft code (LAHSHAL)',
  codeHint: 'Capital: complete. Small letter: incomplete. * minimal. • or . whole. The child’s right is on the left.',
  reads: 'Reads',
  icd10: 'ICD-10',
  noIcd10: 'no code fits',
  clear: 'Take every cleft back',
} as const;

import { expect, it } from 'vitest';
import { cleftAnatomy } from './cleft-anatomy.ts';

it.each([
  ['LAHS•••', { lip: true, lipComplete: true, palate: true, isTwoSided: false, gumSides: ['R'], notchedSides: [] }],
  ['[•••SHal]', { lip: true, lipComplete: false, palate: true, isTwoSided: false, gumSides: ['L'], notchedSides: [] }],
  ['l*HSH*L', { lip: true, lipComplete: true, palate: true, isTwoSided: true, gumSides: [], notchedSides: ['R', 'L'] }],
  ['..HSH..', { lip: false, lipComplete: false, palate: true, isTwoSided: false, gumSides: [], notchedSides: [] }],
  ['   SHAL', { lip: true, lipComplete: true, palate: true, isTwoSided: false, gumSides: ['L'], notchedSides: [] }],
  [
    ' LAHSHAL ',
    { lip: true, lipComplete: true, palate: true, isTwoSided: true, gumSides: ['R', 'L'], notchedSides: [] },
  ],
  ['', { lip: false, lipComplete: false, palate: false, isTwoSided: false, gumSides: [], notchedSides: [] }],
])('%s', (code, anatomy) => {
  expect(cleftAnatomy(code)).toEqual(anatomy);
});

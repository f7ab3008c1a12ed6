/**
 * Geometry of the drawing, 400 wide: the lip from the front above, gum and palate as they are seen through the open
 * mouth below. The child's right is on the left, as in the code. Each opening grows with its severity.
 */
import type { Severity } from '@weftway/pathway/cleft-code';

export interface PlaceShape {
  /** Ground of the part; what is pressed. */
  readonly tissue: string;
  /** The opening, '' when whole. */
  readonly opening: (severity: Severity) => string;
  /** Where its word stands and which end of the word that is. */
  readonly label: { readonly x: number; readonly y: number; readonly anchor: 'start' | 'middle' | 'end' };
}

const middle = 200;
/** A point of the right half, carried over to the left half of the child when `isLeft`. */
const across =
  (isLeft: boolean) =>
  (x: number, y: number): string =>
    `${String(isLeft ? 2 * middle - x : x)} ${String(y)}`;

const reach: Readonly<Record<Severity, number>> = { none: 0, microform: 0.22, incomplete: 0.58, complete: 1 };

const lip = (isLeft: boolean): PlaceShape => {
  const at = across(isLeft);
  return {
    tissue: `M${at(200, 92)} C${at(186, 96)} ${at(176, 96)} ${at(168, 94)} C${at(146, 104)} ${at(122, 128)} ${at(104, 156)} C${at(132, 146)} ${at(158, 146)} ${at(178, 140)} Q${at(190, 136)} ${at(200, 144)} Z`,
    opening: (severity) => {
      const top = 142 - 50 * reach[severity];
      const half = severity === 'complete' ? 6 : 1;
      return severity === 'none'
        ? ''
        : `M${at(160, 146)} L${at(170 - half, top)} L${at(170 + half, top)} L${at(184, 139)} Q${at(172, 146)} ${at(160, 146)} Z`;
    },
    label: { x: isLeft ? 312 : 88, y: 118, anchor: isLeft ? 'start' : 'end' },
  };
};

const gum = (isLeft: boolean): PlaceShape => {
  const at = across(isLeft);
  return {
    tissue: `M${at(200, 186)} C${at(150, 186)} ${at(112, 232)} ${at(104, 330)} L${at(130, 330)} C${at(134, 262)} ${at(162, 214)} ${at(200, 214)} Z`,
    opening: (severity) => {
      const depth = reach[severity];
      // From the outer edge of the arch inwards, at the place of the side tooth.
      const [outerX, outerY, innerX, innerY] = [154, 198, 168, 224];
      const x = outerX + (innerX - outerX) * depth;
      const y = outerY + (innerY - outerY) * depth;
      const wide = severity === 'complete' ? 6 : 2;
      return severity === 'none'
        ? ''
        : `M${at(outerX - 8, outerY + 5)} L${at(x - wide, y + wide / 2)} L${at(x + wide, y - wide / 2)} L${at(outerX + 9, outerY - 6)} Z`;
    },
    label: { x: isLeft ? 302 : 98, y: 226, anchor: isLeft ? 'start' : 'end' },
  };
};

const hardPalate = (isLeft: boolean): PlaceShape => {
  const at = across(isLeft);
  return {
    tissue: `M${at(198, 218)} C${at(166, 220)} ${at(140, 262)} ${at(134, 306)} L${at(198, 306)} Z`,
    opening: (severity) => {
      const top = 306 - 86 * reach[severity];
      return severity === 'none'
        ? ''
        : `M${at(194, 306)} L${at(194, top)} L${at(190, top)} C${at(184, (top + 306) / 2)} ${at(180, 296)} ${at(176, 306)} Z`;
    },
    label: { x: isLeft ? 302 : 98, y: 280, anchor: isLeft ? 'start' : 'end' },
  };
};

const softPalate: PlaceShape = {
  tissue: 'M134 310 L266 310 C266 340 246 356 214 360 Q212 384 200 384 Q188 384 186 360 C154 356 134 340 134 310 Z',
  opening: (severity) => {
    const top = 384 - 74 * reach[severity];
    const half = 4 + 6 * reach[severity];
    return severity === 'none'
      ? ''
      : `M${String(middle - half)} 386 L${String(middle - half / 2)} ${String(top)} L${String(middle + half / 2)} ${String(top)} L${String(middle + half)} 386 Z`;
  },
  label: { x: 272, y: 352, anchor: 'start' },
};

/** In the order of the code. */
export const placeShapes: readonly PlaceShape[] = [
  lip(false),
  gum(false),
  hardPalate(false),
  softPalate,
  hardPalate(true),
  gum(true),
  lip(true),
];

/** Lines that only help to see where one is: nose above the lip. */
export const noseLines = [
  'M176 20 C172 50 156 62 160 76 C163 88 180 86 190 82 Q200 90 210 82 C220 86 237 88 240 76 C244 62 228 50 224 20',
  'M170 78 Q178 70 188 79',
  'M230 78 Q222 70 212 79',
] as const;

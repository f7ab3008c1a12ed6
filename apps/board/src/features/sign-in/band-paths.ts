/** The woven band of the sign-in page: eleven wefts through a warp, laid out on the age ruler. */
import { positionOfAge } from '../../ruler/scale.ts';

export const bandBox = { width: 1440, height: 330 } as const;
const cloth = { left: 152, right: 1288, top: 34, bottom: 266 } as const;
const wefts = 11;
const warps = 86;
const own = 5;

const weftY = (index: number): number => cloth.top + 16 + index * 20;
const warpX = (index: number): number => cloth.left + 10 + (index * (cloth.right - cloth.left - 10)) / (warps - 1);
export const ageX = (age: number): number => cloth.left + positionOfAge(age) * (cloth.right - cloth.left);

/** How far each free end has drifted from its place in the cloth, left and right. */
const drift: readonly (readonly [number, number])[] = [
  [-44, -24],
  [-30, -17],
  [-24, -14],
  [-27, -10],
  [-4, -7],
  [-2, 8],
  [4, 9],
  [26, 12],
  [7, 14],
  [29, 15],
  [50, 16],
];

export interface Weft {
  readonly path: string;
  readonly look: 'own' | 'strong' | 'faint';
}

const weftOf = ([left, right]: readonly [number, number], index: number): Weft => {
  const y = weftY(index);
  const start = `M-1200 ${y + left}H-6C70 ${y + left} 90 ${y} ${cloth.left} ${y}`;
  const end = `H${cloth.right}C1350 ${y} 1370 ${y + right} 1446 ${y + right}H2640`;
  return { path: start + end, look: index === own ? 'own' : index % 2 === 0 ? 'strong' : 'faint' };
};

export const weftPaths: readonly Weft[] = drift.map(weftOf);

const warpXs = Array.from({ length: warps }, (_, index) => warpX(index));

export const warpPath = warpXs.map((x) => `M${x.toFixed(1)} ${cloth.top}V${cloth.bottom}`).join('');

/** Every second crossing, where the warp lies over the weft. */
export const overPath = warpXs
  .flatMap((x, warp) => Array.from({ length: wefts }, (_, weft) => ({ x, warp, weft })))
  .filter(({ warp, weft }) => (warp + weft) % 2 === 0)
  .map(({ x, weft }) => `M${x.toFixed(1)} ${weftY(weft) - 5}v10`)
  .join('');

export interface Knot {
  readonly x: number;
  readonly y: number;
  readonly kind: 'signed' | 'open' | 'ahead';
}

const knot = (kind: Knot['kind'], weft: number, age: number): Knot => ({ kind, x: ageX(age), y: weftY(weft) });

/** One child of eight years: what was tied, what is open, what lies ahead. */
export const knots: readonly Knot[] = [
  ...(
    [
      [0, 0.5],
      [1, 0.7],
      [3, 1.1],
      [10, 0.6],
      [9, 2.2],
      [5, 4.5],
      [2, 4.7],
      [8, 5.3],
      [5, 10.5],
      [2, 11],
      [4, 21],
      [3, 38],
      [7, 39],
      [9, 54],
      [3, 62],
      [4, 64],
      [10, 66],
      [6, 73],
    ] as const
  ).map(([weft, age]) => knot('signed', weft, age)),
  ...(
    [
      [5, 99],
      [6, 100],
    ] as const
  ).map(([weft, age]) => knot('open', weft, age)),
  ...(
    [
      [9, 118],
      [10, 118],
      [4, 120],
      [6, 148],
      [4, 170],
      [5, 190],
      [2, 197],
      [7, 198],
      [9, 205],
    ] as const
  ).map(([weft, age]) => knot('ahead', weft, age)),
];

export const bandFoot = cloth.bottom;

export interface BandView {
  readonly left: number;
  readonly width: number;
  /** Screen pixels to one unit of the drawing. */
  readonly scale: number;
}

const phoneBelow = 640;

/** Width of the text under the band, and the least room beside it. */
const textWidth = 1136;
const gutter = 24;

/** What of the band is seen: the cloth begins where the text begins; the rest runs off the screen, never squeezed. */
export const bandView = (screen: number): BandView => {
  const scale = screen < phoneBelow ? 200 / bandBox.height : 1;
  const beside = Math.max(gutter, (screen - textWidth) / 2);
  return { left: cloth.left - beside / scale, width: screen / scale, scale };
};

const labelHalf = 36;

/** A label that would be cut is left out whole. */
export const fitsInView = ({ left, width, scale }: BandView, x: number): boolean =>
  x - labelHalf / scale >= left && x + labelHalf / scale <= left + width;

/** What follows from a cleft code: which structures are open on which side, the type, the Veau class and a short label. */
import { severitiesOf } from './cleft-code.ts';
import type { CleftCode, Severity } from './cleft-code.ts';
import type { Side } from './pathway-facts.ts';

export const cleftTypes = ['NONE', 'CL', 'CLA', 'CA', 'CP', 'UCLP', 'BCLP'] as const;
/** `CA`: gum alone. */
export type CleftType = (typeof cleftTypes)[number];

export type VeauClass = 'I' | 'II' | 'III' | 'IV';

export interface BySide {
  readonly R: Severity;
  readonly L: Severity;
}

export interface CleftFacts {
  readonly lip: BySide;
  readonly gum: BySide;
  readonly hard: BySide;
  readonly soft: Severity;
  readonly hasLip: boolean;
  /** A gum that is notched only (`*`) counts here; the graft lane asks for `graftSides`. */
  readonly hasGum: boolean;
  readonly hasPalate: boolean;
  /** Sides with a gum marked `A` or `a`, right before left. */
  readonly graftSides: readonly Side[];
  /** Complete on one side at least. */
  readonly isLipComplete: boolean;
  /** Side of the lip; of the gum where the lip is whole; null when neither is cleft. */
  readonly side: 'right' | 'left' | 'both' | null;
  readonly type: CleftType;
  /** Lip and palate joined through the gum on each cleft side of the lip; null unless both are cleft. */
  readonly isContiguous: boolean | null;
  /** Too coarse for rules: for display only. Null without a cleft palate. */
  readonly veau: VeauClass | null;
}

/** Everything that a code says. */
export function cleftFacts(code: CleftCode): CleftFacts {
  const [lipR = 'none', gumR = 'none', hardR = 'none', soft = 'none', hardL = 'none', gumL = 'none', lipL = 'none'] =
    severitiesOf(code);
  const lip = { R: lipR, L: lipL };
  const gum = { R: gumR, L: gumL };
  const hard = { R: hardR, L: hardL };
  const hasLip = isCleft(lip.R) || isCleft(lip.L);
  const hasGum = isCleft(gum.R) || isCleft(gum.L);
  const hasPalate = isCleft(hard.R) || isCleft(hard.L) || isCleft(soft);
  const parts = { lip, gum, hard, soft, hasLip, hasGum, hasPalate };
  return {
    ...parts,
    graftSides: sides.filter((side) => isOpenGum(gum[side])),
    isLipComplete: lip.R === 'complete' || lip.L === 'complete',
    side: sideOf(hasLip ? lip : gum),
    type: typeOf(parts),
    isContiguous: hasLip && hasPalate ? sides.every((side) => !isCleft(lip[side]) || isOpenGum(gum[side])) : null,
    veau: veauOf(parts),
  };
}

type Parts = Pick<CleftFacts, 'lip' | 'gum' | 'hard' | 'soft' | 'hasLip' | 'hasGum' | 'hasPalate'>;

const sides: readonly Side[] = ['R', 'L'];
const isCleft = (severity: Severity): boolean => severity !== 'none';
const isOpenGum = (severity: Severity): boolean => severity === 'complete' || severity === 'incomplete';

function sideOf(structure: BySide): CleftFacts['side'] {
  if (isCleft(structure.R)) return isCleft(structure.L) ? 'both' : 'right';
  return isCleft(structure.L) ? 'left' : null;
}

function typeOf({ lip, hasLip, hasGum, hasPalate }: Parts): CleftType {
  if (hasLip && hasPalate) return sideOf(lip) === 'both' ? 'BCLP' : 'UCLP';
  if (hasLip) return hasGum ? 'CLA' : 'CL';
  if (hasPalate) return 'CP';
  return hasGum ? 'CA' : 'NONE';
}

function veauOf({ gum, hard, hasPalate }: Parts): VeauClass | null {
  if (!hasPalate) return null;
  const through = sides.filter((side) => gum[side] === 'complete').length;
  if (through === 2) return 'IV';
  if (through === 1) return 'III';
  return isCleft(hard.R) || isCleft(hard.L) ? 'II' : 'I';
}

/** The short label of the trade: `UCLP left, complete`, `CP soft`, `CL+A right`. */
export function cleftLabel(code: CleftCode): string {
  const facts = cleftFacts(code);
  switch (facts.type) {
    case 'NONE':
      return 'No cleft';
    case 'CA':
      return `CA ${String(facts.side)}`;
    case 'CL':
    case 'CLA':
      return isMicroformOnly(facts) ? 'CL microform' : `${facts.type === 'CL' ? 'CL' : 'CL+A'} ${String(facts.side)}`;
    case 'CP':
      return palateLabel(facts);
    case 'UCLP':
      return facts.isContiguous ? `UCLP ${String(facts.side)}, ${extentOf(facts)}` : 'CL + CP (not joined)';
    case 'BCLP':
      return bilateralLabel(facts);
  }
}

const isMicroformOnly = (facts: CleftFacts): boolean =>
  !facts.hasGum && sides.every((side) => facts.lip[side] === 'none' || facts.lip[side] === 'microform');

function palateLabel({ hard, soft }: CleftFacts): string {
  const parts = [hard.R, hard.L].filter(isCleft);
  if (parts.length === 0) return soft === 'complete' ? 'CP soft' : 'CP soft, incomplete';
  if (!isCleft(soft)) return 'CP hard';
  return parts.some((severity) => severity !== 'complete') ? 'CP (isolated), partial hard' : 'CP (isolated)';
}

function extentOf(facts: CleftFacts): string {
  const worst = (structure: BySide): Severity | undefined =>
    [structure.R, structure.L].filter(isCleft).toSorted(byExtent)[0];
  if (worst(facts.lip) !== 'complete') return 'incomplete lip';
  if (worst(facts.gum) !== 'complete') return 'incomplete gum';
  return facts.soft === 'complete' && worst(facts.hard) === 'complete' ? 'complete' : 'incomplete palate';
}

const extents: readonly Severity[] = ['complete', 'incomplete', 'microform', 'none'];
const byExtent = (left: Severity, right: Severity): number => extents.indexOf(left) - extents.indexOf(right);

function bilateralLabel({ lip, gum, hard, soft }: CleftFacts): string {
  const isEven = [lip, gum, hard].every((structure) => structure.R === structure.L);
  if (!isEven) return 'BCLP, asymmetric';
  return [lip.R, gum.R, hard.R, soft].every((severity) => severity === 'complete')
    ? 'BCLP complete'
    : 'BCLP, incomplete';
}

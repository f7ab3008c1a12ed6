/**
 * Which parts are cleft, read from a LAHSHAL code for the planner's conditions.
 * Places 1 and 7 lip, 2 and 6 gum, 3 to 5 palate; the patient's right stands on the left of the code (Kriens 1989).
 * A gum marked `*` is notched only: its lane stays off until the orthodontist has answered.
 */
import type { Side } from './pathway-facts.ts';

export interface CleftAnatomy {
  readonly lip: boolean;
  readonly lipComplete: boolean;
  readonly palate: boolean;
  /** The lip is cleft on both sides. */
  readonly isTwoSided: boolean;
  /** Sides with a cleft gum, right before left. */
  readonly gumSides: readonly Side[];
  /** Sides with a gum marked `*`. */
  readonly notchedSides: readonly Side[];
}

/** Reads seven places; brackets and blanks around them and other signs for "none" are accepted. Unread codes: no cleft. */
export function cleftAnatomy(code: string): CleftAnatomy {
  const bare = code.replace(/[[\]]/g, '');
  const places = bare.length === 7 ? bare : bare.replace(/\s/g, '');
  const at = (index: number, letters: string): boolean => letters.includes(places.charAt(index) || '?');
  const sides = (letters: string): Side[] => {
    const found: Side[] = [];
    if (at(1, letters)) found.push('R');
    if (at(5, letters)) found.push('L');
    return found;
  };
  return {
    lip: at(0, 'Ll*') || at(6, 'Ll*'),
    lipComplete: at(0, 'L') || at(6, 'L'),
    isTwoSided: at(0, 'Ll*') && at(6, 'Ll*'),
    palate: at(2, 'Hh*') || at(3, 'Ss*') || at(4, 'Hh*'),
    gumSides: sides('Aa'),
    notchedSides: sides('*'),
  };
}

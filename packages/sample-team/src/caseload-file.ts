/**
 * A caseload as a file for the import: invented children of every age and type of cleft, the same on every machine.
 * The mix of types follows the published case mix (palate alone 45 %, lip 23 %, one side 22 %, both sides 10 %); the
 * dates of operations are those at which such operations are commonly done, spread a little.
 */
import { addDays, plainDate, type PlainDate } from '@weftway/calendar/plain-date';
import { importColumns, type ImportColumn } from '@weftway/contract/caseload-import';
import { tongues } from './caseload-file-names.ts';
import { chanceFrom } from './chance.ts';

type Column = Exclude<ImportColumn, 'due_date' | 'contact_email'>;

/** The columns of the import that the made-up file fills, in their order. */
export const caseloadHeader: readonly Column[] = importColumns.filter(
  (column): column is Column => column !== 'due_date' && column !== 'contact_email',
);

export interface CaseloadAsk {
  readonly children: number;
  readonly today: PlainDate;
  readonly sites: readonly string[];
  /** First number behind `TE-`. */
  readonly firstNumber: number;
}

interface Draw {
  readonly upTo: (most: number) => number;
  readonly one: <T>(list: readonly T[]) => T;
  /** True in `share` of 100 draws. */
  readonly is: (share: number) => boolean;
}

const drawFrom = (chance: () => number): Draw => {
  const upTo = (most: number): number => Math.floor(chance() * (most + 1));
  return {
    upTo,
    one: (list) => {
      const chosen = list[Math.floor(chance() * list.length)];
      if (chosen === undefined) throw new RangeError('Nothing to choose from');
      return chosen;
    },
    is: (share) => chance() * 100 < share,
  };
};

const mix = [
  { share: 45, codes: ['••HSH••', '••hSh••', '•••S•••', '•••s•••'] },
  { share: 23, codes: ['L••••••', '••••••L', 'la•••••', '•••••al', 'l••••••', '*••••••', 'LA•••••'] },
  { share: 22, codes: ['LAHS•••', '•••SHAL', 'laHS•••', '•••SHal'] },
  { share: 10, codes: ['LAHSHAL', 'lAHSHAL', 'LahSHAL'] },
] as const;

const codeFrom = (draw: Draw): string => {
  let rest = draw.upTo(99);
  for (const { share, codes } of mix) {
    if (rest < share) return draw.one<string>(codes);
    rest -= share;
  }
  return '••HSH••';
};

/** A day about `days` after birth, or '' when that is not past. */
const dayAfter = (draw: Draw, birth: PlainDate, days: number, spread: number, today: PlainDate): string => {
  const day = addDays(birth, days + draw.upTo(spread));
  return day < today ? day : '';
};

const operationsOf = (draw: Draw, code: string, birth: PlainDate, today: PlainDate) => ({
  lip_repair: /[Ll*]/.test(`${code.charAt(0)}${code.charAt(6)}`) ? dayAfter(draw, birth, 95, 60, today) : '',
  palate_repair: /[Hh]|S/.test(code) ? dayAfter(draw, birth, 290, 120, today) : '',
  bone_graft: /[Aa]/.test(code) ? dayAfter(draw, birth, 3200, 500, today) : '',
});

const latest = (draw: Draw, birth: PlainDate, from: number, today: PlainDate): string => {
  const day = addDays(today, -20 - draw.upTo(500));
  return day > addDays(birth, from) ? day : '';
};

const childRow = (draw: Draw, number: number, ask: CaseloadAsk): Record<Column, string> => {
  const birth = addDays(ask.today, -3 - draw.upTo(21 * 365));
  const tongue = draw.one(tongues);
  const isGirl = draw.is(46);
  const code = codeFrom(draw);
  const hasPalate = /[HhSs]/.test(code);
  const family = draw.one(tongue.families);
  const start = addDays(birth, draw.is(6) ? draw.upTo(700) : draw.upTo(12));
  const parent = draw.is(80) ? 'mother' : 'father';
  return {
    record_number: `TE-${number}`,
    first_name: draw.one(isGirl ? tongue.girls : tongue.boys),
    family_name: family,
    birth_date: birth,
    sex: isGirl ? 'female' : 'male',
    gestation: draw.is(9) ? `${30 + draw.upTo(6)}+${draw.upTo(6)}` : `${37 + draw.upTo(4)}+${draw.upTo(6)}`,
    cleft: code,
    flags: hasPalate && !code.includes('L') && draw.is(14) ? 'robin' : '',
    syndromes: hasPalate && draw.is(6) ? draw.one(['22q11.2 deletion', 'Stickler', 'Van der Woude']) : '',
    site: draw.one(ask.sites),
    referral_date: start < ask.today ? start : '',
    team_start: start < ask.today ? start : '',
    contact_name: `${draw.one(parent === 'mother' ? tongue.girls : tongue.boys)} ${family}`,
    contact_relation: parent,
    contact_phone: `+44 1632 96${String(1000 + draw.upTo(8999))}`,
    language: tongue.language,
    interpreter: tongue.language !== 'English' && draw.is(30) ? 'yes' : 'no',
    alerts: draw.is(3) ? draw.one(['latex', 'allergy: penicillin']) : '',
    ...operationsOf(draw, code, birth, ask.today),
    last_team_review: latest(draw, birth, 400, ask.today),
    last_hearing_test: hasPalate ? latest(draw, birth, 300, ask.today) : '',
    last_dental_visit: latest(draw, birth, 500, ask.today),
    notes: draw.is(4) ? 'Prefers mornings, comes by ferry' : '',
  };
};

/** RFC 4180 quoting. */
const cellText = (text: string): string => (/[",\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text);

export const csvText = (rows: readonly (readonly string[])[]): string =>
  `${rows.map((cells) => cells.map(cellText).join(',')).join('\n')}\n`;

/** The whole file as text: a header and one row a child. */
export const caseloadFile = (ask: CaseloadAsk): string => {
  const draw = drawFrom(chanceFrom(20_261_201));
  const seen = new Set<string>();
  const rows: string[][] = [[...caseloadHeader]];
  while (rows.length <= ask.children) {
    const row = childRow(draw, ask.firstNumber + rows.length - 1, ask);
    const who = `${row.first_name} ${row.family_name} ${row.birth_date}`;
    // Two children of one name and birth date would each be a warning.
    if (seen.has(who)) continue;
    seen.add(who);
    rows.push(caseloadHeader.map((column) => row[column]));
  }
  return csvText(rows);
};

export const caseloadDay = plainDate('2026-12-01');

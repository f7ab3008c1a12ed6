import { addSpan, span } from '@weftway/calendar/span';
import { fromEpochDay } from '@weftway/calendar/plain-date';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import { readProtocol } from './protocol-faults.ts';
import type { MilestoneRule } from './protocol.ts';

/** The default protocol with some milestones changed. */
const changed = (changes: Record<string, (rule: MilestoneRule) => unknown>): unknown => ({
  ...defaultProtocol,
  milestones: defaultProtocol.milestones.map((rule) => changes[rule.id]?.(rule) ?? rule),
});

const faultsOf = (input: unknown) => {
  const reading = readProtocol(input);
  return reading.ok ? [] : reading.faults;
};
const place = (id: string) => `/milestones/${String(defaultProtocol.milestones.findIndex((rule) => rule.id === id))}`;

describe('reading a protocol', () => {
  it('finds no fault in the default protocol, also after a trip through JSON', () => {
    expect(readProtocol(defaultProtocol)).toEqual({ ok: true, protocol: defaultProtocol });
    expect(faultsOf(JSON.parse(JSON.stringify(defaultProtocol)))).toEqual([]);
  });

  it('never throws, whatever it is given', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => readProtocol(value).ok === false),
      { numRuns: 300 },
    );
  });

  it('says what is missing and where', () => {
    expect(faultsOf({ ...defaultProtocol, name: undefined })).toEqual([
      { pointer: '/name', message: 'This is missing.' },
    ]);
  });

  it('names the milestone whose shape is wrong', () => {
    const input = changed({ 'SURG-03': (rule) => ({ ...rule, mayClaim: ['surgon'], closingDays: -1, extra: 1 }) });
    const faults = faultsOf(input);
    expect(faults.map((fault) => fault.pointer)).toEqual([
      `${place('SURG-03')}/closingDays`,
      `${place('SURG-03')}/mayClaim/0`,
      place('SURG-03'),
    ]);
    expect(faults.every((fault) => fault.milestone === 'SURG-03')).toBe(true);
    expect(faults[1]?.message).toMatch(/^“surgon” is not one of: coordinator, surgeon/);
    expect(faults[2]?.message).toBe('A protocol has no field “extra” here.');
  });

  it.each([
    [{ closingDays: 1.5 }, 'This must be a whole number.'],
    [{ closingDays: 'soon' }, 'This must be a number.'],
    [{ title: '' }, 'This must not be empty.'],
    [{ shortTitle: 'x'.repeat(29) }, 'This is too long or too large; the most is 28.'],
    [{ applies: 7 }, 'This has none of the forms that are known here.'],
    [{ mayClaim: [null] }, expect.stringMatching(/^“null” is not one of: coordinator/)],
    [{ evidence: {} }, 'This must be a list.'],
  ])('says in plain words what is wrong with %o', (change, message) => {
    expect(faultsOf(changed({ 'EAR-01': (rule) => ({ ...rule, ...change }) }))[0]?.message).toEqual(message);
  });

  it('points past names with slashes', () => {
    const input = { ...defaultProtocol, sources: { 'a/b~c': 1 } };
    expect(faultsOf(input)[0]).toEqual({ pointer: '/sources/a~1b~0c', message: 'This must be a text.' });
  });

  it('says how a span is written', () => {
    const input = changed({ 'EAR-01': (rule) => ({ ...rule, window: { ...rule.window, target: 'a week' } }) });
    expect(faultsOf(input)[0]?.message).toBe('“a week” cannot be read. Write a span such as 10w, 3m, 2y6m or -30d.');
  });
});

describe('links between milestones', () => {
  it('names the whole circle', () => {
    const input = changed({
      'SURG-01': (rule) => ({
        ...rule,
        prerequisites: [...rule.prerequisites, { milestone: 'SURG-04', type: 'gate' }],
      }),
    });
    expect(faultsOf(input)).toContainEqual({
      pointer: expect.stringMatching(/prerequisites$/),
      milestone: 'SURG-01',
      message: 'These wait for each other and could never open: SURG-01 → SURG-04 → SURG-03 → SURG-01.',
    });
  });

  it('does not take a booked date or a soft prerequisite for a circle', () => {
    const input = changed({
      'SURG-01': (rule) => ({
        ...rule,
        prerequisites: [...rule.prerequisites, { milestone: 'SURG-04', type: 'soft' }],
      }),
    });
    expect(faultsOf(input)).toEqual([]);
  });

  it('refuses a milestone twice', () => {
    const input = { ...defaultProtocol, milestones: [...defaultProtocol.milestones, defaultProtocol.milestones[0]] };
    expect(faultsOf(input)).toEqual([
      { pointer: '/milestones/66/id', milestone: 'TEAM-01', message: 'TEAM-01 stands in the protocol twice.' },
    ]);
  });

  it.each([
    ['clock/milestone', (rule: MilestoneRule) => ({ ...rule, clock: { from: 'event', milestone: 'SURG-99' } })],
    [
      'prerequisites/0/milestone',
      (rule: MilestoneRule) => ({ ...rule, prerequisites: [{ milestone: 'SURG-99', type: 'gate' }] }),
    ],
    ['moves/0', (rule: MilestoneRule) => ({ ...rule, moves: ['SURG-99'] })],
  ])('refuses an unknown milestone in %s', (path, change) => {
    expect(faultsOf(changed({ 'SURG-02': change }))).toContainEqual({
      pointer: `${place('SURG-02')}/${path}`,
      milestone: 'SURG-02',
      message: 'There is no milestone SURG-99.',
    });
  });

  it('refuses a fact that nobody records, because it would silently count as false', () => {
    const input = changed({ 'SURG-05': (rule) => ({ ...rule, applies: { all: ['lipp', { not: 'gum' }] } }) });
    expect(faultsOf(input).map((fault) => fault.message)).toEqual(['Nobody records a fact called “lipp”.']);
  });

  it('refuses a source that is not listed', () => {
    const input = changed({ 'SURG-03': (rule) => ({ ...rule, sources: ['500'] }) });
    expect(faultsOf(input)[0]?.message).toBe('Source 500 is not in the list of sources.');
  });
});

describe('windows', () => {
  const withWindow = (earliest: string, target: string, latest: string, closingDays = 0) =>
    faultsOf(changed({ 'EAR-01': (rule) => ({ ...rule, window: { earliest, target, latest }, closingDays }) })).map(
      (fault) => fault.message,
    );

  it('refuses a target before the earliest day and a latest day before the target', () => {
    expect(withWindow('2m', '1m', '3m')).toEqual(['The target 1m comes before the earliest day 2m.']);
    expect(withWindow('1m', '3m', '2m')).toEqual(['The latest day 2m comes before the target 3m.']);
  });

  it('refuses what is out of order in a short month only', () => {
    expect(withWindow('0d', '30d', '1m')).toEqual(['The latest day 1m comes before the target 30d.']);
    expect(withWindow('0d', '28d', '1m')).toEqual([]);
  });

  it('refuses a closing part that is longer than the window', () => {
    expect(withWindow('1w', '2w', '3w', 15)).toEqual([
      'Closing takes 15 days, but the window can be as short as 14 days.',
    ]);
    expect(withWindow('0d', '7d', '1m', 28)).toEqual([]);
  });

  it('looks at variants and repeats too', () => {
    const input = changed({
      'CARE-03': (rule) => ({
        ...rule,
        variants: [{ when: 'robin', window: { earliest: '5d', target: '2d', latest: '7d' }, note: 'x' }],
        repeats: [{ window: { earliest: '5m', target: '6m', latest: '5m' }, until: ['ADLT-03'] }],
      }),
    });
    expect(faultsOf(input).map((fault) => fault.pointer)).toEqual([
      `${place('CARE-03')}/variants/0/window`,
      `${place('CARE-03')}/repeats/0/window`,
    ]);
  });

  it('refuses catch-up days that fall', () => {
    expect(faultsOf(changed({ 'SURG-03': (rule) => ({ ...rule, catchUp: [90, 42] }) }))[0]?.pointer).toBe(
      `${place('SURG-03')}/catchUp`,
    );
  });

  it('are in order for every child, whenever it was born', () => {
    const windows = defaultProtocol.milestones.flatMap((rule) => [
      rule.window,
      ...rule.variants.map((variant) => variant.window),
      ...rule.repeats.map((repeat) => repeat.window),
    ]);
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 25000 }), (day) => {
        const birth = fromEpochDay(day);
        return windows.every((window) => {
          const [earliest, target, latest] = [window.earliest, window.target, window.latest].map((text) =>
            addSpan(birth, span(text)),
          );
          return (
            earliest !== undefined &&
            target !== undefined &&
            latest !== undefined &&
            earliest <= target &&
            target <= latest
          );
        });
      }),
      { numRuns: 1000 },
    );
  });
});

describe('rhythms', () => {
  const withRepeat = (id: string, repeat: object) =>
    faultsOf(
      changed({
        [id]: (rule) => ({ ...rule, repeats: [{ window: { earliest: '5m', target: '6m', latest: '8m' }, ...repeat }] }),
      }),
    ).map((fault) => fault.message);

  it('refuses one that never ends', () => {
    expect(withRepeat('EAR-01', {})).toEqual([expect.stringMatching(/^It would go on for ever/)]);
  });

  it('refuses an end that only some of the children reach', () => {
    expect(withRepeat('EAR-01', { until: ['SURG-03'] })).toEqual([expect.stringMatching(/^It would go on for ever/)]);
    expect(withRepeat('EAR-01', { until: ['SURG-03'], when: 'palate' })).toEqual([]);
  });

  it('accepts an age, an occasion at one age, or a finding that somebody raises', () => {
    expect(withRepeat('EAR-01', { ageTo: '5y' })).toEqual([]);
    expect(withRepeat('EAR-01', { byAge: true })).toEqual([]);
    expect(withRepeat('EAR-01', { until: ['canine_in_arch'] })).toEqual([]);
  });

  it('refuses an unknown end and ages the wrong way round', () => {
    expect(withRepeat('EAR-01', { until: ['ADLT-03', 'nirvana'] })).toEqual([
      'It runs until “nirvana”, which is neither a milestone nor a fact that somebody records.',
    ]);
    expect(withRepeat('EAR-01', { ageFrom: '5y', ageTo: '5y' })).toEqual([
      'The rhythm ends at 5y, not after it begins at 5y.',
    ]);
  });
});

describe('records and signatures', () => {
  const field = { name: 'fit', label: 'Fit', kind: 'choice', choices: ['yes', 'no'] };
  const withRule = (change: object, id = 'PSY-01') =>
    faultsOf(changed({ [id]: (rule) => ({ ...rule, raises: [], ...change }) })).map((fault) => fault.message);

  it('refuses a field twice and a signature twice', () => {
    expect(withRule({ evidence: [field, field] })).toContain('The field “fit” stands there twice.');
    const signature = defaultProtocol.milestones[0]?.signatures[0];
    expect(withRule({ signatures: [signature, signature] })).toContain('The signature “milestone” stands there twice.');
  });

  it('refuses a field of a part that nobody signs', () => {
    expect(withRule({ evidence: [{ ...field, part: 'readiness' }] })).toEqual([
      '“fit” belongs to “readiness”, but no signature has that name.',
    ]);
  });

  it('refuses a finding from a field or a value that is not there', () => {
    expect(withRule({ evidence: [field], raises: [{ field: 'fitt', oneOf: ['no'], finding: 'raised' }] })).toEqual([
      'The finding “raised” reads a field “fitt” that is not there.',
    ]);
    expect(withRule({ evidence: [field], raises: [{ field: 'fit', oneOf: ['No'], finding: 'raised' }] })).toEqual([
      '“fit” can never be “No”; it is one of: yes, no.',
    ]);
  });

  it('refuses a demanded result that the other milestone does not record', () => {
    const prerequisites = [{ milestone: 'CARE-04', type: 'check', result: { field: 'fitness', oneOf: ['yes'] } }];
    expect(withRule({ prerequisites }, 'SURG-02')).toEqual(['CARE-04 has no field “fitness” that could be asked for.']);
  });

  it('refuses ranges that cannot be met and choices without choices', () => {
    const number = { name: 'gap', label: 'Gap', kind: 'number', min: 5, max: 1 };
    expect(withRule({ evidence: [number] })).toEqual(['The least value of “gap” lies above its largest.']);
    expect(withRule({ evidence: [{ ...number, min: 0, max: 9, likely: [2, 10] }] })).toEqual([
      'The likely range of “gap” does not lie inside its possible one.',
    ]);
    expect(withRule({ evidence: [{ ...field, choices: [] }] })).toEqual([
      '“fit” is a choice without anything to choose.',
    ]);
  });

  it('refuses a reason for a waiver given twice', () => {
    expect(withRule({ waivedWhen: ['a', 'a'] })).toEqual(['The reason “a” stands there twice.']);
  });

  it('refuses second names for values that cannot occur', () => {
    expect(withRule({ evidence: [{ ...field, secondNameFor: ['never'] }] })).toEqual([
      '“fit” can never be “never”; it is one of: yes, no.',
    ]);
  });

  it('lets a demand on free text pass, because any value can occur', () => {
    const evidence = [{ name: 'note', label: 'Note', kind: 'text' }];
    expect(withRule({ evidence, raises: [{ field: 'note', oneOf: ['x'], finding: 'raised' }] })).toEqual([]);
  });
});

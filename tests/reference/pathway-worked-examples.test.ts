/** The six worked examples of the pathway reference: dates computed twice by its authors, here as facts and answers. */
import { describe, expect, it } from 'vitest';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import { answerPathCase } from '@weftway/pathway/path-answer';
import { readPathCase } from '@weftway/pathway/path-case';
import examples from './pathway/worked-examples.json' with { type: 'json' };

type Example = (typeof examples)[number];

function caseOf({ on, facts, answers }: Example): string {
  const { born, gestation, sex, cleft, flags, teamStart, findings, signed, results, halfSigned, booked, roots } = {
    flags: undefined,
    teamStart: undefined,
    findings: undefined,
    results: undefined,
    halfSigned: undefined,
    booked: undefined,
    roots: undefined,
    ...facts,
  };
  const child = {
    dob: born,
    ga: gestation,
    sex,
    code: cleft,
    flags,
    team_start: teamStart,
    trig: findings,
    done: signed,
  };
  const more = { result: results, partial: halfSigned, plan: booked, roots };
  return JSON.stringify({ as_of: on, child: { ...child, ...more }, ask: answers.map(({ milestone }) => milestone) });
}

describe.each(examples)('$source, on $on', (example) => {
  const reading = readPathCase(caseOf(example));
  if (reading.kind === 'fault') throw new Error(reading.message);
  const { got } = answerPathCase(defaultProtocol, reading.case);

  it.each(example.answers)('$milestone is $state', (answer) => {
    const window = 'window' in answer ? answer.window : [];
    expect(got[answer.milestone]).toEqual([answer.state, ...window]);
  });
});

/** The `path` command as it is run: one answer a line, faults with their line number, other lines still answered. */
import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';

const root = fileURLToPath(new URL('../..', import.meta.url));

function runPath(lines: readonly string[]) {
  const input = `${lines.join('\n')}\n`;
  const args = ['--import', 'tsx', 'packages/pathway/bin/path.ts'];
  const { status, stdout, stderr } = spawnSync(process.execPath, args, { cwd: root, input, encoding: 'utf8' });
  return { status, answers: stdout.split('\n').filter(Boolean), faults: stderr.split('\n').filter(Boolean) };
}

const child = { dob: '2026-01-15', ga: [39, 2], sex: 'F', code: '•••SHAL' };
const good = JSON.stringify({ example: 'one', as_of: '2026-04-20', child, ask: ['EAR-02'] });

describe('the path command', () => {
  it('answers every milestone of every case', () => {
    const { status, answers, faults } = runPath([good, '', good]);
    expect([status, answers.length, faults]).toEqual([0, 2, []]);
    expect(answers[0]).toBe(answers[1]);
    expect(answers[0]).toContain('"example":"one","as_of":"2026-04-20"');
    expect(answers[0]).toContain('"EAR-02":["overdue","2026-02-12","2026-03-26","2026-04-15"]');
  });

  it('reports what is wrong with a line, all of it, and answers the others', () => {
    const twoFaults = JSON.stringify({ as_of: '2026-02-30', child: { ...child, code: 'LAHS' } });
    const unknown = JSON.stringify({ as_of: '2026-04-20', child: { ...child, done: { 'SURG-99': ['2026-04-01'] } } });
    const { status, answers, faults } = runPath(['{', twoFaults, good, unknown]);
    expect([status, answers.length]).toEqual([1, 1]);
    expect(faults[0]).toMatch(/^line 1: not JSON/);
    expect(faults[1]).toMatch(
      /^line 2: as_of: 2026-02-30 is not a day of the calendar.; child.code: Write seven LAHSHAL places/,
    );
    expect(faults[2]).toBe('line 4: the protocol has no milestone SURG-99');
  });
});

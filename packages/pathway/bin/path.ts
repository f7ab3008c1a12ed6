/**
 * `npm run --silent path < cases.jsonl`: reads one case in each line and prints one answer in each line, without a
 * database or a server. A line that cannot be read is reported on the error stream with its number; the others are
 * still answered, and the exit code is then 1.
 */
import { createInterface } from 'node:readline';
import { defaultProtocol } from '../src/default-protocol.ts';
import { answerPathCase, unknownMilestones } from '../src/path-answer.ts';
import { readPathCase } from '../src/path-case.ts';

function answerLine(line: string): { readonly answer: string } | { readonly fault: string } {
  const reading = readPathCase(line);
  if (reading.kind === 'fault') return { fault: reading.message };
  const unknown = unknownMilestones(defaultProtocol, reading.case);
  if (unknown.length > 0) return { fault: `the protocol has no milestone ${unknown.join(', ')}` };
  return { answer: JSON.stringify(answerPathCase(defaultProtocol, reading.case)) };
}

let number = 0;
for await (const line of createInterface({ input: process.stdin, crlfDelay: Infinity })) {
  number += 1;
  if (line.trim() === '') continue;
  const result = answerLine(line);
  if ('answer' in result) process.stdout.write(`${result.answer}\n`);
  else {
    process.stderr.write(`line ${String(number)}: ${result.fault}\n`);
    process.exitCode = 1;
  }
}

/** Proves the audit trail of this installation. Exit 0 when it holds, 1 with the first broken line named. Writes nothing. */
import fs from 'node:fs';
import Database from 'better-sqlite3';
import { readEnv } from '../src/env.ts';
import { hashOfRead, readsAfter } from '../src/trail/access-log.ts';
import { proveChanges, proveReads } from '../src/trail/verify-chains.ts';
import type { Proof } from '../src/trail/verify-chains.ts';

const env = readEnv(process.env);
const say = (text: string): void => void process.stdout.write(`${text}\n`);

const report = (name: string, { lines, broken }: Proof): boolean => {
  say(`${name}: ${lines} lines`);
  if (broken === null) say('  the chain holds');
  else say(`  BROKEN at line ${broken.seq} (${broken.kind}): ${broken.why}`);
  return broken === null;
};

const open = (file: string): Database.Database => new Database(file, { readonly: true, fileMustExist: true });

const verify = async (): Promise<boolean> => {
  const anchors = { file: env.anchorFile };
  const changes = open(env.databaseFile);
  const changesHold = report(
    'Changes',
    await proveChanges(async (sql, bindings) => changes.prepare(sql).all(...bindings), anchors),
  );
  changes.close();
  if (!fs.existsSync(env.accessFile)) {
    // A file that an anchor knows of may not simply be gone.
    return report('Reads', await proveReads({ after: () => [], hashOf: () => null }, anchors)) && changesHold;
  }
  const reads = open(env.accessFile);
  const readsHold = report(
    'Reads',
    await proveReads(
      { after: (seq, limit) => readsAfter(reads, seq, limit), hashOf: (seq) => hashOfRead(reads, seq) },
      anchors,
    ),
  );
  reads.close();
  return changesHold && readsHold;
};

try {
  process.exitCode = (await verify()) ? 0 : 1;
} catch (error) {
  process.stderr.write(`The trail could not be read: ${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 1;
}

/** Writes a caseload file: `node --import tsx packages/sample-team/scripts/make-caseload.ts 5000`. */
import fs from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { caseloadDay, caseloadFile } from '../src/caseload-file.ts';

const children = Number(process.argv[2] ?? '5000');
if (!Number.isInteger(children) || children < 1) throw new Error('Say how many children the file holds, such as 5000.');
const folder = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../files');
fs.mkdirSync(folder, { recursive: true });
const file = path.join(folder, `caseload-${children}.csv`);
fs.writeFileSync(
  file,
  caseloadFile({ children, today: caseloadDay, sites: ['Tern Quay', 'Saltmarsh'], firstNumber: 500_001 }),
);
process.stdout.write(`${file}\n`);

/** The key file of the demo: made on the first start, readable by the owner alone. Live mode brings its own. */
import { randomBytes } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { z } from 'zod';

const keysSchema = z.object({ session: z.string().min(32) });
export type Keys = z.infer<typeof keysSchema>;

/** Reads the key file; makes it when it is missing. Throws when it is readable by others or does not hold a whole key. */
export const readKeys = (file: string): Keys => {
  if (!fs.existsSync(file)) {
    fs.mkdirSync(path.dirname(file), { recursive: true });
    fs.writeFileSync(file, JSON.stringify({ session: randomBytes(32).toString('base64url') }), { mode: 0o600 });
  }
  if ((fs.statSync(file).mode & 0o077) !== 0)
    throw new Error(`Cannot start: ${file} is readable by others; run chmod 600 on it.`);
  return keysSchema.parse(JSON.parse(fs.readFileSync(file, 'utf8')));
};

/** What the surroundings decide: where data lives, which port, which day, which mode. Read once at the start. */
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { z } from 'zod';

const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../../..');

const schema = z.object({
  WEFTWAY_DATA: z.string().default(path.join(root, '.data')),
  WEFTWAY_PORT: z.coerce.number().int().min(0).max(65535).default(4310),
  WEFTWAY_HOST: z.string().default('127.0.0.1'),
  /** Fixes the day, for tests and demonstrations. */
  WEFTWAY_TODAY: z.iso.date().optional(),
  WEFTWAY_MODE: z.enum(['demo', 'live']).default('demo'),
  WEFTWAY_ORIGIN: z.string().optional(),
  WEFTWAY_ANCHORS: z.string().optional(),
  WEFTWAY_SMTP: z.string().optional(),
  WEFTWAY_MAIL_FROM: z.string().default('Weftway <no-reply@tern-estuary.example>'),
  WEFTWAY_STATIC: z.string().default(path.join(root, 'dist/board')),
  WEFTWAY_LOG: z.enum(['silent', 'info', 'debug']).default('info'),
});

export interface Env {
  readonly dataFolder: string;
  readonly databaseFile: string;
  readonly accessFile: string;
  /** Where the heads of the audit chains are noted; best on another disk than the data. */
  readonly anchorFile: string;
  readonly keyFile: string;
  readonly port: number;
  readonly host: string;
  readonly today: string | null;
  readonly isDemo: boolean;
  /** What the browser calls us; null: whatever host it asked for on loopback. */
  readonly origin: string | null;
  /** smtp:// address; null: mail stays in the local inbox. */
  readonly smtp: string | null;
  readonly mailFrom: string;
  readonly staticFolder: string;
  readonly logLevel: 'silent' | 'info' | 'debug';
}

/** Throws with a sentence that names the variable when a value cannot be used. */
export const readEnv = (source: NodeJS.ProcessEnv): Env => {
  const read = schema.safeParse(source);
  if (!read.success) {
    throw new Error(
      `Cannot start: ${read.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`).join('; ')}`,
    );
  }
  const value = read.data;
  return {
    dataFolder: value.WEFTWAY_DATA,
    databaseFile: path.join(value.WEFTWAY_DATA, 'weftway.sqlite'),
    accessFile: path.join(value.WEFTWAY_DATA, 'access.sqlite'),
    anchorFile: value.WEFTWAY_ANCHORS ?? path.join(value.WEFTWAY_DATA, 'anchors.jsonl'),
    keyFile: path.join(value.WEFTWAY_DATA, 'keys.json'),
    port: value.WEFTWAY_PORT,
    host: value.WEFTWAY_HOST,
    today: value.WEFTWAY_TODAY ?? null,
    isDemo: value.WEFTWAY_MODE === 'demo',
    origin: value.WEFTWAY_ORIGIN ?? null,
    smtp: value.WEFTWAY_SMTP ?? null,
    mailFrom: value.WEFTWAY_MAIL_FROM,
    staticFolder: value.WEFTWAY_STATIC,
    logLevel: value.WEFTWAY_LOG,
  };
};

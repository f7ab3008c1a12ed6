import { knexConfig } from './apps/api/src/db/connection.ts';
import { readEnv } from './apps/api/src/env.ts';

export default knexConfig(readEnv(process.env).databaseFile);

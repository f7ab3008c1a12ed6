/** The server process. */
import http from 'node:http';
import { createApp } from './app.ts';
import { rollBoard } from './board/roll-board.ts';
import { openDatabase } from './db/connection.ts';
import { missingOperations } from './endpoints.ts';
import { readEnv } from './env.ts';
import { readKeys } from './keys.ts';
import { startMailSender } from './mail/send-due-mail.ts';
import { startServices } from './start-services.ts';
import { keepAnchors } from './trail/trail-anchor-keeper.ts';

const env = readEnv(process.env);
const missing = missingOperations();
if (missing.length > 0) throw new Error(`Cannot start: nobody serves ${missing.join(', ')}`);

const db = openDatabase(env.databaseFile);
const team: { zone: string } | undefined = await db('team').first('zone');
if (team === undefined)
  throw new Error('Cannot start: the database has no team yet; run npm start, which prepares it.');
const services = startServices(db, env, team.zone);
const isSecure = !env.isDemo;
const app = createApp(services, {
  sessionSecret: readKeys(env.keyFile).session,
  isSecure,
  sessionCleanupInterval: 15 * 60_000,
  limitsRate: true,
});
if (isSecure) app.set('trust proxy', 'loopback');

const rollEveryMs = 60_000;
await rollBoard(services);
const roll = setInterval(
  () =>
    void rollBoard(services).catch((error: unknown) =>
      services.log.error({ err: error }, 'the board could not be rolled'),
    ),
  rollEveryMs,
);

const mail = startMailSender(services);

const anchors = await keepAnchors(services);

const server = http.createServer(
  {
    headersTimeout: 10_000,
    requestTimeout: 30_000,
    keepAliveTimeout: 65_000,
    connectionsCheckingInterval: 5_000,
    maxHeaderSize: 16_384,
  },
  app,
);
server.listen(env.port, env.host, () => {
  const address = server.address();
  const port = typeof address === 'object' && address !== null ? address.port : env.port;
  process.stdout.write(`Weftway is ready at http://${env.host}:${port}/\n`);
});

let isStopping = false;
const stop = (): void => {
  if (isStopping) process.exit(1);
  isStopping = true;
  clearInterval(roll);
  server.closeAllConnections();
  server.close(() => {
    void mail
      .stop()
      .then(() => anchors.stop())
      .catch((error: unknown) => services.log.error({ err: error }, 'the stop was not clean'))
      .then(() => {
        services.accessLog.close();
        return db.destroy();
      })
      .then(() => process.exit(0));
  });
};
process.on('SIGTERM', stop);
process.on('SIGINT', stop);

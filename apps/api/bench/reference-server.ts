/** The plain programs to compare with: Express and prepared statements, nested objects, no sign-in, no compression. */
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import Database from 'better-sqlite3';
import express from 'express';

interface Row {
  readonly child_id: string;
}

export interface ReferenceServer {
  readonly address: string;
  readonly close: () => void;
}

export const openReferenceServer = async (databaseFile: string): Promise<ReferenceServer> => {
  const db = new Database(databaseFile, { readonly: true });
  const children = db.prepare(
    'select id, family_name, first_name, site, born_on from children where id in (select distinct child_id from board_rows where is_on_board = 1) order by family_name, first_name, id',
  );
  const boardRows = db.prepare(
    'select child_id, milestone, lane, state, is_due, squeezed_days, is_lapsed, earliest, target, latest, owners from board_rows where is_on_board = 1 order by child_id, milestone',
  );
  const child = db.prepare('select * from children where id = ?');
  const childRows = db.prepare('select * from board_rows where child_id = ? order by milestone');
  const app = express();
  app.disable('x-powered-by');
  app.set('etag', false);
  app.get('/board', (_request, response) => {
    const byChild = new Map<string, Row[]>();
    for (const row of boardRows.all() as Row[]) {
      // the columns of the statement
      const list = byChild.get(row.child_id);
      if (list === undefined) byChild.set(row.child_id, [row]);
      else list.push(row);
    }
    response.json({
      children: (children.all() as { id: string }[]).map((one) => ({ ...one, milestones: byChild.get(one.id) ?? [] })),
    }); // the columns of the statement
  });
  app.get(
    '/children/:id',
    (request, response) =>
      void response.json({ child: child.get(request.params.id), milestones: childRows.all(request.params.id) }),
  );
  const server = http.createServer(app).listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  return {
    address: `http://127.0.0.1:${String((server.address() as AddressInfo).port)}`, // listening on a port
    close: () => {
      server.closeAllConnections();
      server.close();
      db.close();
    },
  };
};

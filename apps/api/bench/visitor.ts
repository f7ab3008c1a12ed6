/** A second process that asks, so that its work is not counted as the server's. Messages in: what to ask, how often. */
import http from 'node:http';

export interface Asked {
  readonly url: string;
  readonly headers: Readonly<Record<string, string>>;
  readonly times: number;
}
export interface Told {
  readonly status: number;
  readonly bytes: number;
  readonly etag: string;
}

const agent = new http.Agent({ keepAlive: true, maxSockets: 1 });

const ask = ({ url, headers }: Asked): Promise<Told> =>
  new Promise((resolve, reject) => {
    http
      .get(url, { agent, headers }, (response) => {
        let bytes = 0;
        response.on('data', (chunk: Buffer) => (bytes += chunk.length));
        response.on('end', () =>
          resolve({ status: response.statusCode ?? 0, bytes, etag: String(response.headers['etag'] ?? '') }),
        );
      })
      .on('error', reject);
  });

process.on('message', (asked: Asked) => {
  void (async () => {
    let told: Told = { status: 0, bytes: 0, etag: '' };
    for (let count = 0; count < asked.times; count += 1) told = await ask(asked);
    process.send?.(told);
  })();
});

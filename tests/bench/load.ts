import { Agent, request } from 'node:http';

/** One request of a load, and which connection's session sends it. */
export interface LoadRequest {
  readonly method: string;
  readonly path: string;
  readonly cookie: string;
  readonly body: unknown;
}

interface LoadOrder {
  readonly port: number;
  /** One list for each reader; each reader sends the next as soon as the last is answered. */
  readonly readers: readonly (readonly LoadRequest[])[];
}

function send(agent: Agent, port: number, { method, path, cookie, body }: LoadRequest): Promise<number> {
  const payload = Buffer.from(JSON.stringify(body));
  const begun = process.hrtime.bigint();
  return new Promise((resolve, reject) => {
    const sent = request(
      { agent, port, host: '127.0.0.1', method, path, headers: { Cookie: cookie, 'Content-Type': 'application/json', 'Content-Length': payload.length } },
      (response) => {
        response.resume();
        response.on('end', () => {
          const status = response.statusCode ?? 0;
          if (status >= 300) reject(new Error(`${method} ${path} answered ${status}.`));
          else resolve(Number(process.hrtime.bigint() - begun) / 1e6);
        });
      },
    );
    sent.on('error', reject);
    sent.end(payload);
  });
}

/** Runs in a process of its own: answers with every latency in milliseconds. */
process.on('message', (order: LoadOrder) => {
  const agent = new Agent({ keepAlive: true, maxSockets: order.readers.length });
  const oneReader = async (requests: readonly LoadRequest[]): Promise<number[]> => {
    const latencies: number[] = [];
    for (const one of requests) latencies.push(await send(agent, order.port, one));
    return latencies;
  };
  Promise.all(order.readers.map(oneReader)).then(
    (latencies) => process.send?.({ latencies: latencies.flat() }),
    (error: unknown) => process.send?.({ error: String(error) }),
  );
});

import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';

export interface BucketServer {
  readonly endpoint: string;
  /** Objects by path, bucket first. */
  readonly objects: Map<string, Buffer>;
  /** Requests answered, such as `PUT /bucket/key`. */
  readonly seen: string[];
  /** Answers everything with 503 while it is on. */
  isDown: boolean;
  close(): Promise<void>;
}

const hasSignature = (req: IncomingMessage): boolean => /^AWS4-HMAC-SHA256 Credential=/.test(req.headers.authorization ?? '');

async function bodyOf(req: IncomingMessage): Promise<Buffer> {
  const pieces: Buffer[] = [];
  for await (const piece of req) pieces.push(piece as Buffer);
  return Buffer.concat(pieces);
}

function sendObject(res: ServerResponse, object: Buffer, range: string | undefined, isHead: boolean): void {
  const asked = /^bytes=(\d+)-(\d+)$/.exec(range ?? '');
  const part = asked ? object.subarray(Number(asked[1]), Number(asked[2]) + 1) : object;
  res.writeHead(asked ? 206 : 200, { 'Content-Length': part.length, ...(asked ? { 'Content-Range': `bytes ${asked[1]}-${asked[2]}/${object.length}` } : {}) });
  res.end(isHead ? undefined : part);
}

const refuse = (res: ServerResponse, status: number, code: string): void => {
  res.writeHead(status, { 'Content-Type': 'application/xml' });
  res.end(`<?xml version="1.0" encoding="UTF-8"?><Error><Code>${code}</Code><Message>${code}</Message></Error>`);
};

/** A store of objects in memory that speaks as much of the S3 protocol, path style, as keeping blobs takes. */
export async function startBucketServer(): Promise<BucketServer> {
  const objects = new Map<string, Buffer>();
  const seen: string[] = [];
  const state = { isDown: false };
  const server = createServer((req, res) => {
    void (async () => {
      const path = decodeURIComponent(new URL(req.url ?? '/', 'http://bucket').pathname);
      const body = await bodyOf(req);
      seen.push(`${req.method} ${path}`);
      if (state.isDown) return refuse(res, 503, 'ServiceUnavailable');
      if (!hasSignature(req)) return refuse(res, 403, 'AccessDenied');
      const object = objects.get(path);
      if (req.method === 'PUT') {
        objects.set(path, body);
        return void res.writeHead(200).end();
      }
      if (req.method === 'DELETE') {
        objects.delete(path);
        return void res.writeHead(204).end();
      }
      if (!object) return req.method === 'HEAD' ? void res.writeHead(404).end() : refuse(res, 404, 'NoSuchKey');
      return sendObject(res, object, req.headers.range, req.method === 'HEAD');
    })();
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo;
  return {
    endpoint: `http://127.0.0.1:${port}`,
    objects,
    seen,
    get isDown() {
      return state.isDown;
    },
    set isDown(value: boolean) {
      state.isDown = value;
    },
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}

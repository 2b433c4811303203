import type { Request, Response } from 'express';

const lookEveryMs = 700;
/** Proxies end what is silent for longer. */
const breatheEveryMs = 20_000;
/** Then the browser asks again, and its session is looked at anew. */
const longestMs = 10 * 60_000;

export const wantsEvents = (req: Request): boolean => (req.get('Accept') ?? '').includes('text/event-stream');

/** Sends what `next` tells as server-sent events until the other side goes away, `next` throws, or ten minutes have passed. */
export function sendEvents(res: Response, next: () => object | null): Promise<void> {
  res.status(200).set({ 'Content-Type': 'text/event-stream; charset=utf-8', 'Cache-Control': 'no-store', 'X-Accel-Buffering': 'no' });
  res.flushHeaders();
  return new Promise((resolve) => {
    let lastWrite = Date.now();
    const begun = lastWrite;
    const write = (text: string): void => {
      res.write(text);
      lastWrite = Date.now();
    };
    const look = (): void => {
      try {
        const event = next();
        if (event !== null) write(`data: ${JSON.stringify(event)}\n\n`);
        else if (Date.now() - lastWrite > breatheEveryMs) write(': still here\n\n');
        if (Date.now() - begun > longestMs) res.end();
      } catch {
        res.end();
      }
    };
    const timer = setInterval(look, lookEveryMs);
    timer.unref();
    res.on('close', () => {
      clearInterval(timer);
      resolve();
    });
    write('retry: 2000\n\n');
    look();
  });
}

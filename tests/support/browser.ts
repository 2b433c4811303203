import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { resolve } from 'node:path';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { createApp } from '../../server/app';
import { cast, castPassword, type CastName } from './cast';
import { ensureChromium } from './chromium';
import { startTestServer, type TestServer } from './test-server';

export interface BrowserBench {
  readonly server: TestServer;
  readonly address: string;
  readonly browser: Browser;
  close(): Promise<void>;
}

/** A fresh server with the built web app, and a browser. */
export async function startBrowserBench(): Promise<BrowserBench> {
  const server = await startTestServer({ WEB_DIR: resolve('dist') });
  const listening: Server = createServer(createApp(server.context));
  await new Promise<void>((done) => listening.listen(0, '127.0.0.1', done));
  const browser = await chromium.launch({
    executablePath: ensureChromium(),
    args: ['--no-sandbox', '--disable-gpu', '--disable-background-networking', '--disable-component-update'],
  });
  return {
    server,
    address: `http://127.0.0.1:${(listening.address() as AddressInfo).port}`,
    browser,
    close: async () => {
      await browser.close();
      listening.closeAllConnections();
      await new Promise<void>((done) => void listening.close(() => done()));
      await server.close();
    },
  };
}

export const viewports = { wide: { width: 1440, height: 900 }, phone: { width: 390, height: 844 } } as const;

interface Opened {
  readonly page: Page;
  readonly context: BrowserContext;
  /** Errors the page wrote to the console. */
  readonly complaints: string[];
}

/** A page of its own, signed in through the interface unless nobody is named. */
export async function openPage(bench: BrowserBench, name: CastName | null, viewport: keyof typeof viewports, colorScheme: 'light' | 'dark' = 'light'): Promise<Opened> {
  const context = await bench.browser.newContext({ viewport: viewports[viewport], colorScheme, hasTouch: viewport === 'phone', reducedMotion: 'reduce' });
  if (name) {
    const response = await context.request.post(`${bench.address}/api/session`, { data: { email: cast[name].email, password: castPassword } });
    if (!response.ok()) throw new Error(`${name} could not sign in: ${response.status()}.`);
  }
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error') complaints.push(message.text());
  });
  page.on('pageerror', (error) => void complaints.push(error.message));
  return { page, context, complaints };
}

import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { createApp } from './app';
import type { Config } from './config/config';
import type { Context } from './context';
import { keepSwept } from './services/sweeping';
import { startContext } from './start-context';

export interface RunningServer {
  readonly context: Context;
  readonly address: string;
  stop(): Promise<void>;
}

const listen = (app: ReturnType<typeof createApp>, { port, host }: Config): Promise<Server> =>
  new Promise((resolve, reject) => {
    const server = app.listen(port, host, (error?: Error) => (error ? reject(error) : resolve(server)));
  });

/** Opens the context, listens, works off jobs; stop() ends all of it cleanly. */
export async function startServer(config: Config, handlers: Parameters<typeof createApp>[1] = {}): Promise<RunningServer> {
  const { context, close } = startContext(config);
  const server = await listen(createApp(context, handlers), config);
  context.jobs.run();
  const stopSweeping = keepSwept(context);
  const { port } = server.address() as AddressInfo;
  return {
    context,
    address: `http://${config.host === '0.0.0.0' ? 'localhost' : config.host}:${port}`,
    stop: async () => {
      stopSweeping();
      await new Promise<void>((resolve) => {
        server.close(() => resolve());
        server.closeIdleConnections();
        // Streams of events would go on for ever.
        setTimeout(() => server.closeAllConnections(), 1000).unref();
      });
      await close();
    },
  };
}

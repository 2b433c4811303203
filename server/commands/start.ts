import { readConfig } from '../config/config';
import { startServer } from '../index';
import { buildWeb, isWebStale } from './build-web';
import { bringDemoPages, noteUnfinished, unfinishedDemo } from './demo-pages';
import { demoIsWanted, seedDemo, signInLines } from './demo';

const config = readConfig();

if (isWebStale(config.webDir)) {
  console.log('Building the web app, once. About a minute.');
  await buildWeb(config.webDir);
}

const server = await startServer(config);
const stopping = new AbortController();
for (const signal of ['SIGINT', 'SIGTERM'] as const) {
  process.on(signal, () => {
    stopping.abort();
    void server.stop().then(() => process.exit(0));
  });
}

if (demoIsWanted(server.context)) {
  console.log('Making the demo.');
  noteUnfinished(server.context, await seedDemo(server.context));
}
console.log(`\nMeniscus is at ${server.address}`);
if (config.demo) for (const line of signInLines()) console.log(line);

const demo = unfinishedDemo(server.context);
if (demo && config.demo) {
  console.log('The pages of the demo are being drawn. Reading can begin with the first.');
  await bringDemoPages(server.context, demo, console.log, stopping.signal).catch((error: unknown) => {
    if (!stopping.signal.aborted) console.error('Drawing the demo stopped. It goes on at the next start.', error);
  });
}

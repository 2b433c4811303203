import { readConfig } from '../config/config';
import { startServer } from '../index';
import { buildWeb, isWebStale } from './build-web';
import { demoIsWanted, drawDemoPages, seedDemo, signInLines } from './demo';

const config = readConfig();

if (isWebStale(config.webDir)) {
  console.log('Building the web app, once. About a minute.');
  await buildWeb(config.webDir);
}

const server = await startServer(config);
const stopDrawing = new AbortController();
let stopping = false;

async function stop(): Promise<void> {
  if (stopping) return;
  stopping = true;
  stopDrawing.abort();
  await server.stop();
  process.exit(0);
}
process.on('SIGINT', () => void stop());
process.on('SIGTERM', () => void stop());

const seeded = demoIsWanted(server.context) ? await seedDemo(server.context) : null;
console.log(`\nMeniscus is at ${server.address}`);
if (config.demo) for (const line of signInLines()) console.log(line);
console.log('');
if (seeded) {
  await drawDemoPages(server.context, seeded, stopDrawing.signal, (line) => console.log(line)).catch((error: unknown) => {
    if (!stopping) throw error;
  });
}

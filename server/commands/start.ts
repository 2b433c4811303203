import { readConfig } from '../config/config';
import { startServer } from '../index';
import { buildWeb, isWebStale } from './build-web';
import { demoIsWanted, seedDemo, signInLines } from './demo';

const config = readConfig();

if (isWebStale(config.webDir)) {
  console.log('Building the web app, once. About a minute.');
  await buildWeb(config.webDir);
}

const server = await startServer(config);
for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, () => void server.stop().then(() => process.exit(0)));

if (demoIsWanted(server.context)) {
  console.log('Making the demo.');
  await seedDemo(server.context);
}
console.log(`\nMeniscus is at ${server.address}`);
if (config.demo) for (const line of signInLines()) console.log(line);

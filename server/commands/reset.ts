import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { readConfig } from '../config/config';
import { startContext } from '../start-context';
import { drawDemoPages, seedDemo, signInLines } from './demo';

const config = readConfig();

// Only what this program wrote: secrets and anything else in the folder stay.
for (const name of ['meniscus.sqlite', 'meniscus.sqlite-wal', 'meniscus.sqlite-shm', 'blobs', 'incoming', 'demo']) {
  rmSync(join(config.dataDir, name), { recursive: true, force: true });
}

const { context, close } = startContext(config);
const seeded = await seedDemo(context);
context.jobs.run();
await drawDemoPages(context, seeded, new AbortController().signal, (line) => console.log(line));
await context.jobs.settle();
for (const line of signInLines()) console.log(line);
await close();
process.exit(0);

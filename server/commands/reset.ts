import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { readConfig } from '../config/config';
import { startContext } from '../start-context';
import { seedDemo, signInLines } from './demo';

const config = readConfig();

// Only what this program wrote: secrets and anything else in the folder stay.
for (const name of ['meniscus.sqlite', 'meniscus.sqlite-wal', 'meniscus.sqlite-shm', 'blobs', 'incoming', 'demo']) {
  rmSync(join(config.dataDir, name), { recursive: true, force: true });
}

const { context, close } = startContext(config);
await seedDemo(context);
await close();
for (const line of signInLines()) console.log(line);

import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { pino } from 'pino';
import { openDatabase } from '../db/client';
import { migrateDatabase } from '../db/migrate';
import type { Config } from './config/config';
import { systemClock, type Clock, type Context } from './context';
import { createOpener } from './ingest/inputs/opener';
import { createParts } from './ingest/parts';
import { createPictures } from './ingest/pictures';
import { createSqliteJobs } from './jobs/sqlite-jobs';
import { createPrinter } from './print/printer';
import { ingestJob, ingestUpload } from './services/ingest';
import { printJob, printSheets } from './services/printing-job';
import { createLocalStorage } from './storage/local-storage';
import { createS3Storage } from './storage/s3-storage';

interface Started {
  readonly context: Context;
  close(): Promise<void>;
}

/** Opens and migrates the database in the data folder and builds the context on it. */
export function startContext(config: Config, clock: Clock = systemClock): Started {
  mkdirSync(config.dataDir, { recursive: true });
  const log = pino({ level: config.logLevel });
  const db = openDatabase(join(config.dataDir, 'meniscus.sqlite'));
  migrateDatabase(db);
  const storage = config.bucket ? createS3Storage({ ...config.bucket, copiesDir: join(config.dataDir, 'copies') }) : createLocalStorage(join(config.dataDir, 'blobs'));
  const jobs = createSqliteJobs({ db, clock, log, lanes: 2 });
  const opener = createOpener();
  const pictures = createPictures();
  const printer = createPrinter();
  const context: Context = { config, db, storage, jobs, opener, pictures, printer, parts: createParts(config.dataDir), clock, log };
  jobs.handle(ingestJob, ({ uploadId }, beat) => ingestUpload(context, String(uploadId), beat));
  jobs.handle(printJob, ({ printingId }) => printSheets(context, String(printingId)));
  return {
    context,
    close: async () => {
      await jobs.stop();
      await opener.close();
      await pictures.close();
      await printer.close();
      db.$client.close();
    },
  };
}

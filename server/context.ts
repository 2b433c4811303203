import type { Logger } from 'pino';
import type { Database } from '../db/client';
import type { Config } from './config/config';
import type { Opener } from './ingest/inputs/opener';
import type { Parts } from './ingest/parts';
import type { Pictures } from './ingest/pictures';
import type { Jobs } from './jobs/jobs';
import type { Printer } from './print/printer';
import type { Storage } from './storage/storage';

export interface Clock {
  /** UTC milliseconds. */
  now(): number;
}

/** The one object handed around. */
export interface Context {
  readonly config: Config;
  readonly db: Database;
  readonly storage: Storage;
  readonly jobs: Jobs;
  readonly opener: Opener;
  readonly pictures: Pictures;
  readonly printer: Printer;
  readonly parts: Parts;
  readonly clock: Clock;
  readonly log: Logger;
}

export const systemClock: Clock = { now: () => Date.now() };

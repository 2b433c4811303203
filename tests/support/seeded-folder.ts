import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buildPaper, type BuiltPaper } from './paper';
import { startTestServer } from './test-server';

export interface SeededFolder extends BuiltPaper {
  readonly dataDir: string;
}

/** A data folder with the cast and a locked paper in it, for a server process that is started on it. */
export async function seededFolder(candidates: readonly string[]): Promise<SeededFolder> {
  const dataDir = mkdtempSync(join(tmpdir(), 'meniscus-child-'));
  const server = await startTestServer({ DATA_DIR: dataDir });
  const paper = buildPaper(server, { candidates: [...candidates] });
  await server.close();
  return { ...paper, dataDir };
}

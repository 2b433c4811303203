import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { buildWeb, isWebStale } from '../../server/commands/build-web';
import { ensureChromium } from './chromium';
import { ensureSheetReaders } from './debian';

const root = fileURLToPath(new URL('../..', import.meta.url));
const reports = mkdtempSync(join(tmpdir(), 'meniscus-tests-'));
const counts = { passed: 0, failed: 0 };

interface Report {
  readonly numPassedTests: number;
  readonly numFailedTests: number;
  readonly numTotalTestSuites: number;
  readonly success: boolean;
}

function step(name: string, command: string, args: readonly string[]): boolean {
  console.log(`\n== ${name}`);
  const { status } = spawnSync(join(root, 'node_modules/.bin', command), args, { cwd: root, stdio: 'inherit' });
  return status === 0;
}

function tests(project: string): boolean {
  const file = join(reports, `${project}.json`);
  const ok = step(`tests: ${project}`, 'vitest', ['run', '--project', project, '--reporter=default', '--reporter=json', `--outputFile.json=${file}`]);
  const report = JSON.parse(readFileSync(file, 'utf8')) as Report;
  counts.passed += report.numPassedTests;
  counts.failed += report.numFailedTests;
  return ok && report.success && report.numPassedTests > 0;
}

function apiTests(): boolean {
  ensureSheetReaders();
  return tests('api');
}

async function browserTests(): Promise<boolean> {
  process.env.CHROMIUM_PATH = ensureChromium();
  const webDir = join(root, 'dist');
  if (isWebStale(webDir)) {
    console.log('\n== building the web app');
    await buildWeb(webDir);
  }
  return tests('browser');
}

/** Types, lint, unit, API, sheet and browser tests, all of them even when one fails; the last line counts the tests. */
async function runAll(): Promise<boolean> {
  const outcomes = [
    step('types: app', 'tsc', ['-p', 'tsconfig.json', '--noEmit']),
    step('types: server', 'tsc', ['-p', 'tsconfig.server.json', '--noEmit']),
    step('lint', 'eslint', ['.', '--max-warnings', '0']),
    tests('unit'),
    apiTests(),
    tests('sheets'),
    await browserTests(),
  ];
  return outcomes.every(Boolean);
}

const ok = await runAll();
rmSync(reports, { recursive: true, force: true });
console.log(`\n${counts.passed} passed, ${counts.failed} failed`);
process.exit(ok ? 0 : 1);

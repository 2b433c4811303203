import { copyFileSync, mkdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { demoSheet } from '../../db/seed/pages/demo-sheet';
import { drawPages } from './demo-draw/draw-pages';
import { readConfig } from '../config/config';
import { demoSeed, demoTruth, secondBatch } from './demo-truth';

/** Writes a second, small batch of the demo to be uploaded by hand: its pages, one with a scanner's name, one twice, and one file that is no picture. */
const outDir = join(readConfig().dataDir, 'demo-batch');
rmSync(outDir, { recursive: true, force: true });
mkdirSync(outDir, { recursive: true });
const drawn = await drawPages({ outDir, seed: demoSeed, sheet: demoSheet, candidates: secondBatch(demoTruth()) });
const [first, second] = drawn;
if (first) copyFileSync(join(outDir, first.file), join(outDir, 'scan0017.jpg'));
if (second) renameSync(join(outDir, second.file), join(outDir, 'scan0018.jpg'));
writeFileSync(join(outDir, 'notes.txt'), 'Bundle B, six scripts from the back row.\n');
console.log(`${drawn.length} pages are in ${outDir}`);
console.log('Sign in as a reader, open Scans of Paper 2, and add all files of that folder: one will want sorting, one is there twice, one is no picture.');

import { printMasters, checkOf } from './printed';
import { scenarios } from './faults';
import { scan } from './scanned';
import { randomFrom } from '../../db/seed/truth/random';
import { loadCodeFinder } from '../../server/ingest/sheet/codes';
import { identify } from '../../server/ingest/sheet/identify';
import { fitHomography, mapped } from '../../server/ingest/sheet/homography';
import { codePlaces, paperSizes } from '../../shared/sheets/geometry';
const masters = await printMasters();
const find = await loadCodeFinder();
for (const s of ['mirrored','clean','stain on a code','black and white','noise','low contrast','negative']) {
  const m = masters[0]!; const random = randomFrom('x', s);
  const sc = await scan({ ...m, pixels: Uint8Array.from(m.pixels) }, 'a4', scenarios[s]!(random), random);
  const codes = find(sc.grey); const id = identify(codes, checkOf);
  if (!id.ok) { console.log(s, id); continue; }
  if (s === 'mirrored') { const c = id.codes[0]!; const p = codePlaces(paperSizes.a4)[c.place - 1]!; console.log(c.place, c.code.corners, [[p.x,p.y],[p.x+15,p.y],[p.x+15,p.y+15],[p.x,p.y+15]].map(([x,y]) => sc.truth({x:x!,y:y!}))); }
  const sq = [{x:0,y:0},{x:25,y:0},{x:25,y:25},{x:0,y:25}];
  const lv: number[] = []; let mid = 0, n = 0;
  for (const { code } of id.codes) { const map = fitHomography(sq.map((from, i) => ({ from, to: code.corners[i]! })))!;
    for (let i = 0; i < 625; i++) { const q = mapped(map, { x: i % 25 + .5, y: Math.floor(i / 25) + .5 }); lv.push(sc.grey.data[Math.floor(q.y) * sc.grey.width + Math.floor(q.x)]!); }
    for (let i = 0; i < 5625; i++) { const q = mapped(map, { x: (i % 75) / 3, y: Math.floor(i / 75) / 3 }); const l = sc.grey.data[Math.floor(q.y) * sc.grey.width + Math.floor(q.x)]!; n++; if (l > 64 && l < 192) mid++; } }
  lv.sort((a, b) => a - b); const q = (f: number) => lv[Math.floor(lv.length * f)];
  console.log(s, 'q', [0, .05, .25, .4, .45, .55, .6, .75, .95, .999].map(q).join(' '), 'mid', (mid / n).toFixed(3));
}

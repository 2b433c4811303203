import { printMasters } from './printed';
import { scenarios } from './faults';
import run from './trial';
import { quantile } from '../bench/figures';
const masters = await printMasters();
console.log(masters.length, masters.map((m) => `${m.width}x${m.height} ${JSON.stringify(m.identity)}`)[0]);
const n = Number(process.argv[2] ?? 2);
const only = process.argv[3];
for (const scenario of Object.keys(scenarios)) {
  if (only && !scenario.includes(only)) continue;
  const outs = [];
  for (let seed = 0; seed < n; seed += 1) outs.push(await run({ master: masters[(seed * 7 + scenario.length) % masters.length]!, scenario, seed }));
  const boxes = outs.flatMap((o) => o.boxes);
  const conf = boxes.filter((b) => b.sidesConfirmed === 4);
  const bad = boxes.filter((b) => (b.ink === 'blank') && !['empty','smudge','shadow'].includes(b.kind) || b.ink === 'written' && ['empty','smudge','shadow'].includes(b.kind));
  console.log(scenario.padEnd(34), outs.map((o) => (o.state === 'read' ? '' : o.state + ':' + o.reason) + (o.identity === 'right' ? '' : o.identity) + o.codes).join(' '), 'err', quantile(conf.map((b) => b.errorMm), 0.5).toFixed(3), Math.max(...conf.map((b) => b.errorMm)).toFixed(3), `conf ${conf.length}/${boxes.length}`, 'unsure', boxes.filter((b) => b.ink === 'unsure').map((b) => b.kind + b.sidesConfirmed).join(','), 'BAD', bad.map((b) => b.kind + ':' + b.ink).join(','), 'ms', quantile(outs.map((o) => o.ms), 0.5).toFixed(0), outs.some((o) => o.isBilevel) ? 'BILEVEL' : '');
}

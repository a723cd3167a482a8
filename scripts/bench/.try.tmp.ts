import { readFileSync } from 'node:fs';
import { generateWeek, WEEKS } from './weeks';
import { loadPrototype, toWeek, unitId } from './prototype';
import { toProblem } from '@/core/levelling/toProblem';
import { toModel } from '@/core/levelling/model';
import { Search } from '@/core/levelling/search';
import { seededRandom } from '@/core/levelling/random';
import { judge } from '@/core/levelling/evaluate';
import { planOf } from '@/core/levelling/problem';
const cpu = () => {
  const u = process.cpuUsage();
  return (u.user + u.system) / 1000;
};
const [src = 'proto', size = 'w40', seeds = '1', ms = '1000', bm = '0'] = process.argv.slice(2);
const P = await loadPrototype('/work/shared/prototype/levelling');
for (const seed of seeds.split(',').map(Number)) {
  const I = src === 'proto' ? P.generate({ ...P.presets[size]!, seed }) : null;
  const w =
    src === 'demo'
      ? JSON.parse(readFileSync('/tmp/demo.json', 'utf8'))
      : I
        ? toWeek(I)
        : generateWeek(WEEKS[size]!, seed);
  const p = toProblem(w, { prices: { batchMoved: +bm }, greatestShiftMin: I ? 20000 : 720 });
  const j0 = judge(p, planOf(p));
  const t0 = cpu();
  const m = toModel(p);
  const s = new Search(m, seededRandom(1));
  const t1 = cpu();
  s.flatten();
  const t2 = cpu();
  const fl = s.best.key;
  let pr = 0;
  let zero = -1;
  while (pr < 1) {
    for (let i = 0; i < 8; i++) s.step(pr);
    pr = Math.min(1, (cpu() - t2) / +ms);
    if (zero < 0 && s.best.key.steamKg + s.best.key.process + s.best.key.shared < 1e-6) zero = cpu() - t2;
  }
  const k = s.best.key;
  const plan = {
    starts: [...s.best.starts],
    units: [...s.best.modes].map((mm, i) => p.activities[i]!.modes[mm]!.unitId),
  };
  const j = judge(p, plan);
  console.log(
    src,
    size,
    seed,
    'acts',
    p.activities.length,
    'before kg',
    j0.steamKg.toFixed(0),
    'pr',
    j0.processOver,
    'sh',
    j0.sharedOver.toFixed(1),
    'broken',
    j0.broken,
    'late',
    j0.lateMin,
    '| model',
    (t1 - t0).toFixed(0),
    'flat',
    (t2 - t1).toFixed(0),
    fl.steamKg.toFixed(0),
    fl.change.toFixed(0),
    fl.lateWorse,
    '| its',
    s.iterations,
    'zero at',
    zero.toFixed(0),
    JSON.stringify(k),
    '| judged',
    j.steamKg.toFixed(2),
    j.processOver,
    j.sharedOver.toFixed(3),
    j.lateMin,
    j.change,
    'broken',
    j.broken,
  );
  if (I) {
    const S = { s: Int32Array.from(plan.starts), u: Int32Array.from(plan.units, (u) => Number(u.slice(1))) };
    const e = P.evaluate(I, S);
    console.log('   ours by their evaluator', e.over.toFixed(2), e.tard, e.disp, e.unitMoves, e.viol.length);
    const a = cpu();
    const real = performance.now.bind(performance);
    performance.now = cpu;
    const D = P.lns(I, { ms: +ms, seed: 1, pf: 0.4, pen0: 100, T0: 30, T1: 1, ripplePct: 0.3, push: 0.6 }) as any;
    performance.now = real;
    const d = P.evaluate(I, D.best);
    console.log(
      '   D',
      d.over.toFixed(2),
      d.tard,
      d.disp,
      d.unitMoves,
      d.viol.length,
      'cpu',
      (cpu() - a).toFixed(0),
      'iters',
      D.stats.iters,
      'pf',
      D.stats.pf,
      'rip',
      D.stats.rip,
      'push',
      D.stats.push,
    );
  }
}

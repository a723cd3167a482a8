// scripts/bench/.try.tmp.ts
import { readFileSync } from "node:fs";

// src/core/levelling/random.ts
function seededRandom(seed) {
  let state = seed * 2654435761 | 0;
  return () => {
    state = state + 2654435769 | 0;
    let hash = Math.imul(state ^ state >>> 16, 2246822507);
    hash = Math.imul(hash ^ hash >>> 13, 3266489909);
    return ((hash ^ hash >>> 16) >>> 0) / 4294967296;
  };
}
var wholeBelow = (random, below) => Math.floor(random() * below);
function shuffle(random, values) {
  for (let i = values.length - 1; i > 0; i--) {
    const j = wholeBelow(random, i + 1);
    [values[i], values[j]] = [values[j], values[i]];
  }
}

// scripts/bench/weeks.ts
var WEEKS = {
  w40: { batches: 40, days: 2, dayAndNight: false },
  w150: { batches: 150, days: 5, dayAndNight: false },
  w500: { batches: 500, days: 7, dayAndNight: true }
};
var DAY = 1440;
var FAMILIES = ["A", "B", "C", "D"];
var UNIT_KINDS = ["blancher", "blancher", ...kinds("kettle", 4), ...kinds("retort", 6)];
var CLEANING = {
  blancher: [
    [0, 10, 20, 30],
    [10, 0, 20, 30],
    [15, 15, 0, 30],
    [40, 40, 40, 0]
  ],
  kettle: [
    [0, 15, 20, 40],
    [15, 0, 20, 40],
    [20, 20, 0, 40],
    [45, 45, 45, 0]
  ],
  retort: [
    [5, 5, 5, 10],
    [5, 5, 5, 10],
    [5, 5, 5, 10],
    [10, 10, 10, 5]
  ]
};
function generateWeek(shape, seed) {
  const random = seededRandom(seed * 7919 + shape.batches);
  const horizonMin = (shape.days + 1) * DAY;
  const units = UNIT_KINDS.map((kind, i) => ({
    id: `u${String(i).padStart(2, "0")}`,
    lineId: "line",
    name: `${kind} ${i}`,
    kind,
    headerId: "main",
    ventGroupId: null
  }));
  const open = units.map((_, i) => calendarOf(i, shape));
  const planned = planByHand(shape, random, units, open, horizonMin);
  const naivePeak = peakOf(planned.activities, horizonMin);
  const base = Math.ceil(naivePeak / (1.6 + 0.3 * random()) / 50) * 50;
  return {
    horizonMin,
    plant: plantOf(units, operators(shape)),
    calendars: units.map((u, i) => ({ unitId: u.id, open: open[i] })),
    capacities: [
      {
        headerId: "main",
        exportKgPerH: null,
        limitKgPerH: limitOf(base, shape.days),
        baseLoadKgPerH: [{ from: 0, value: 0 }],
        greatestRiseKgPerHPerMin: null,
        storedKgPerBar: null
      }
    ],
    activities: unfixWhatIsOverAlone(planned.activities, base * 0.8, horizonMin),
    links: planned.links
  };
}
function kinds(kind, count) {
  return Array.from({ length: count }, () => kind);
}
function calendarOf(unit, shape) {
  const open = [];
  for (let day = 0; day <= shape.days; day++) {
    const from = day * DAY;
    if (!shape.dayAndNight) open.push({ from: from + 300, to: from + 1380 });
    else if (day % 2 === 0) {
      const stop = from + unit * 110 % 1320;
      if (stop > from) open.push({ from, to: stop });
      open.push({ from: stop + 60, to: from + DAY });
    } else open.push({ from, to: from + DAY });
  }
  return join(open);
}
function join(spans) {
  const joined = [];
  for (const s of spans) {
    const last = joined.at(-1);
    if (last && last.to >= s.from) joined[joined.length - 1] = { from: last.from, to: s.to };
    else joined.push(s);
  }
  return joined;
}
function planByHand(shape, random, units, open, horizonMin) {
  const queues = units.map(() => []);
  const activities = [];
  const links = [];
  const perDay = Math.ceil(shape.batches / shape.days);
  for (let b = 0; b < shape.batches; b++) {
    const day = Math.min(shape.days - 1, Math.floor(b / perDay));
    const family = random() < 0.15 ? 3 : whole(random, 0, 2);
    const stages = stagesOf(random);
    const waits = stages.map((_, k) => k === 0 ? 0 : 5 * whole(random, 9, 24));
    const dayStart = shape.dayAndNight ? 0 : day * DAY + 300;
    const places = placeByHand(stages, waits, dayStart, units, open, queues, family);
    places.forEach((p, k) => queues[p.unit]?.push({ end: p.start + stages[k].minutes, family }));
    const first = places[0]?.start ?? 0;
    const last = places.at(-1);
    const end = (last?.start ?? 0) + (stages.at(-1)?.minutes ?? 0);
    const loose = shape.dayAndNight ? Math.max(0, first - whole(random, 0, 24) * 60) : dayStart;
    const earliest = Math.min(first, random() < 0.5 ? loose : Math.max(0, first - whole(random, 0, 6) * 30));
    const due = end + (random() < 0.25 ? whole(random, 1, 6) * 15 : whole(random, 8, 40) * 30);
    const fixed = random() < 0.05;
    const id = `b${String(b).padStart(3, "0")}`;
    stages.forEach((stage, k) => {
      activities.push({
        id: `${id}-${k}`,
        kind: "stage",
        stage: stage.kind === "retort" ? "retort" : stage.kind === "kettle" ? "cook" : "blanch",
        batchId: id,
        code: `${id}-${k}`,
        title: `Batch ${b}`,
        productId: null,
        familyId: FAMILIES[family],
        modes: units.filter((u) => u.kind === stage.kind).map((u) => ({
          unitId: u.id,
          minutes: stage.minutes,
          phases: stage.phases,
          uses: stage.operators.map(([offsetMin, minutes]) => ({
            limitId: "operators",
            offsetMin,
            minutes,
            amount: 1
          })),
          dutyId: null
        })),
        placement: { unitId: units[places[k]?.unit ?? 0]?.id ?? "", start: places[k]?.start ?? 0 },
        fixing: fixed ? "fixed" : "free",
        occupiesUntil: "end",
        earliestStart: k === 0 ? earliest : 0,
        latestStart: null,
        due: k === stages.length - 1 ? due : null,
        weight: 1,
        processData: null,
        revision: 1
      });
      if (k === 0) return;
      links.push({
        id: `${id}-${k}`,
        from: { activityId: `${id}-${k - 1}`, anchor: "end", offsetMin: 0 },
        to: { activityId: `${id}-${k}`, anchor: "start", offsetMin: 0 },
        leastMin: 5,
        greatestMin: waits[k],
        rule: "flow",
        greatestBreach: "time",
        source: null
      });
    });
  }
  if (activities.some((a) => (a.placement?.start ?? 0) + 200 > horizonMin)) throw new Error("week too full");
  return { activities, links };
}
function stagesOf(random) {
  const stages = [];
  if (random() < 0.4) {
    const minutes = 5 * whole(random, 8, 12);
    const warm = phase("warmUp", 0, 10, 5 * whole(random, 160, 200));
    const run = phase("run", 10, minutes - 10, 5 * whole(random, 100, 130));
    stages.push({ kind: "blancher", minutes, phases: [warm, run], operators: [[0, 10]] });
  }
  if (random() < 0.7) {
    const heat = 5 * whole(random, 2, 4);
    const hold = 5 * whole(random, 6, 12);
    const phases2 = [
      phase("heatUp", 10, heat, 5 * whole(random, 200, 280)),
      phase("hold", 10 + heat, hold, 5 * whole(random, 60, 100))
    ];
    stages.push({ kind: "kettle", minutes: 15 + heat + hold, phases: phases2, operators: [[0, 10]] });
  }
  const vent = whole(random, 7, 10);
  const comeUp = whole(random, 8, 12);
  const process2 = 5 * whole(random, 8, 13);
  const cool = 5 * whole(random, 3, 4);
  const phases = [
    phase("vent", 10, vent, 5 * whole(random, 520, 700)),
    phase("comeUp", 10 + vent, comeUp, 5 * whole(random, 340, 440)),
    phase("process", 10 + vent + comeUp, process2, 5 * whole(random, 60, 100))
  ];
  const empty = 10 + vent + comeUp + process2 + cool;
  stages.push({
    kind: "retort",
    minutes: empty + 5,
    phases,
    operators: [
      [0, 10],
      [empty, 5]
    ]
  });
  return stages;
}
var phase = (kind, offsetMin, minutes, steamKgPerH) => ({
  kind,
  offsetMin,
  minutes,
  steamKgPerH
});
var whole = (random, from, to) => from + Math.floor(random() * (to - from + 1));
function placeByHand(stages, waits, dayStart, units, open, queues, family) {
  let from = dayStart;
  for (let tries = 0; tries < 2e3; tries++) {
    const places = [];
    let ready = from;
    let behind = 0;
    for (let k = 0; k < stages.length && behind <= 0; k++) {
      const stage = stages[k];
      const place = earliestPlace(stage, k === 0 ? ready : ready + 5, units, open, queues, family);
      behind = k === 0 ? 0 : place.start - ready - waits[k];
      places.push(place);
      ready = place.start + stage.minutes;
    }
    if (behind <= 0) return places;
    from = Math.max(from, places[0]?.start ?? from) + Math.max(1, Math.min(120, behind));
  }
  throw new Error("no place found by hand");
}
function earliestPlace(stage, from, units, open, queues, family) {
  let best = { unit: -1, start: Infinity };
  units.forEach((unit, i) => {
    if (unit.kind !== stage.kind) return;
    const last = queues[i]?.at(-1);
    const clean = last ? CLEANING[unit.kind]?.[last.family]?.[family] ?? 0 : 0;
    const ready = Math.max(from, last ? last.end + clean : 0);
    const span = open[i].find((o) => Math.max(o.from, ready) + stage.minutes <= o.to);
    const start = span ? Math.max(span.from, ready) : Infinity;
    if (start < best.start) best = { unit: i, start };
  });
  return best;
}
function limitOf(base, days) {
  const steps = [{ from: 0, value: base }];
  for (let day = 0; day <= days; day++) {
    const noon = day * DAY + 720;
    steps.push({ from: noon, value: Math.round(base * 0.8) }, { from: noon + 90, value: base });
    if (day % 2 === 0) continue;
    steps.push({ from: day * DAY + 1080, value: Math.round(base * 0.85) }, { from: day * DAY + 1320, value: base });
  }
  return steps;
}
function operators(shape) {
  const steps = [{ from: 0, value: 4 }];
  for (let day = 0; day <= shape.days; day++) {
    steps.push({ from: day * DAY + 1080, value: 3 }, { from: (day + 1) * DAY + 300, value: 4 });
  }
  return steps;
}
function plantOf(units, operatorSteps) {
  return {
    id: "bench",
    name: "Generated plant",
    isDemo: true,
    ambientBarA: 1.01325,
    rules: { snapMinutes: 5, reserveFraction: 0, sagToleranceBar: 1 },
    lines: [{ id: "line", name: "Line" }],
    units,
    ventGroups: [],
    headers: [
      { id: "main", name: "Main", pressureBarG: 7, dryness: 0.98, superheatK: null, feed: { kind: "boilers" } }
    ],
    sharedLimits: [{ id: "operators", name: "Operators", unit: "people", capacity: operatorSteps }],
    cleaning: cleaningRules()
  };
}
function cleaningRules() {
  return Object.entries(CLEANING).flatMap(
    ([kind, rows]) => rows.flatMap(
      (row, from) => row.map((minutes, to) => ({
        unitKind: kind,
        fromFamilyId: FAMILIES[from],
        toFamilyId: FAMILIES[to],
        minutes,
        kind: "wash",
        phases: [],
        uses: []
      }))
    )
  );
}
function peakOf(activities, horizonMin) {
  return Math.max(...loadOf(activities, horizonMin));
}
function loadOf(activities, horizonMin) {
  const load = new Float64Array(horizonMin);
  for (const a of activities) addLoad(load, a, 1);
  return load;
}
function addLoad(load, a, sign) {
  for (const p of a.modes[0]?.phases ?? []) {
    const from = (a.placement?.start ?? 0) + p.offsetMin;
    for (let t = from; t < from + p.minutes; t++) load[t] = load[t] + sign * p.steamKgPerH;
  }
}
function unfixWhatIsOverAlone(activities, limit2, horizonMin) {
  const load = new Float64Array(horizonMin);
  const freed = /* @__PURE__ */ new Set();
  for (const batchId of new Set(activities.map((a) => a.batchId ?? a.id))) {
    const fixed = activities.filter((a) => a.batchId === batchId && a.fixing === "fixed");
    fixed.forEach((a) => addLoad(load, a, 1));
    if (fixed.length === 0 || Math.max(...load) <= limit2) continue;
    fixed.forEach((a) => addLoad(load, a, -1));
    freed.add(batchId);
  }
  return activities.map((a) => freed.has(a.batchId ?? a.id) ? { ...a, fixing: "free" } : a);
}

// scripts/bench/prototype.ts
import { pathToFileURL } from "node:url";
import { join as join2 } from "node:path";

// src/core/time/stepFunction.ts
function toMinutes(fn, horizonMin) {
  const values = new Float64Array(horizonMin);
  fn.forEach((step, i) => {
    const to = Math.min(horizonMin, fn[i + 1]?.from ?? horizonMin);
    if (to > Math.max(0, step.from)) values.fill(step.value, Math.max(0, step.from), to);
  });
  return values;
}
function fromMinutes(values) {
  const steps = [];
  for (let t = 0; t < values.length; t++) {
    const value = values[t];
    if (steps.length === 0 || steps[steps.length - 1].value !== value) steps.push({ from: t, value });
  }
  return steps;
}

// scripts/bench/prototype.ts
async function loadPrototype(folder) {
  const load = (file) => import(pathToFileURL(join2(folder, file)).href);
  const [gen, lns, lp] = [await load("gen.mjs"), await load("lns.mjs"), await load("timinglp.mjs")];
  return {
    generate: gen.generate,
    evaluate: gen.evaluate,
    presets: gen.PRESETS,
    lns: lns.lns,
    extract: lp.extract,
    solveJs: lp.solveJs
  };
}
var unitId = (u) => `u${String(u).padStart(2, "0")}`;
var activityId = (op) => `o${String(op).padStart(5, "0")}`;
function toWeek(instance) {
  return {
    horizonMin: instance.H,
    plant: {
      id: "instance",
      name: "Converted instance",
      isDemo: true,
      ambientBarA: 1.01325,
      rules: { snapMinutes: 5, reserveFraction: 0, sagToleranceBar: 1 },
      lines: [{ id: "line", name: "Line" }],
      units: instance.units.map((u, i) => ({
        id: unitId(i),
        lineId: "line",
        name: unitId(i),
        kind: u.kind,
        headerId: "main",
        ventGroupId: null
      })),
      ventGroups: [],
      headers: [
        { id: "main", name: "Main", pressureBarG: 7, dryness: 0.98, superheatK: null, feed: { kind: "boilers" } }
      ],
      sharedLimits: [
        { id: "crew", name: "Crew", unit: "people", capacity: fromMinutes(instance.cap[1] ?? new Float64Array(1)) }
      ],
      cleaning: cleaningOf(instance)
    },
    calendars: instance.units.map((u, i) => ({ unitId: unitId(i), open: u.open.map(([from, to]) => ({ from, to })) })),
    capacities: [
      {
        headerId: "main",
        exportKgPerH: null,
        limitKgPerH: fromMinutes(instance.cap[0]),
        baseLoadKgPerH: [{ from: 0, value: 0 }],
        greatestRiseKgPerHPerMin: null,
        storedKgPerBar: null
      }
    ],
    activities: instance.ops.map((op) => toActivity(instance, op)),
    links: instance.ops.flatMap((op) => op.k === 0 ? [] : [toLink(op)])
  };
}
function cleaningOf(instance) {
  return Object.entries(instance.clean).flatMap(
    ([kind, rows]) => rows.flatMap(
      (row, from) => row.map((minutes, to) => ({
        unitKind: kind,
        fromFamilyId: `f${from}`,
        toFamilyId: `f${to}`,
        minutes,
        kind: "wash",
        phases: [],
        uses: []
      }))
    )
  );
}
function toActivity(instance, op) {
  const job = instance.jobs[op.job];
  const phases = (op.prof[0] ?? []).map(([offsetMin, minutes, steamKgPerH]) => ({
    kind: "run",
    offsetMin,
    minutes,
    steamKgPerH
  }));
  const uses = (op.prof[1] ?? []).map(([offsetMin, minutes, amount]) => ({
    limitId: "crew",
    offsetMin,
    minutes,
    amount
  }));
  return {
    id: activityId(op.id),
    kind: "stage",
    stage: "other",
    batchId: `j${String(op.job).padStart(4, "0")}`,
    code: activityId(op.id),
    title: activityId(op.id),
    productId: null,
    familyId: `f${op.fam}`,
    modes: op.units.map((u) => ({ unitId: unitId(u), minutes: op.dur, phases, uses, dutyId: null })),
    placement: { unitId: unitId(op.pu), start: op.p },
    fixing: job.pinned ? "fixed" : "free",
    occupiesUntil: "end",
    earliestStart: op.k === 0 ? job.rel : 0,
    latestStart: null,
    due: job.ops.at(-1) === op.id ? job.due : null,
    weight: 1,
    processData: null,
    revision: 0
  };
}
function toLink(op) {
  return {
    id: activityId(op.id),
    from: { activityId: activityId(op.id - 1), anchor: "end", offsetMin: 0 },
    to: { activityId: activityId(op.id), anchor: "start", offsetMin: 0 },
    leastMin: op.minLag,
    greatestMin: op.maxLag,
    rule: "flow",
    greatestBreach: "time",
    source: null
  };
}

// src/core/plant/activity.ts
function placedMode(activity) {
  const unitId3 = activity.placement?.unitId;
  return activity.modes.find((mode) => mode.unitId === unitId3);
}
function drawnMode(activity) {
  return placedMode(activity) ?? activity.modes[0];
}

// src/core/time/interval.ts
function mergeIntervals(spans) {
  const merged = [];
  for (const span of [...spans].filter((s) => s.to > s.from).sort((a, b) => a.from - b.from)) {
    const last = merged.at(-1);
    if (last && span.from <= last.to) merged[merged.length - 1] = { from: last.from, to: Math.max(last.to, span.to) };
    else merged.push(span);
  }
  return merged;
}

// src/core/levelling/options.ts
var DEFAULT_PRICES = { batchMoved: 15, minuteMoved: 1, unitChanged: 30 };
var DEFAULT_GREATEST_SHIFT_MIN = 720;
function fullOptions(options) {
  return {
    span: options.span ?? null,
    mayChangeUnit: options.mayChangeUnit ?? true,
    greatestShiftMin: options.greatestShiftMin ?? DEFAULT_GREATEST_SHIFT_MIN,
    mayMoveEarlier: options.mayMoveEarlier ?? true,
    prices: { ...DEFAULT_PRICES, ...options.prices },
    objective: options.objective ?? "plan",
    seed: options.seed ?? 1,
    budget: options.budget ?? { iterations: 2e4 }
  };
}

// src/core/levelling/problem.ts
var PROBLEM_VERSION = 1;
function planOf(problem) {
  return {
    starts: problem.activities.map((a) => a.plan.start),
    units: problem.activities.map((a) => a.plan.unitId)
  };
}

// src/core/levelling/uses.ts
var headerResource = (headerId) => `header:${headerId}`;
var letdownResource = (headerId) => `letdown:${headerId}`;
var ventResource = (groupId) => `vents:${groupId}`;
var steamOnResource = (groupId) => `steamOns:${groupId}`;
var limitResource = (limitId) => `limit:${limitId}`;
function steamResources(plant, headerId) {
  const byId2 = new Map(plant.headers.map((h) => [h.id, h]));
  const found = [];
  const seen = /* @__PURE__ */ new Set();
  let header = headerId === null ? void 0 : byId2.get(headerId);
  while (header && !seen.has(header.id)) {
    seen.add(header.id);
    found.push(headerResource(header.id));
    if (header.feed.kind !== "letdown") break;
    found.push(letdownResource(header.id));
    header = byId2.get(header.feed.fromHeaderId);
  }
  return found;
}
function steamUses(phases, resources) {
  return phases.filter((p) => p.steamKgPerH > 0 && p.minutes > 0).flatMap(
    (p) => resources.map((resourceId) => ({
      resourceId,
      offsetMin: p.offsetMin,
      minutes: p.minutes,
      amount: p.steamKgPerH,
      phase: p.kind
    }))
  );
}
function limitUses(uses) {
  return uses.filter((u) => u.amount > 0 && u.minutes > 0).map((u) => ({
    resourceId: limitResource(u.limitId),
    offsetMin: u.offsetMin,
    minutes: u.minutes,
    amount: u.amount,
    phase: null
  }));
}
function ventUses(phases, group) {
  const vents = phases.filter((p) => p.kind === "vent").map((p) => ({ from: p.offsetMin, to: p.offsetMin + p.minutes }));
  return mergeIntervals(vents).map(({ from, to }) => ({
    resourceId: ventResource(group.id),
    offsetMin: from,
    minutes: to - from + group.marginMinutes,
    amount: 1,
    phase: "vent"
  }));
}
function steamOnUses(phases, group) {
  const drawing = phases.filter((p) => p.steamKgPerH > 0).map((p) => p.offsetMin);
  if (drawing.length === 0 || group.steamOnMinutes <= 0) return [];
  return [
    {
      resourceId: steamOnResource(group.id),
      offsetMin: Math.min(...drawing),
      minutes: group.steamOnMinutes,
      amount: 1,
      phase: null
    }
  ];
}
function modeUses(plant, unit, activity, mode) {
  const group = plant.ventGroups.find((g) => g.id === unit?.ventGroupId);
  return [
    ...steamUses(mode.phases, steamResources(plant, unit?.headerId ?? null)),
    ...group ? ventUses(mode.phases, group) : [],
    ...group && activity.stage === "retort" ? steamOnUses(mode.phases, group) : [],
    ...limitUses(mode.uses)
  ];
}

// src/core/levelling/resources.ts
var NONE = [];
var constant = (value) => [{ from: 0, value }];
function toResources(week) {
  return [...steamLimits(week), ...ventLimits(week), ...sharedLimits(week)].sort((a, b) => a.id < b.id ? -1 : 1);
}
function steamLimits(week) {
  const capacities = new Map(week.capacities.map((c) => [c.headerId, c]));
  return week.plant.headers.flatMap((header) => {
    const baseLoad = baseLoadBelow(header, week.plant.headers, capacities, week.horizonMin);
    const resources = [];
    const limit2 = capacities.get(header.id)?.limitKgPerH ?? null;
    if (limit2) resources.push(steamResource(headerResource(header.id), header.id, limit2, baseLoad, week.horizonMin));
    if (header.feed.kind === "letdown") {
      const greatest = constant(header.feed.greatestKgPerH);
      resources.push(steamResource(letdownResource(header.id), header.id, greatest, baseLoad, week.horizonMin));
    }
    return resources;
  });
}
function steamResource(id, sourceId, limit2, baseLoad, horizonMin) {
  const left = toMinutes(limit2, horizonMin).map((v, t) => v - baseLoad[t]);
  return { id, class: "steam", sourceId, capacity: fromMinutes(left), baseLoad: fromMinutes(baseLoad) };
}
function baseLoadBelow(header, headers, capacities, horizonMin, above = []) {
  const sum = toMinutes(capacities.get(header.id)?.baseLoadKgPerH ?? NONE, horizonMin);
  for (const below of headers) {
    if (below.feed.kind !== "letdown" || below.feed.fromHeaderId !== header.id || above.includes(below.id)) continue;
    const part = baseLoadBelow(below, headers, capacities, horizonMin, [...above, header.id]);
    for (let t = 0; t < horizonMin; t++) sum[t] = sum[t] + part[t];
  }
  return sum;
}
function ventLimits(week) {
  return week.plant.ventGroups.flatMap((group) => [
    limit(ventResource(group.id), "process", group.id, constant(group.ventsAtOnce)),
    limit(steamOnResource(group.id), "process", group.id, constant(group.steamOnsAtOnce))
  ]);
}
function sharedLimits(week) {
  return week.plant.sharedLimits.map((l) => limit(limitResource(l.id), "shared", l.id, l.capacity));
}
function limit(id, resourceClass, sourceId, capacity) {
  return { id, class: resourceClass, sourceId, capacity, baseLoad: NONE };
}

// src/core/levelling/toProblem.ts
var byId = (a, b) => a.id < b.id ? -1 : a.id > b.id ? 1 : 0;
function toProblem(week, options = {}) {
  const full = fullOptions(options);
  const placed = week.activities.filter((a) => a.placement !== null && a.modes.length > 0).sort(byId);
  const links = toLinks(week.links, placed);
  const linkIds = new Set(links.map((l) => l.id));
  const activities = placed.map((a) => toActivity2(a, week, full, linkIds));
  return {
    version: PROBLEM_VERSION,
    horizonMin: week.horizonMin,
    units: toUnits(week),
    cleaning: toCleaning(week.plant),
    resources: toResources(week),
    activities,
    links,
    prices: full.prices
  };
}
function toUnits(week) {
  const open = new Map(week.calendars.map((c) => [c.unitId, c.open]));
  return [...week.plant.units].sort(byId).map((u) => ({
    id: u.id,
    open: mergeIntervals(open.get(u.id) ?? [{ from: 0, to: week.horizonMin }])
  }));
}
function toCleaning(plant) {
  const stated = plant.cleaning.flatMap((rule) => {
    const units = [...plant.units].filter((u) => u.kind === rule.unitKind).sort(byId);
    return [...new Set(units.map((u) => u.headerId))].map((headerId) => ({
      unitIds: units.filter((u) => u.headerId === headerId).map((u) => u.id),
      fromFamilyId: rule.fromFamilyId,
      toFamilyId: rule.toFamilyId,
      minutes: rule.minutes,
      uses: [...steamUses(rule.phases, steamResources(plant, headerId)), ...limitUses(rule.uses)]
    }));
  });
  return stated.sort((a, b) => cleaningKey(a) < cleaningKey(b) ? -1 : 1);
}
var cleaningKey = (c) => [c.unitIds[0], c.fromFamilyId, c.toFamilyId].join("|");
function toActivity2(a, week, options, linkIds) {
  const placement = a.placement ?? { unitId: "", start: 0 };
  const movable = isMovable(a, options, week.horizonMin);
  const [earliest, latest] = startBounds(a, placement.start, options, week.horizonMin);
  const takenOffBy = a.occupiesUntil === "end" ? null : a.occupiesUntil.linkId;
  return {
    id: a.id,
    batchId: a.batchId ?? a.id,
    familyId: a.kind === "stage" ? a.familyId : null,
    modes: toModes(a, week.plant, movable && options.mayChangeUnit),
    plan: { unitId: placement.unitId, start: placement.start },
    movable,
    takenOffBy: takenOffBy !== null && linkIds.has(takenOffBy) ? takenOffBy : null,
    cleanAfterMin: placement.cleanAfterMin ?? 0,
    earliestStart: movable ? earliest : placement.start,
    latestStart: movable ? latest : placement.start,
    due: a.due,
    weight: a.weight
  };
}
function isMovable(a, options, horizonMin) {
  const start = a.placement?.start ?? -1;
  const minutes = drawnMode(a)?.minutes ?? 0;
  if (a.fixing !== "free" || start < 0 || start + minutes > horizonMin) return false;
  return options.span === null || start >= options.span.from && start < options.span.to;
}
function startBounds(a, start, options, horizonMin) {
  const { span, greatestShiftMin, mayMoveEarlier } = options;
  const least = Math.max(0, a.earliestStart, span?.from ?? 0, mayMoveEarlier ? start - greatestShiftMin : start);
  const greatest = Math.min(a.latestStart ?? horizonMin, (span?.to ?? horizonMin) - 1, start + greatestShiftMin);
  return [Math.min(start, least), Math.max(start, greatest)];
}
function toModes(a, plant, mayChangeUnit) {
  const units = new Map(plant.units.map((u) => [u.id, u]));
  const home = a.placement?.unitId ?? "";
  const drawn = drawnMode(a);
  const here = drawn ? [{ ...drawn, unitId: home }] : [];
  const others = mayChangeUnit ? a.modes.filter((m) => m.unitId !== home) : [];
  return [...here, ...others].map((m) => ({ unitId: m.unitId, minutes: m.minutes, uses: modeUses(plant, units.get(m.unitId), a, m) })).sort((x, y) => x.unitId < y.unitId ? -1 : 1);
}
function toLinks(links, placed) {
  const activities = new Map(placed.map((a) => [a.id, a]));
  return [...links].sort(byId).flatMap((link) => {
    const from = activities.get(link.from.activityId);
    const to = activities.get(link.to.activityId);
    if (!from || !to || from === to) return [];
    const wait = momentOf(to, link.to) - momentOf(from, link.from);
    return [
      {
        id: link.id,
        from: link.from,
        to: link.to,
        leastMin: Math.min(link.leastMin, wait),
        greatestMin: link.greatestMin === null ? null : Math.max(link.greatestMin, wait)
      }
    ];
  });
}
function momentOf(a, end) {
  const minutes = end.anchor === "end" ? drawnMode(a)?.minutes ?? 0 : 0;
  return (a.placement?.start ?? 0) + minutes + end.offsetMin;
}

// src/core/levelling/model.ts
var FAR = 1e9;
function toModel(problem) {
  const index = new Map(problem.activities.map((a, i) => [a.id, i]));
  const resources = new Map(problem.resources.map((r, i) => [r.id, i]));
  const units = new Map(problem.units.map((u, i) => [u.id, i]));
  const families = indexOf(problem.activities.flatMap((a) => a.familyId === null ? [] : [a.familyId]));
  const batches = indexOf(problem.activities.map((a) => a.batchId));
  const linkIndex = new Map(problem.links.map((l, i) => [l.id, i]));
  const links = problem.links.map((l) => toArc(l, index));
  const open = problem.units.map((u) => u.open.map((o) => [o.from, o.to]));
  const { groups, groupOf } = toGroups(problem.activities, links, batches);
  const size2 = problem.horizonMin + reach(problem);
  const activities = problem.activities.map((a, i) => {
    const modes = toModes2(a, units, resources);
    const mode = Math.max(
      0,
      a.modes.findIndex((m) => m.unitId === a.plan.unitId)
    );
    const minutes = modes[mode]?.minutes ?? 0;
    const spans = open[modes[mode]?.unit ?? -1] ?? [];
    const free = Math.max(a.plan.start + minutes, takenOffAt(problem, a, index));
    return {
      index: i,
      batch: batches.get(a.batchId) ?? 0,
      group: groupOf[i] ?? -1,
      family: a.familyId === null ? -1 : families.get(a.familyId) ?? -1,
      modes,
      shapes: firstOfEach(modes),
      lengths: [...new Set(modes.map((m) => m.minutes))],
      home: { start: a.plan.start, mode },
      homeOutsideShift: !spans.some(([from, to]) => from <= a.plan.start && free <= to),
      movable: a.movable,
      takenOffBy: a.takenOffBy === null ? -1 : linkIndex.get(a.takenOffBy) ?? -1,
      cleanAfter: a.cleanAfterMin,
      earliest: a.earliestStart,
      latest: a.latestStart,
      due: a.due ?? FAR,
      weight: a.weight,
      links: links.flatMap((l, k) => l.from === i || l.to === i ? [k] : []),
      frees: problem.activities.flatMap(
        (b, j) => b.takenOffBy !== null && links[linkIndex.get(b.takenOffBy) ?? -1]?.to === i ? [j] : []
      )
    };
  });
  const capacity = problem.resources.map((r) => padded(toMinutes(r.capacity, problem.horizonMin), size2));
  return {
    problem,
    horizon: problem.horizonMin,
    size: size2,
    activities,
    links,
    groups,
    batchCount: batches.size,
    open,
    cleaning: toCleaning2(problem, families, resources),
    families: families.size,
    capacity,
    scale: Float64Array.from(capacity, (c) => c.subarray(0, problem.horizonMin).reduce((m, v) => Math.max(m, v), 1e-3)),
    resourceClass: problem.resources.map((r) => r.class)
  };
}
function takenOffAt(problem, a, index) {
  const link = a.takenOffBy === null ? void 0 : problem.links.find((l) => l.id === a.takenOffBy);
  const taker = link && problem.activities[index.get(link.to.activityId) ?? -1];
  if (!link || !taker) return -FAR;
  const minutes = taker.modes.find((m) => m.unitId === taker.plan.unitId)?.minutes ?? 0;
  return taker.plan.start + (link.to.anchor === "end" ? minutes : 0) + link.to.offsetMin;
}
function linkBase(link, fromMinutes2, toMinutes_) {
  return (link.fromEnd ? fromMinutes2 : 0) + link.fromOffset - (link.toEnd ? toMinutes_ : 0) - link.toOffset;
}
function indexOf(names) {
  return new Map([...new Set(names)].sort().map((name, i) => [name, i]));
}
function padded(values, size2) {
  const all = new Float64Array(size2).fill(FAR);
  all.set(values);
  return all;
}
function reach(problem) {
  const uses = problem.activities.flatMap((a) => a.modes.flatMap((m) => m.uses));
  const own = Math.max(
    0,
    ...uses.map((u) => u.offsetMin + u.minutes),
    ...problem.activities.flatMap((a) => a.modes.map((m) => m.minutes))
  );
  const cleaning = Math.max(
    0,
    ...problem.cleaning.flatMap((c) => [c.minutes, ...c.uses.map((u) => u.offsetMin + u.minutes)])
  );
  return own + cleaning + 64;
}
function toArc(l, index) {
  return {
    from: index.get(l.from.activityId) ?? -1,
    to: index.get(l.to.activityId) ?? -1,
    fromEnd: l.from.anchor === "end",
    toEnd: l.to.anchor === "end",
    fromOffset: l.from.offsetMin,
    toOffset: l.to.offsetMin,
    least: l.leastMin,
    greatest: l.greatestMin ?? FAR
  };
}
function toDraws(uses, resources) {
  return uses.flatMap((u) => {
    const resource = resources.get(u.resourceId);
    if (resource === void 0) return [];
    return [{ resource, offset: u.offsetMin, minutes: u.minutes, amount: u.amount }];
  });
}
function toModes2(a, units, resources) {
  const shapes = /* @__PURE__ */ new Map();
  const lengths = /* @__PURE__ */ new Map();
  return a.modes.map((m) => {
    const draws = toDraws(m.uses, resources);
    const key = JSON.stringify([m.minutes, draws]);
    const shape = shapes.get(key) ?? shapes.size;
    const length = lengths.get(m.minutes) ?? lengths.size;
    shapes.set(key, shape);
    lengths.set(m.minutes, length);
    return { unit: units.get(m.unitId) ?? -1, minutes: m.minutes, draws, shape, length };
  });
}
function firstOfEach(modes) {
  const shapes = [];
  for (const mode of modes) shapes[mode.shape] ??= mode;
  return shapes;
}
function toCleaning2(problem, families, resources) {
  const n = families.size;
  const rules = problem.cleaning.map((c) => ({ ...c, draws: toDraws(c.uses, resources) }));
  return problem.units.map((unit) => {
    const table = new Array(n * n).fill(null);
    for (const rule of rules) {
      const from = families.get(rule.fromFamilyId);
      const to = families.get(rule.toFamilyId);
      if (from === void 0 || to === void 0 || !rule.unitIds.includes(unit.id)) continue;
      if (rule.minutes > 0 || rule.draws.length > 0) {
        table[from * n + to] = { minutes: rule.minutes, draws: rule.draws };
      }
    }
    return table;
  });
}
function toGroups(activities, links, batches) {
  const groupOf = new Array(activities.length).fill(-1);
  const groups = [];
  const order = activities.map((_, i) => i).sort((a, b) => startOf(activities, a) - startOf(activities, b) || a - b);
  for (const root of order) {
    if (groupOf[root] !== -1 || !activities[root]?.movable) continue;
    const members = [];
    groupOf[root] = groups.length;
    members.push({ activity: root, parent: -1, links: [], children: [] });
    for (let at = 0; at < members.length; at++) {
      const member = members[at];
      for (const other of neighbours(member.activity, links)) {
        const mate = activities[other];
        if (groupOf[other] !== -1 || !mate.movable || mate.batchId !== activities[root].batchId) continue;
        const joining = linksBetween(
          links,
          other,
          members.map((m) => m.activity)
        );
        if (joining.some((k) => !touches(links[k], member.activity))) continue;
        groupOf[other] = groups.length;
        member.children.push(members.length);
        members.push({ activity: other, parent: at, links: joining, children: [] });
      }
    }
    groups.push({ batch: batches.get(activities[root].batchId) ?? 0, members });
  }
  return { groups, groupOf };
}
var startOf = (activities, i) => activities[i]?.plan.start ?? 0;
var touches = (link, a) => link.from === a || link.to === a;
function neighbours(a, links) {
  return [...new Set(links.flatMap((l) => l.from === a ? [l.to] : l.to === a ? [l.from] : []))];
}
function linksBetween(links, a, others) {
  return links.flatMap(
    (l, k) => l.from === a && others.includes(l.to) || l.to === a && others.includes(l.from) ? [k] : []
  );
}

// src/core/levelling/active.ts
var LOOK_BACK = 3;
function activeDraws(state, resource, minute) {
  const found = [];
  for (let unit = 0; unit < state.queues.length; unit++) {
    const queue = state.queues[unit];
    const last = state.position(unit, minute + 1) - 1;
    for (let i = last; i >= 0 && i > last - LOOK_BACK; i--) {
      const a = queue[i];
      collect(found, state, a, state.mode(a).draws, 0, resource, minute);
      const cleaning = state.cleaningOf(a);
      if (cleaning) collect(found, state, a, cleaning.draws, cleaning.offset, resource, minute);
    }
  }
  return found;
}
function collect(found, state, a, draws, shift, resource, minute) {
  for (const d of draws) {
    if (d.resource !== resource) continue;
    const offset = d.offset + shift;
    const from = state.starts[a] + offset;
    if (minute < from || minute >= from + d.minutes) continue;
    found.push({ activity: a, offset, minutes: d.minutes, from, to: from + d.minutes });
  }
}
function activitiesAround(state, minute, within) {
  const found = [];
  for (let unit = 0; unit < state.queues.length; unit++) {
    const queue = state.queues[unit];
    for (let i = state.position(unit, minute + within + 1) - 1; i >= 0; i--) {
      const a = queue[i];
      if (state.freeAt[a] <= minute - within) break;
      found.push(a);
    }
  }
  return found;
}

// src/core/levelling/flatten.ts
var OVER = 1e-6;
var LOOKED_AT = 12;
var GREATEST_WAIT_FOR_RISE = 240;
function pullAndFlatten(state, ripple, random, settings) {
  const log = [];
  const greatest = ripple.greatest;
  ripple.greatest = 120;
  let from = settings.pull ? pullBack(state, ripple, random, settings.pull, log) : 0;
  const until = settings.pull ? settings.pull.middle + settings.pull.within + 1440 : state.model.horizon;
  for (let step = 0; step < settings.budget; step++) {
    const over = firstOver(state, from);
    if (!over || over.minute > until) break;
    const way = cheapestWay(state, ripple, random, settings.noise, over.resource, over.minute);
    const least = way ? resolve(state, ripple, way, log) : null;
    from = least === null ? over.minute + 1 : Math.max(0, Math.min(over.minute, least));
  }
  ripple.clearOrders();
  ripple.greatest = greatest;
  return log;
}
function takeBack(state, log) {
  const starts = /* @__PURE__ */ new Map();
  for (const entry of log) {
    entry.list.forEach((a, i) => {
      if (!starts.has(a)) starts.set(a, entry.starts[i]);
    });
  }
  const list = [...starts.keys()];
  if (list.length > 0)
    state.shift(
      list,
      list.map((a) => starts.get(a))
    );
}
function move(state, ripple, a, by, log) {
  const push = ripple.push(a, by);
  if (!push) return null;
  const before = push.list.map((b) => state.starts[b]);
  log.push({ list: push.list, starts: before });
  state.shift(push.list, push.starts);
  return Math.min(...before, ...push.starts);
}
function pullBack(state, ripple, random, pull, log) {
  const pulled = [];
  for (let unit = 0; unit < state.queues.length; unit++) {
    const queue = state.queues[unit];
    for (let i = state.position(unit, pull.middle - pull.within); i < queue.length; i++) {
      const a = queue[i];
      if (state.starts[a] >= pull.middle + pull.within) break;
      if (state.starts[a] !== state.model.activities[a].home.start && random() < pull.share) pulled.push(a);
    }
  }
  shuffle(random, pulled);
  let least = state.model.horizon;
  for (const a of pulled) {
    const by = state.model.activities[a].home.start - state.starts[a];
    const moved = by === 0 ? null : move(state, ripple, a, by, log);
    if (moved !== null) least = Math.min(least, moved);
  }
  return Math.max(0, least - 1);
}
function firstOver(state, from) {
  let minute = state.model.horizon;
  let resource = -1;
  for (let r = 0; r < state.excess.length; r++) {
    if (state.over[r] <= OVER) continue;
    const excess = state.excess[r];
    for (let t = from; t < minute; t++) {
      if (excess[t] > OVER) {
        minute = t;
        resource = r;
        break;
      }
    }
  }
  state.work += minute - from;
  return resource < 0 ? null : { minute, resource };
}
function cheapestWay(state, ripple, random, noise, resource, minute) {
  const ways = waysAt(state, resource, minute).sort((a, b) => Math.abs(a.by) - Math.abs(b.by));
  let best = null;
  let least = Infinity;
  for (const way of ways.slice(0, LOOKED_AT)) {
    const price = priceOf(state, ripple, way);
    if (price === null) continue;
    const blurred = price > 0 ? price * (1 + noise * random()) : price * (1 - noise * random());
    if (blurred < least) {
      least = blurred;
      best = way;
    }
  }
  return best;
}
function waysAt(state, resource, minute) {
  const active = activeDraws(state, resource, minute);
  const { rise, drop } = levelAround(state, resource, minute);
  const movable = (a) => state.model.activities[a.activity].movable;
  const ways = [];
  for (const second of active) {
    for (const first of active) {
      if (first.activity === second.activity) continue;
      const by = first.to - second.from;
      if (movable(second)) ways.push({ first, second, moves: second.activity, by });
      if (movable(first)) ways.push({ first, second, moves: first.activity, by: -by });
    }
    if (!movable(second)) continue;
    const wait = rise - second.from;
    const ahead = second.to - drop;
    if (wait < GREATEST_WAIT_FOR_RISE) ways.push({ first: null, second, moves: second.activity, by: wait });
    if (drop > 0 && ahead < GREATEST_WAIT_FOR_RISE)
      ways.push({ first: null, second, moves: second.activity, by: -ahead });
  }
  return ways.filter((w) => w.by !== 0);
}
function levelAround(state, resource, minute) {
  const capacity = state.model.capacity[resource];
  let rise = minute;
  while (rise < state.model.horizon && rise - minute < 480 && capacity[rise] <= capacity[minute]) rise++;
  let drop = minute;
  while (drop > 0 && minute - drop < 480 && capacity[drop - 1] <= capacity[minute]) drop--;
  return { rise, drop };
}
function priceOf(state, ripple, way) {
  const push = ripple.push(way.moves, way.by);
  if (!push) return null;
  const { first, second } = way;
  if (first) {
    const ends = ripple.startAfter(first.activity) + first.offset + first.minutes;
    if (ends > ripple.startAfter(second.activity) + second.offset) return null;
  }
  let price = 0.05 * Math.abs(way.by);
  push.list.forEach((a, i) => {
    price += state.placeCost(a, push.starts[i], state.modes[a]) - state.placeCost(a, state.starts[a], state.modes[a]);
  });
  return price + newlyMoved(state, push.list);
}
function newlyMoved(state, list) {
  const batches = new Set(list.map((a) => state.model.activities[a].batch));
  let count = 0;
  for (const b of batches) if (!state.isBatchMoved(b)) count++;
  return count * state.model.problem.prices.batchMoved;
}
function resolve(state, ripple, way, log) {
  const { first, second } = way;
  if (first) ripple.order(first.activity, second.activity, first.offset + first.minutes - second.offset);
  return move(state, ripple, way.moves, way.by, log);
}

// src/core/levelling/state.ts
var LATE_PRICE = 20;
var State = class {
  constructor(model) {
    this.model = model;
    const n = model.activities.length;
    this.starts = new Int32Array(n);
    this.modes = new Int32Array(n);
    this.placed = new Uint8Array(n);
    this.freeAt = new Int32Array(n);
    this.queues = model.problem.units.map(() => []);
    this.excess = model.capacity.map((c) => c.map((v) => -v));
    this.over = new Float64Array(model.capacity.length);
    this.prices = new Float64Array(model.capacity.length);
    this.cleanings = new Array(n).fill(null);
    this.cleaningFrom = new Int32Array(n);
    this.movedInBatch = new Int32Array(model.batchCount);
    this.resync();
  }
  model;
  starts;
  modes;
  placed;
  /** When the activity's unit is free of it. */
  freeAt;
  /** By unit, activities in order of start. */
  queues;
  /** By resource and minute: load less capacity. */
  excess;
  /** By resource: sum of what is over, amount times minutes. */
  over;
  /** By resource: price of one unit of amount over for a minute. */
  prices;
  /** Minutes late times weight. */
  late = 0;
  /** What the changes of the plan cost, the price for each batch moved included. */
  change = 0;
  /** Rough count of elementary steps, to share the budget between kinds of moves without a clock. */
  work = 0;
  cleanings;
  cleaningFrom;
  movedInBatch;
  /** Puts every activity where the given plan has it; only for an empty state. */
  load(starts, modes) {
    for (const a of this.model.activities) this.insert(a.index, starts[a.index], modes[a.index]);
  }
  /** The price of the whole plan under the present prices. */
  cost() {
    let sum = this.change + LATE_PRICE * this.late;
    for (let r = 0; r < this.over.length; r++) sum += this.prices[r] * this.over[r];
    return sum;
  }
  mode(a) {
    return this.model.activities[a].modes[this.modes[a]];
  }
  unitOf(a) {
    return this.mode(a).unit;
  }
  endOf(a) {
    return this.starts[a] + this.mode(a).minutes;
  }
  isMoved(a) {
    const home = this.model.activities[a].home;
    return this.starts[a] !== home.start || this.modes[a] !== home.mode;
  }
  isBatchMoved(batch) {
    return this.movedInBatch[batch] > 0;
  }
  /** What one activity's place costs by itself: minutes moved, another unit, late. */
  placeCost(a, start, mode) {
    const { weight, due, modes } = this.model.activities[a];
    const late = Math.max(0, start + modes[mode].minutes - due);
    return this.moveCost(a, start, mode) + weight * LATE_PRICE * late;
  }
  /** Minutes moved and another unit alone. */
  moveCost(a, start, mode) {
    const { home, weight } = this.model.activities[a];
    const { minuteMoved, unitChanged } = this.model.problem.prices;
    return weight * (minuteMoved * Math.abs(start - home.start) + (mode === home.mode ? 0 : unitChanged));
  }
  cleaningBetween(unit, a, b) {
    const { activities, cleaning, families } = this.model;
    const from = activities[a].family;
    const to = activities[b].family;
    return from < 0 || to < 0 || unit < 0 ? null : cleaning[unit][from * families + to] ?? null;
  }
  /** Minutes between the unit's becoming free of `a` and the earliest start of `b` behind it. */
  changeover(unit, a, b) {
    const cleaning = this.cleaningBetween(unit, a, b);
    return cleaning ? this.model.activities[a].cleanAfter + cleaning.minutes : 0;
  }
  /** Position of the first activity in the unit's queue that starts at or after the minute. */
  position(unit, minute) {
    const queue = this.queues[unit];
    let low = 0;
    let high = queue.length;
    while (low < high) {
      const middle = low + high >> 1;
      if (this.starts[queue[middle]] < minute) low = middle + 1;
      else high = middle;
    }
    return low;
  }
  /** Position of a placed activity in its unit's queue. */
  positionOf(a) {
    const queue = this.queues[this.unitOf(a)];
    let at = this.position(this.unitOf(a), this.starts[a]);
    while (at < queue.length && queue[at] !== a) at++;
    return queue[at] === a ? at : queue.indexOf(a);
  }
  insert(a, start, mode) {
    this.starts[a] = start;
    this.modes[a] = mode;
    this.placed[a] = 1;
    this.count(a, 1);
    this.draw(this.mode(a).draws, start, 1);
    this.freeAt[a] = this.freeMoment(a);
    const unit = this.unitOf(a);
    if (unit >= 0) {
      const at = this.position(unit, start);
      this.queues[unit].splice(at, 0, a);
      if (at > 0) this.refreshCleaning(this.queues[unit][at - 1]);
      this.refreshCleaning(a);
    }
    this.refreshFreed(a);
  }
  remove(a) {
    const unit = this.unitOf(a);
    if (unit >= 0) {
      const at = this.positionOf(a);
      this.queues[unit].splice(at, 1);
      this.setCleaning(a, null, 0);
      if (at > 0) this.refreshCleaning(this.queues[unit][at - 1]);
    }
    this.draw(this.mode(a).draws, this.starts[a], -1);
    this.count(a, -1);
    this.placed[a] = 0;
  }
  /** Moves several placed activities to new starts on their units at once; their order on each unit may change. */
  shift(list, starts) {
    for (const a of list) {
      this.count(a, -1);
      this.draw(this.mode(a).draws, this.starts[a], -1);
    }
    for (let i = 0; i < list.length; i++) this.starts[list[i]] = starts[i];
    for (const a of list) {
      this.draw(this.mode(a).draws, this.starts[a], 1);
      this.count(a, 1);
      this.freeAt[a] = this.freeMoment(a);
    }
    for (const a of list) this.restoreOrder(this.unitOf(a));
    for (const a of list) {
      const unit = this.unitOf(a);
      if (unit >= 0) {
        const at = this.positionOf(a);
        if (at > 0) this.refreshCleaning(this.queues[unit][at - 1]);
        this.refreshCleaning(a);
      }
      this.refreshFreed(a);
    }
  }
  /** Moment of one end of a link under the present plan. */
  momentFrom(link) {
    return (link.fromEnd ? this.endOf(link.from) : this.starts[link.from]) + link.fromOffset;
  }
  momentTo(link) {
    return (link.toEnd ? this.endOf(link.to) : this.starts[link.to]) + link.toOffset;
  }
  linkBaseNow(link) {
    return linkBase(link, this.mode(link.from).minutes, this.mode(link.to).minutes);
  }
  /** The latest that an activity may start for the sake of the units that it frees. */
  latestToFree(a, minutes) {
    let latest = FAR;
    for (const freed of this.model.activities[a].frees) {
      if (!this.placed[freed]) continue;
      const link = this.model.links[this.model.activities[freed].takenOffBy];
      latest = Math.min(latest, this.freeBy(freed) - link.toOffset - (link.toEnd ? minutes : 0));
    }
    return latest;
  }
  /** When the unit must be free of an activity: for the next one, and for the end of its shift. */
  freeBy(a) {
    const unit = this.unitOf(a);
    if (unit < 0) return FAR;
    const next = this.queues[unit][this.positionOf(a) + 1];
    const forNext = next === void 0 ? FAR : this.starts[next] - this.changeover(unit, a, next);
    return Math.min(forNext, this.shiftEnd(a, this.starts[a]));
  }
  /** End of the open span that an activity would run in; no bound where the plan itself has it outside. */
  shiftEnd(a, start) {
    if (this.model.activities[a].homeOutsideShift) return FAR;
    const span = this.model.open[this.unitOf(a)]?.find(([from, to]) => from <= start && start < to);
    return span ? span[1] : FAR;
  }
  /** The span of a unit's calendar that holds an activity, or where it would next fit in the given direction. */
  fit(a, start, later) {
    const activity = this.model.activities[a];
    const { unit, minutes } = this.mode(a);
    if (activity.homeOutsideShift && this.modes[a] === activity.home.mode && start === activity.home.start)
      return start;
    const open = this.model.open[unit] ?? [];
    if (later) {
      for (const [from, to] of open)
        if (to - minutes >= start) {
          if (Math.max(start, from) + minutes <= to) return Math.max(start, from);
        }
      return -1;
    }
    for (let i = open.length - 1; i >= 0; i--) {
      const [from, to] = open[i];
      const at = Math.min(start, to - minutes);
      if (at >= from) return at;
    }
    return -1;
  }
  /** Recomputes what is over from the excess, against drift of the running sums. */
  resync() {
    for (let r = 0; r < this.excess.length; r++) {
      const excess = this.excess[r];
      let sum = 0;
      for (let t = 0; t < this.model.horizon; t++) if (excess[t] > 0) sum += excess[t];
      this.over[r] = sum;
    }
  }
  /** Adds (sign 1) or takes away (sign -1) draws that begin at a minute. */
  draw(draws, start, sign) {
    for (const d of draws) {
      const excess = this.excess[d.resource];
      const amount = d.amount * sign;
      const from = Math.max(0, start + d.offset);
      const to = Math.min(excess.length, start + d.offset + d.minutes);
      let change = 0;
      for (let t = from; t < to; t++) {
        const before = excess[t];
        const after = before + amount;
        change += (after > 0 ? after : 0) - (before > 0 ? before : 0);
        excess[t] = after;
      }
      this.over[d.resource] += change;
      this.work += d.minutes;
    }
  }
  /** Cleaning behind an activity as it draws now; `offset` counts from the activity's start. */
  cleaningOf(a) {
    const cleaning = this.cleanings[a];
    return cleaning ? { draws: cleaning.draws, offset: this.cleaningFrom[a] - this.starts[a] } : null;
  }
  freeMoment(a) {
    const end = this.endOf(a);
    const by = this.model.activities[a].takenOffBy;
    if (by < 0) return end;
    const link = this.model.links[by];
    if (!this.placed[link.to]) return Math.max(end, this.momentFrom(link) + Math.max(0, link.least));
    return Math.max(end, this.momentTo(link));
  }
  refreshFreed(a) {
    for (const freed of this.model.activities[a].frees) {
      if (!this.placed[freed]) continue;
      this.freeAt[freed] = this.freeMoment(freed);
      this.refreshCleaning(freed);
    }
  }
  refreshCleaning(a) {
    const unit = this.unitOf(a);
    if (unit < 0) return;
    const next = this.queues[unit][this.positionOf(a) + 1];
    const cleaning = next === void 0 ? null : this.cleaningBetween(unit, a, next);
    this.setCleaning(a, cleaning, this.freeAt[a] + this.model.activities[a].cleanAfter);
  }
  setCleaning(a, cleaning, from) {
    const before = this.cleanings[a] ?? null;
    if (before === cleaning && (cleaning === null || this.cleaningFrom[a] === from)) return;
    if (before) this.draw(before.draws, this.cleaningFrom[a], -1);
    if (cleaning) this.draw(cleaning.draws, from, 1);
    this.cleanings[a] = cleaning;
    this.cleaningFrom[a] = from;
  }
  restoreOrder(unit) {
    const queue = this.queues[unit];
    if (!queue) return;
    for (let i = 1; i < queue.length; i++) {
      if (this.starts[queue[i - 1]] <= this.starts[queue[i]]) continue;
      queue.sort((x, y) => this.starts[x] - this.starts[y] || x - y);
      for (const a of queue) this.refreshCleaning(a);
      return;
    }
  }
  count(a, sign) {
    const { home, weight, due, batch } = this.model.activities[a];
    const { batchMoved, minuteMoved, unitChanged } = this.model.problem.prices;
    const late = weight * Math.max(0, this.endOf(a) - due);
    this.late += sign * late;
    if (!this.isMoved(a)) return;
    const moved = minuteMoved * Math.abs(this.starts[a] - home.start) + (this.modes[a] === home.mode ? 0 : unitChanged);
    this.change += sign * weight * moved;
    const before = this.movedInBatch[batch];
    this.movedInBatch[batch] = before + sign;
    if (before === 0 && sign > 0) this.change += batchMoved;
    if (before === 1 && sign < 0) this.change -= batchMoved;
  }
};

// src/core/levelling/kernel.ts
var PUSH_PRICE = 2;
var Kernel = class {
  constructor(state) {
    this.state = state;
  }
  state;
  slots = [];
  price = new Float64Array(0);
  after = new Float64Array(0);
  deque = new Int32Array(0);
  /** null where no place was found. The members must have been taken out. */
  best(group, window) {
    const { members } = group;
    for (let k = 0; k < members.length; k++) if (!this.open(members, k, window)) return null;
    for (let k = members.length - 1; k >= 0; k--) if (!this.fill(members, k, window)) return null;
    return this.choose(group);
  }
  open(members, k, window) {
    const { state } = this;
    const member = members[k];
    const activity = state.model.activities[member.activity];
    const slot = this.slots[k] ??= new Slot();
    const centre = window.centres?.[k] ?? activity.home.start;
    let lo = Math.max(activity.earliest, centre - window.radius);
    let hi = Math.min(activity.latest, centre + window.radius);
    slot.limits = activity.lengths.map((minutes) => this.limitsFor(member, members, minutes));
    lo = Math.max(lo, Math.min(...slot.limits.map((l) => l.lo)));
    hi = Math.min(hi, Math.max(...slot.limits.map((l) => l.hi)));
    if (member.parent >= 0) {
      const parent = this.slots[member.parent];
      const waits = this.waitRange(members, member);
      lo = Math.max(lo, parent.lo + waits.lo);
      hi = Math.min(hi, parent.lo + parent.count - 1 + waits.hi);
    }
    slot.reset(lo, hi - lo + 1, activity.lengths.length);
    return hi >= lo;
  }
  /** Bounds on the start from activities that stay where they are. */
  limitsFor(member, members, minutes) {
    const { state } = this;
    const { model } = state;
    const activity = model.activities[member.activity];
    let lo = 0;
    let hi = Math.min(model.horizon - minutes, state.latestToFree(member.activity, minutes));
    for (const k of activity.links) {
      const link = model.links[k];
      const other = link.from === member.activity ? link.to : link.from;
      if (!state.placed[other] || members.some((m) => m.activity === other)) continue;
      if (link.from === member.activity) {
        const own = (link.fromEnd ? minutes : 0) + link.fromOffset;
        lo = Math.max(lo, state.momentTo(link) - link.greatest - own);
        hi = Math.min(hi, state.momentTo(link) - link.least - own);
      } else {
        const own = (link.toEnd ? minutes : 0) + link.toOffset;
        lo = Math.max(lo, state.momentFrom(link) + link.least - own);
        hi = Math.min(hi, state.momentFrom(link) + link.greatest - own);
      }
    }
    return { lo, hi };
  }
  /** Start of the member less that of its parent, over all lengths of both. */
  waitRange(members, member) {
    const { activities } = this.state.model;
    const parent = members[member.parent];
    let lo = FAR;
    let hi = -FAR;
    for (const p of activities[parent.activity].lengths) {
      for (const c of activities[member.activity].lengths) {
        const range = this.waits(member, p, c);
        lo = Math.min(lo, range.lo);
        hi = Math.max(hi, range.hi);
      }
    }
    return { lo, hi };
  }
  waits(member, parentMinutes, minutes) {
    let lo = -FAR;
    let hi = FAR;
    for (const k of member.links) {
      const link = this.state.model.links[k];
      const forward = link.to === member.activity;
      const base = forward ? linkBase(link, parentMinutes, minutes) : linkBase(link, minutes, parentMinutes);
      lo = Math.max(lo, forward ? base + link.least : -(base + link.greatest));
      hi = Math.min(hi, forward ? base + link.greatest : -(base + link.least));
    }
    return { lo, hi };
  }
  /** Prices all starts of one member, with the best of everything that hangs on it. */
  fill(members, k, window) {
    const { state } = this;
    const member = members[k];
    const activity = state.model.activities[member.activity];
    const slot = this.slots[k];
    const taker = this.takerAmong(members, member);
    let shape = -1;
    let found = false;
    for (let m = 0; m < activity.modes.length; m++) {
      const mode = activity.modes[m];
      if (mode.shape !== shape) {
        shape = mode.shape;
        this.priceStarts(mode.draws, slot.lo, slot.count);
      }
      if (mode.unit < 0) found = this.fillSpan(members, k, m, null, taker) || found;
      else found = this.fillGaps(members, k, m, window, taker) || found;
    }
    if (!found) return false;
    for (const c of member.children) if (c !== taker) this.joinChild(members, k, c);
    return true;
  }
  /** The child that takes this member off its unit, as a position in the group; -1 where there is none. */
  takerAmong(members, member) {
    const by = this.state.model.activities[member.activity].takenOffBy;
    if (by < 0) return -1;
    return member.children.find((c) => members[c].links.includes(by)) ?? -1;
  }
  /** Walks the gaps of a mode's unit that the member's window reaches. */
  fillGaps(members, k, m, window, taker) {
    const { state } = this;
    const slot = this.slots[k];
    const a = members[k].activity;
    const activity = state.model.activities[a];
    const mode = activity.modes[m];
    const queue = state.queues[mode.unit];
    const hi = slot.lo + slot.count - 1;
    let found = false;
    for (let g = Math.max(-1, state.position(mode.unit, slot.lo) - 1); g < queue.length; g++) {
      const prev = g < 0 ? -1 : queue[g];
      const next = queue[g + 1] ?? -1;
      const from = prev < 0 ? -FAR : this.freeBehind(mode.unit, g) + state.changeover(mode.unit, prev, a);
      if (from > hi) break;
      const to = next < 0 ? FAR : state.starts[next] - state.changeover(mode.unit, a, next);
      const pushedTo = next < 0 ? FAR : Math.min(state.starts[next] - 1 + mode.minutes, to + window.push);
      if (pushedTo - mode.minutes < slot.lo || pushedTo - mode.minutes < from) continue;
      const gap = { prev, next, from, to, pushedTo: window.push > 0 ? pushedTo : to };
      found = this.fillShifts(members, k, m, gap, taker) || found;
    }
    return found;
  }
  /** The parts of a gap in which the unit is open; where the plan itself is outside its shift, that start too. */
  fillShifts(members, k, m, gap, taker) {
    const activity = this.state.model.activities[members[k].activity];
    const mode = activity.modes[m];
    const { home } = activity;
    let found = false;
    for (const [opens, closes] of this.state.model.open[mode.unit]) {
      if (opens > gap.pushedTo) break;
      if (closes <= gap.from) continue;
      const open = {
        ...gap,
        from: Math.max(gap.from, opens),
        to: Math.min(gap.to, closes),
        pushedTo: Math.min(gap.pushedTo, closes)
      };
      found = this.fillSpan(members, k, m, open, taker) || found;
    }
    if (activity.homeOutsideShift && m === home.mode && home.start >= gap.from) {
      const only = { ...gap, from: home.start, pushedTo: Math.min(gap.pushedTo, home.start + mode.minutes) };
      found = this.fillSpan(members, k, m, only, taker) || found;
    }
    return found;
  }
  /** When the unit is free behind a queue position; a clash in the plan may keep it busy with an earlier activity. */
  freeBehind(unit, g) {
    const { state } = this;
    const queue = state.queues[unit];
    let free = state.freeAt[queue[g]];
    for (let i = g - 1; i >= 0 && i >= g - 2; i--) free = Math.max(free, state.freeAt[queue[i]]);
    return free;
  }
  fillSpan(members, k, m, gap, taker) {
    const { state } = this;
    const slot = this.slots[k];
    const a = members[k].activity;
    const activity = state.model.activities[a];
    const mode = activity.modes[m];
    const limits = slot.limits[mode.length];
    const freedAt = this.freedFromOutside(members, a, taker);
    if (gap && freedAt > gap.pushedTo) return false;
    const hi = slot.lo + slot.count - 1;
    const from = Math.max(slot.lo, limits.lo, gap?.from ?? -FAR);
    const to = Math.min(hi, limits.hi, (gap?.pushedTo ?? FAR) - mode.minutes);
    if (to < from) return false;
    const fixed = gap ? this.changeoverPrice(mode.unit, a, gap) : 0;
    const cleaning = gap && gap.next >= 0 ? state.cleaningBetween(mode.unit, a, gap.next) : null;
    const cleans = cleaning !== null && cleaning.draws.length > 0 ? cleaning : null;
    if (taker >= 0) this.joinTaker(members, k, taker, mode, from, to, gap, cleans);
    else if (cleans)
      this.priceCleaning(cleans, activity.cleanAfter + mode.minutes, from, to, freedAt + activity.cleanAfter);
    const job = { slot, a, m, mode, gap, fixed, priced: cleans !== null || taker >= 0, taker };
    return this.fillTimes(job, from, to);
  }
  /** Moment at which an activity outside the group frees the unit; -FAR where none does. */
  freedFromOutside(members, a, taker) {
    const { state } = this;
    const by = state.model.activities[a].takenOffBy;
    if (by < 0 || taker >= 0) return -FAR;
    const link = state.model.links[by];
    return state.placed[link.to] && !members.some((m) => m.activity === link.to) ? state.momentTo(link) : -FAR;
  }
  fillTimes(job, first, last) {
    const { slot, a, m, mode, gap, fixed, priced, taker } = job;
    const { home, weight, due } = this.state.model.activities[a];
    const { minuteMoved } = this.state.model.problem.prices;
    const costs = slot.costs[mode.length];
    const chosen = slot.chosen[mode.length];
    const perMinute = weight * minuteMoved;
    const atHome = this.state.moveCost(a, home.start, m);
    const latePrice = weight * LATE_PRICE;
    const unpushed = gap ? gap.to - mode.minutes : FAR;
    let found = false;
    for (let t = first; t <= last; t++) {
      const z = t - slot.lo;
      let cost = this.price[z] + fixed + atHome + perMinute * Math.abs(t - home.start);
      if (t + mode.minutes > due) cost += latePrice * (t + mode.minutes - due);
      if (t > unpushed) cost += PUSH_PRICE * (t - unpushed);
      if (priced) cost += this.after[t - first];
      if (t === home.start && m === home.mode) slot.homeCost = Math.min(slot.homeCost, cost);
      if (cost < costs[z]) {
        costs[z] = cost;
        chosen[z] = m;
        if (taker >= 0) this.slots[taker].arguments[mode.length][z] = this.takerArguments[t - first];
        found = true;
      }
    }
    return found;
  }
  /** Adds the best of a child to every start of its parent. */
  joinChild(members, k, c) {
    const slot = this.slots[k];
    const { lengths } = this.state.model.activities[members[k].activity];
    for (let d = 0; d < lengths.length; d++) {
      const costs = slot.costs[d];
      this.slots[c].openArguments(lengths.length, slot.count);
      const best = this.bestOfChild(members, k, c, d, slot.lo, slot.count, null, this.slots[c].arguments[d]);
      for (let z = 0; z < slot.count; z++) costs[z] += best[z];
    }
  }
  takerArguments = new Int32Array(0);
  /** Best of the child that takes the member off, within one gap: the unit must be free again before the gap ends. */
  joinTaker(members, k, c, mode, from, to, gap, cleaning) {
    const slot = this.slots[k];
    const activity = this.state.model.activities[members[k].activity];
    this.slots[c].openArguments(activity.lengths.length, slot.count);
    const count = to - from + 1;
    if (this.takerArguments.length < count) this.takerArguments = new Int32Array(2 * count);
    const link = this.state.model.links[activity.takenOffBy];
    const takeOff = { link, by: gap?.to ?? FAR, cleaning, cleanAfter: activity.cleanAfter };
    const best = this.bestOfChild(members, k, c, mode.length, from, count, takeOff, this.takerArguments);
    if (this.after.length < count) this.after = new Float64Array(2 * count);
    this.after.set(best.subarray(0, count));
  }
  bestBuffer = new Float64Array(0);
  /**
   * For `count` starts of the parent from `from` on: the least cost of the child within the waits, and in `args` the
   * child's length and start that give it.
   */
  bestOfChild(members, k, c, parentLength, from, count, takeOff, args) {
    const child = this.slots[c];
    const { activities } = this.state.model;
    const parentMinutes = activities[members[k].activity].lengths[parentLength];
    const { lengths } = activities[members[c].activity];
    if (this.bestBuffer.length < count) this.bestBuffer = new Float64Array(2 * count);
    const best = this.bestBuffer;
    best.fill(Infinity, 0, count);
    for (let d = 0; d < lengths.length; d++) {
      const range = this.waits(members[c], parentMinutes, lengths[d]);
      const costs = takeOff ? this.withCleaning(child, d, lengths[d], takeOff) : child.costs[d];
      const last = takeOff ? takeOff.by - takeOff.link.toOffset - (takeOff.link.toEnd ? lengths[d] : 0) : FAR;
      this.slide(costs, child, d, from, count, range, last, best, args);
    }
    return best;
  }
  /** Sliding-window minimum of the child's costs over [start + lo, min(start + hi, last)]. */
  slide(costs, child, d, from, count, range, last, best, args) {
    if (this.deque.length < child.count) this.deque = new Int32Array(2 * child.count);
    const { deque } = this;
    let head = 0;
    let tail = 0;
    let next = 0;
    for (let i = 0; i < count; i++) {
      const t = from + i;
      const upTo = Math.min(t + range.hi, last) - child.lo;
      for (; next <= upTo && next < child.count; next++) {
        const cost = costs[next];
        if (cost === Infinity) continue;
        while (tail > head && costs[deque[tail - 1]] >= cost) tail--;
        deque[tail++] = next;
      }
      const least = t + range.lo - child.lo;
      while (head < tail && deque[head] < least) head++;
      if (head < tail && costs[deque[head]] < best[i]) {
        best[i] = costs[deque[head]];
        args[i] = d * ARGUMENT_STRIDE + deque[head];
      }
    }
  }
  cleaningBuffer = new Float64Array(0);
  withCleaning(child, d, minutes, takeOff) {
    const { cleaning, link, cleanAfter } = takeOff;
    if (!cleaning) return child.costs[d];
    if (this.cleaningBuffer.length < child.count) this.cleaningBuffer = new Float64Array(2 * child.count);
    const sums = this.cleaningBuffer;
    const shift = link.toOffset + (link.toEnd ? minutes : 0) + cleanAfter;
    sums.fill(0, 0, child.count);
    this.addPrices(cleaning.draws, child.lo + shift, child.count, sums);
    const own = child.costs[d];
    for (let z = 0; z < child.count; z++) sums[z] += own[z];
    return sums;
  }
  /** Price of the cleaning behind the member for each start, into `after`. */
  priceCleaning(cleaning, shift, from, to, notBefore) {
    const count = to - from + 1;
    if (this.after.length < count) this.after = new Float64Array(2 * count);
    this.after.fill(0, 0, count);
    if (notBefore > from + shift) {
      const constant2 = this.priceAt(cleaning.draws, notBefore);
      this.after.fill(constant2, 0, count);
      return;
    }
    this.addPrices(cleaning.draws, from + shift, count, this.after);
  }
  /** What it costs to clean for the member in a gap, instead of for the activity that follows now. */
  changeoverPrice(unit, a, gap) {
    const { state } = this;
    if (gap.prev < 0) return 0;
    const now = gap.next < 0 ? null : state.cleaningBetween(unit, gap.prev, gap.next);
    const then = state.cleaningBetween(unit, gap.prev, a);
    if (now === then || (now?.draws.length ?? 0) === 0 && (then?.draws.length ?? 0) === 0) return 0;
    const at = state.freeAt[gap.prev] + state.model.activities[gap.prev].cleanAfter;
    const before = state.cost();
    if (now) state.draw(now.draws, at, -1);
    if (then) state.draw(then.draws, at, 1);
    const change = state.cost() - before;
    if (then) state.draw(then.draws, at, -1);
    if (now) state.draw(now.draws, at, 1);
    return change;
  }
  priceAt(draws, start) {
    const one = new Float64Array(1);
    this.addPrices(draws, start, 1, one);
    return one[0];
  }
  priceStarts(draws, lo, count) {
    if (this.price.length < count) this.price = new Float64Array(2 * count);
    this.price.fill(0, 0, count);
    this.addPrices(draws, lo, count, this.price);
  }
  /** Adds to `into` what the draws would add to the overload for each of `count` starts from `lo` on. */
  addPrices(draws, lo, count, into) {
    const { state } = this;
    for (const d of draws) {
      const price = state.prices[d.resource];
      const excess = state.excess[d.resource];
      const q = d.amount;
      let left = lo + d.offset;
      let right = left + d.minutes;
      let sum = 0;
      for (let t = Math.max(0, left); t < right && t < excess.length; t++) {
        const over = excess[t] + q;
        if (over > 0) sum += over < q ? over : q;
      }
      into[0] += price * sum;
      const end = Math.min(count, excess.length - right);
      let i = 1;
      for (; i < end; i++, left++, right++) {
        const entering = excess[right] + q;
        if (entering > 0) sum += entering < q ? entering : q;
        const leaving = excess[left] + q;
        if (leaving > 0) sum -= leaving < q ? leaving : q;
        into[i] += price * sum;
      }
      state.work += count + d.minutes;
    }
  }
  /** The cheapest combination; staying exactly where the planner's plan is doesn't pay the price of a moved batch. */
  choose(group) {
    const { state } = this;
    const root = this.slots[0];
    let cost = Infinity;
    let at = -1;
    let length = 0;
    for (let d = 0; d < root.costs.length; d++) {
      const costs = root.costs[d];
      for (let z = 0; z < root.count; z++) {
        if (costs[z] < cost) {
          cost = costs[z];
          at = z;
          length = d;
        }
      }
    }
    if (at < 0) return null;
    const placing = this.trace(group, at, length, cost);
    const price = state.isBatchMoved(group.batch) ? 0 : state.model.problem.prices.batchMoved;
    const home = this.homeCost(group);
    if (home <= cost + price) return this.homePlacing(group, home);
    return { ...placing, cost: cost + price };
  }
  homeCost(group) {
    let sum = 0;
    for (let k = 0; k < group.members.length; k++) {
      const member = group.members[k];
      const taker = this.takerAmong(group.members, member);
      if (taker >= 0 && !this.homeFreesInTime(member)) return Infinity;
      sum += taker >= 0 ? this.homeCostWithTaker(group, k, taker) : this.slots[k].homeCost;
    }
    return sum;
  }
  /** `homeCost` of a member with a taker holds the taker's best too, so it is worked out again by itself. */
  homeCostWithTaker(group, k, taker) {
    const { state } = this;
    const member = group.members[k];
    const { home, modes, cleanAfter } = state.model.activities[member.activity];
    const mode = modes[home.mode];
    if (this.slots[k].homeCost === Infinity) return Infinity;
    const own = this.priceAt(mode.draws, home.start) + state.placeCost(member.activity, home.start, home.mode);
    const gap = this.gapAt(mode.unit, home.start);
    if (!gap) return own;
    const cleaning = gap.next < 0 ? null : state.cleaningBetween(mode.unit, member.activity, gap.next);
    const moment = this.homeMomentOfTaker(group.members[taker].activity, member.activity);
    const clean = cleaning ? this.priceAt(cleaning.draws, Math.max(moment, home.start + mode.minutes) + cleanAfter) : 0;
    return own + clean + this.changeoverPrice(mode.unit, member.activity, gap);
  }
  homeMomentOfTaker(taker, taken) {
    const { activities, links } = this.state.model;
    const link = links[activities[taken].takenOffBy];
    const { home, modes } = activities[taker];
    return home.start + (link.toEnd ? modes[home.mode].minutes : 0) + link.toOffset;
  }
  homeFreesInTime(member) {
    const { state } = this;
    const { home, modes, takenOffBy } = state.model.activities[member.activity];
    const unit = modes[home.mode].unit;
    const gap = this.gapAt(unit, home.start);
    if (!gap || gap.next < 0) return true;
    const moment = this.homeMomentOfTaker(state.model.links[takenOffBy].to, member.activity);
    return moment <= state.starts[gap.next] - state.changeover(unit, member.activity, gap.next);
  }
  gapAt(unit, start) {
    if (unit < 0) return null;
    const queue = this.state.queues[unit];
    const at = this.state.position(unit, start);
    return { prev: queue[at - 1] ?? -1, next: queue[at] ?? -1, from: -FAR, to: FAR, pushedTo: FAR };
  }
  homePlacing(group, cost) {
    const homes = group.members.map((m) => this.state.model.activities[m.activity].home);
    return { cost, starts: homes.map((h) => h.start), modes: homes.map((h) => h.mode) };
  }
  trace(group, at, length, cost) {
    const starts = [];
    const modes = [];
    const places = [at];
    const lengths = [length];
    group.members.forEach((member, k) => {
      const slot = this.slots[k];
      const z = places[k];
      starts.push(slot.lo + z);
      modes.push(slot.chosen[lengths[k]][z]);
      for (const c of member.children) {
        const argument = this.slots[c].arguments[lengths[k]][z];
        lengths[c] = Math.floor(argument / ARGUMENT_STRIDE);
        places[c] = argument % ARGUMENT_STRIDE;
      }
    });
    return { cost, starts, modes };
  }
};
var ARGUMENT_STRIDE = 65536;
var Slot = class {
  lo = 0;
  count = 0;
  homeCost = Infinity;
  limits = [];
  costs = [];
  chosen = [];
  arguments = [];
  reset(lo, count, lengths) {
    this.lo = lo;
    this.count = Math.max(0, count);
    this.homeCost = Infinity;
    this.costs.length = lengths;
    for (let d = 0; d < lengths; d++) {
      if ((this.costs[d]?.length ?? 0) < this.count) {
        this.costs[d] = new Float64Array(2 * this.count);
        this.chosen[d] = new Int16Array(2 * this.count);
      }
      this.costs[d].fill(Infinity, 0, this.count);
    }
  }
  openArguments(lengths, count) {
    for (let d = 0; d < lengths; d++) {
      if ((this.arguments[d]?.length ?? 0) < count) {
        const grown = new Int32Array(2 * count);
        if (this.arguments[d]) grown.set(this.arguments[d]);
        this.arguments[d] = grown;
      }
    }
  }
};

// src/core/levelling/key.ts
var ORDER = ["process", "sharedWorse", "steamKg", "shared", "lateWorse", "late", "change"];
var SAME = 1e-6;
function isBetter(a, b) {
  for (const part of ORDER) {
    if (a[part] < b[part] - SAME) return true;
    if (a[part] > b[part] + SAME) return false;
  }
  return false;
}
function baselineOf(state) {
  const late = Float64Array.from(state.model.activities, (a) => Math.max(0, state.endOf(a.index) - a.due));
  return { shared: limitsOver(state).shared, late };
}
function limitsOver(state) {
  let process2 = 0;
  let steamKg = 0;
  let shared = 0;
  for (let r = 0; r < state.over.length; r++) {
    const over = state.over[r] < SAME ? 0 : state.over[r];
    const of = state.model.resourceClass[r];
    if (of === "process") process2 += over;
    else if (of === "steam") steamKg += over / 60;
    else shared += over / state.model.scale[r];
  }
  return { process: process2, steamKg, shared };
}
function keyOf(state, baseline) {
  const { process: process2, steamKg, shared } = limitsOver(state);
  let lateWorse = 0;
  for (const a of state.model.activities) {
    const late = state.endOf(a.index) - a.due;
    if (late > 0) lateWorse += Math.max(0, late - baseline.late[a.index]);
  }
  const sharedWorse = Math.max(0, shared - baseline.shared);
  return { process: process2, sharedWorse, steamKg, shared, lateWorse, late: state.late, change: state.change };
}

// src/core/levelling/ripple.ts
var Ripple = class {
  constructor(state) {
    this.state = state;
    const n = state.model.activities.length;
    this.next = new Int32Array(n);
    this.stamp = new Int32Array(n);
    this.later = Array.from({ length: n }, () => []);
    this.earlier = Array.from({ length: n }, () => []);
  }
  state;
  /** Give up when more activities than this would move. */
  greatest = 60;
  next;
  stamp;
  run = 0;
  later;
  earlier;
  ordered = [];
  list = [];
  stack = [];
  /** Start of an activity after the push that was last worked out. */
  startAfter(a) {
    return this.stamp[a] === this.run ? this.next[a] : this.state.starts[a];
  }
  /** Keeps `before` and `after` in order until `clearOrders`. */
  order(before, after, wait) {
    this.later[before].push({ other: after, wait });
    this.earlier[after].push({ other: before, wait });
    this.ordered.push(before, after);
  }
  clearOrders() {
    for (const a of this.ordered) {
      this.later[a].length = 0;
      this.earlier[a].length = 0;
    }
    this.ordered = [];
  }
  /** Where everything would be if `a` moved by `minutes`; null if something can't give way. */
  push(a, minutes, pushLater = minutes > 0) {
    this.run++;
    this.list = [];
    this.stack = [];
    this.set(a, this.state.starts[a] + minutes);
    let steps = 0;
    while (this.stack.length > 0) {
      if (this.list.length > this.greatest || ++steps > 20 * this.greatest) return null;
      const b = this.stack.pop();
      if (!this.settle(b, pushLater)) return null;
      if (pushLater) this.pushLater(b);
      else this.pushEarlier(b);
    }
    if (!this.list.every((b) => this.keepsShift(b))) return null;
    this.state.work += 8 * this.list.length;
    return { list: this.list, starts: this.list.map((b) => this.next[b]) };
  }
  set(a, start) {
    if (this.stamp[a] !== this.run) {
      this.stamp[a] = this.run;
      this.list.push(a);
    }
    this.next[a] = start;
    this.stack.push(a);
  }
  /** Onto open time and within its own bounds. */
  settle(a, later) {
    const activity = this.state.model.activities[a];
    if (!activity.movable || !this.state.placed[a]) return false;
    const start = this.state.fit(a, this.next[a], later);
    if (start < activity.earliest || start > activity.latest) return false;
    this.next[a] = start;
    return start + this.state.mode(a).minutes <= this.state.model.horizon;
  }
  /** Units that are taken off later than an activity's end must be free within the shift. */
  keepsShift(a) {
    const { state } = this;
    const activity = state.model.activities[a];
    if (activity.takenOffBy >= 0 && this.freeAfter(a) > state.shiftEnd(a, this.next[a])) return false;
    return activity.frees.every(
      (freed) => !state.placed[freed] || this.freeAfter(freed) <= state.shiftEnd(freed, this.startAfter(freed))
    );
  }
  atLeast(a, start) {
    if (this.startAfter(a) < start) this.set(a, start);
  }
  atMost(a, start) {
    if (this.startAfter(a) > start) this.set(a, start);
  }
  pushLater(a) {
    const { state } = this;
    const { links } = state.model;
    const start = this.next[a];
    const activity = state.model.activities[a];
    for (const k of activity.links) {
      const link = links[k];
      if (!state.placed[link.from] || !state.placed[link.to]) continue;
      const base = state.linkBaseNow(link);
      if (link.from === a) this.atLeast(link.to, start + base + link.least);
      else if (link.greatest < FAR) this.atLeast(link.from, start - base - link.greatest);
    }
    for (const o of this.later[a]) this.atLeast(o.other, start + o.wait);
    this.clearUnitBehind(a);
    for (const freed of activity.frees) if (state.placed[freed]) this.clearUnitBehind(freed);
  }
  /** The unit must be free of `a`, and clean, before the activity behind it starts. */
  clearUnitBehind(a) {
    const { state } = this;
    const unit = state.unitOf(a);
    if (unit < 0) return;
    const next = state.queues[unit][state.positionOf(a) + 1];
    if (next === void 0) return;
    this.atLeast(next, this.freeAfter(a) + state.changeover(unit, a, next));
  }
  freeAfter(a) {
    const { state } = this;
    const end = this.startAfter(a) + state.mode(a).minutes;
    const by = state.model.activities[a].takenOffBy;
    if (by < 0) return end;
    const link = state.model.links[by];
    if (!state.placed[link.to]) return Math.max(end, state.freeAt[a]);
    return Math.max(end, this.startAfter(link.to) + (state.momentTo(link) - state.starts[link.to]));
  }
  pushEarlier(a) {
    const { state } = this;
    const { links } = state.model;
    const start = this.next[a];
    for (const k of state.model.activities[a].links) {
      const link = links[k];
      if (!state.placed[link.from] || !state.placed[link.to]) continue;
      const base = state.linkBaseNow(link);
      if (link.to === a) this.atMost(link.from, start - base - link.least);
      else if (link.greatest < FAR) this.atMost(link.to, start + base + link.greatest);
    }
    for (const o of this.earlier[a]) this.atMost(o.other, start - o.wait);
    this.clearUnitBefore(a, start);
  }
  clearUnitBefore(a, start) {
    const { state } = this;
    const unit = state.unitOf(a);
    if (unit < 0) return;
    const at = state.positionOf(a);
    const prev = at > 0 ? state.queues[unit][at - 1] : void 0;
    if (prev === void 0) return;
    const free = start - state.changeover(unit, prev, a);
    this.atMost(prev, free - state.mode(prev).minutes);
    const by = state.model.activities[prev].takenOffBy;
    if (by >= 0) this.takeOffBy(state.model.links[by], free);
  }
  takeOffBy(link, free) {
    const { state } = this;
    if (!state.placed[link.to]) return;
    this.atMost(link.to, free - (state.momentTo(link) - state.starts[link.to]));
  }
};

// src/core/levelling/search.ts
var DEFAULT_SETTINGS = {
  hot: 30,
  cold: 1,
  overPrice: 100,
  pullShare: 0.4,
  rippleShare: 0.3,
  pushShare: 0.6
};
var OVER2 = 1e-6;
var OSCILLATION = 50;
var DEAREST_OVER = 2e4;
var Search = class {
  constructor(model, random, settings = DEFAULT_SETTINGS) {
    this.model = model;
    this.random = random;
    this.settings = settings;
    this.state = new State(model);
    this.state.load(
      model.activities.map((a) => a.home.start),
      model.activities.map((a) => a.home.mode)
    );
    this.kernel = new Kernel(this.state);
    this.ripple = new Ripple(this.state);
    this.movable = model.activities.filter((a) => a.movable).map((a) => a.index);
    this.baseline = baselineOf(this.state);
    for (let r = 0; r < model.scale.length; r++) this.state.prices[r] = settings.overPrice / model.scale[r];
    this.temperature = settings.hot;
    this.best = this.snapshot(keyOf(this.state, this.baseline));
    this.current = this.state.cost();
  }
  model;
  random;
  settings;
  state;
  baseline;
  best;
  iterations = 0;
  kernel;
  ripple;
  movable;
  current;
  temperature;
  pullWork = 0;
  progress = 0;
  /** Nothing to do: nothing may move, or nothing is over or late. */
  get idle() {
    if (this.movable.length === 0) return true;
    const { process: process2, steamKg, shared } = limitsOver(this.state);
    return process2 + steamKg + shared <= OVER2 && this.state.late === 0 && this.state.change === 0;
  }
  /** A first answer: what is over is flattened from left to right. */
  flatten() {
    pullAndFlatten(this.state, this.ripple, this.random, { pull: null, budget: 2e4, noise: 0 });
    this.accept();
  }
  /** A start from nothing: all groups are taken out and put back in the plan's order at a stiff price of overload. */
  construct() {
    const { state } = this;
    const prices = state.prices.slice();
    for (let r = 0; r < prices.length; r++) state.prices[r] = 3 * this.settings.overPrice / this.model.scale[r];
    const groups = this.model.groups.map((_, i) => i);
    const startOf2 = (g) => this.model.activities[this.model.groups[g].members[0].activity].home.start;
    groups.sort((a, b) => startOf2(a) - startOf2(b) || a - b);
    const kept = this.takeOut(groups);
    let done = 0;
    while (done < groups.length && this.putBack(groups[done], WIDENING)) done++;
    const ok = done === groups.length;
    if (!ok) {
      for (let i = done - 1; i >= 0; i--) this.removeGroup(groups[i]);
      this.restore(groups, kept);
    }
    state.prices.set(prices);
    this.accept();
    return ok;
  }
  /** One step; `progress` from 0 to 1 sets the temperature. */
  step(progress) {
    this.progress = progress;
    this.temperature = this.settings.hot * Math.pow(this.settings.cold / this.settings.hot, progress);
    this.iterations++;
    if (this.iterations % OSCILLATION === 0) this.oscillate();
    if (this.iterations % 4096 === 0) this.resync();
    if (this.pullWork <= this.settings.pullShare * this.state.work) this.pullStep();
    else if (this.random() < this.settings.rippleShare) this.rippleStep();
    else this.rebuildStep();
  }
  /** Goes on from another plan. */
  restart(from) {
    const { state } = this;
    for (const a of this.movable) state.remove(a);
    for (const a of this.movable) state.insert(a, from.starts[a], from.modes[a]);
    this.resync();
  }
  /** Takes over a plan that was found elsewhere, if it is better. */
  offer(plan) {
    const before = { starts: this.state.starts.slice(), modes: this.state.modes.slice() };
    this.restart(plan);
    const key = keyOf(this.state, this.baseline);
    const better = isBetter(key, this.best.key);
    if (better) this.best = this.snapshot(key);
    else this.restart(before);
    return better;
  }
  resync() {
    this.state.resync();
    this.current = this.state.cost();
  }
  snapshot(key) {
    return { starts: this.state.starts.slice(), modes: this.state.modes.slice(), key };
  }
  oscillate() {
    const { state, model, settings } = this;
    const least = settings.overPrice / 3 * (this.progress > 0.85 ? 10 : 1);
    for (let r = 0; r < state.prices.length; r++) {
      const price = state.prices[r] * model.scale[r];
      if (state.over[r] > OVER2) {
        if (price < DEAREST_OVER) state.prices[r] *= 1.1;
      } else if (price > least) state.prices[r] *= 0.92;
    }
    this.current = this.state.cost();
  }
  /** True where the changed state is kept; then it may be a new incumbent. */
  judge() {
    const cost = this.state.cost();
    if (cost > this.current - this.temperature * Math.log(1 - this.random() + 1e-300)) return false;
    this.accept();
    return true;
  }
  accept() {
    this.current = this.state.cost();
    if (!this.mayBeBetter()) return;
    const key = keyOf(this.state, this.baseline);
    if (isBetter(key, this.best.key)) this.best = this.snapshot(key);
  }
  /** A cheap test before the whole key is worked out. */
  mayBeBetter() {
    const { process: process2, steamKg, shared } = limitsOver(this.state);
    const { key } = this.best;
    if (process2 !== key.process) return process2 < key.process;
    if (Math.abs(steamKg - key.steamKg) > OVER2) return steamKg < key.steamKg || key.sharedWorse > 0;
    if (Math.abs(shared - key.shared) > OVER2) return shared < key.shared;
    if (key.lateWorse > 0) return true;
    return this.state.change + LATE_PRICE * this.state.late < key.change + LATE_PRICE * key.late - OVER2;
  }
  pullStep() {
    const { state, random } = this;
    const before = state.work;
    const middle = random() < 0.6 ? state.starts[this.dearest(4)] : state.starts[this.any()];
    const pull = { middle, within: 20 + wholeBelow(random, random() * 500 + 1), share: 0.3 + 0.7 * random() };
    const log = pullAndFlatten(state, this.ripple, random, { pull, budget: 60, noise: 0.8 * random() });
    if (!this.judge()) takeBack(state, log);
    this.pullWork += state.work - before;
  }
  rippleStep() {
    const { state, random } = this;
    const pick = random();
    const a = pick < 0.5 ? this.dearest(3) : pick < 0.8 ? this.atSomethingOver() ?? this.any() : this.any();
    const push = this.ripple.push(a, this.someShift(a));
    if (!push) return;
    const log = [{ list: push.list, starts: push.list.map((b) => state.starts[b]) }];
    state.shift(push.list, push.starts);
    if (!this.judge()) takeBack(state, log);
  }
  someShift(a) {
    const { random } = this;
    const home = this.model.activities[a].home.start - this.state.starts[a];
    if (home !== 0 && random() < 0.6) {
      if (random() < 0.5) return home;
      return Math.trunc(home * random()) || Math.sign(home);
    }
    const by = 1 + Math.floor(random() * random() * 40);
    return random() < 0.5 ? -by : by;
  }
  rebuildStep() {
    const groups = this.chooseGroups();
    if (groups.length === 0) return;
    const kept = this.takeOut(groups);
    const order = this.orderOf(groups);
    const undo = [];
    const push = this.random() < this.settings.pushShare;
    const radius = this.someRadius();
    let ok = true;
    for (const g of order) {
      if (!this.rebuild(g, radius, push, undo, kept.get(g))) {
        ok = false;
        break;
      }
    }
    if (ok && this.judge()) return;
    this.undo(undo);
    this.restore(groups, kept);
  }
  rebuild(g, radius, push, undo, kept) {
    if (push && this.random() < 0.7 && this.putBackPushing(g, radius, undo)) return true;
    const widening = WIDENING.filter((r) => r > radius);
    if (this.putBack(g, [radius, ...widening]) || this.putBackAround(g, kept.starts)) {
      undo.push({ group: g, log: null });
      return true;
    }
    return false;
  }
  /** Into a place that overlaps what follows, which is then pushed on. */
  putBackPushing(g, radius, undo) {
    const group = this.model.groups[g];
    const push = 10 + Math.floor(this.random() * this.random() * 130);
    const placing = this.kernel.best(group, { radius, centres: null, push });
    if (!placing) return false;
    this.place(g, placing);
    const log = [];
    const greatest = this.ripple.greatest;
    this.ripple.greatest = 150;
    let ok = true;
    for (const { activity } of group.members) {
      const pushed = this.ripple.push(activity, 0, true);
      if (!pushed) {
        ok = false;
        break;
      }
      const before = pushed.list.map((a) => this.state.starts[a]);
      if (pushed.list.length === 1 && before[0] === pushed.starts[0]) continue;
      log.push({ list: pushed.list, starts: before });
      this.state.shift(pushed.list, pushed.starts);
    }
    this.ripple.greatest = greatest;
    if (ok) {
      undo.push({ group: g, log });
      return true;
    }
    takeBack(this.state, log);
    this.removeGroup(g);
    return false;
  }
  putBack(g, radii) {
    for (const radius of radii) {
      const placing = this.kernel.best(this.model.groups[g], { radius, centres: null, push: 0 });
      if (!placing) continue;
      this.place(g, placing);
      return true;
    }
    return false;
  }
  putBackAround(g, centres) {
    const placing = this.kernel.best(this.model.groups[g], { radius: 360, centres, push: 0 });
    if (!placing) return false;
    this.place(g, placing);
    return true;
  }
  place(g, placing) {
    this.model.groups[g].members.forEach((m, k) => {
      this.state.insert(m.activity, placing.starts[k], placing.modes[k]);
    });
  }
  removeGroup(g) {
    const { members } = this.model.groups[g];
    for (let k = members.length - 1; k >= 0; k--) this.state.remove(members[k].activity);
  }
  takeOut(groups) {
    const kept = /* @__PURE__ */ new Map();
    for (const g of groups) {
      const activities = this.model.groups[g].members.map((m) => m.activity);
      kept.set(g, {
        starts: activities.map((a) => this.state.starts[a]),
        modes: activities.map((a) => this.state.modes[a])
      });
    }
    for (const g of groups) this.removeGroup(g);
    return kept;
  }
  restore(groups, kept) {
    for (const g of groups) {
      const { starts, modes } = kept.get(g);
      this.place(g, { cost: 0, starts, modes });
    }
  }
  /** Strictly in reverse order: a push may have moved what was put back before it. */
  undo(undo) {
    for (let i = undo.length - 1; i >= 0; i--) {
      const { group, log } = undo[i];
      if (log) takeBack(this.state, log);
      this.removeGroup(group);
    }
  }
  orderOf(groups) {
    const order = [...groups];
    const pick = this.random();
    if (pick < 0.5) shuffle(this.random, order);
    else {
      const rank = pick < 0.75 ? this.planned : this.due;
      order.sort((a, b) => rank(a) - rank(b) || a - b);
    }
    return order;
  }
  planned = (g) => this.model.activities[this.model.groups[g].members[0].activity].home.start;
  due = (g) => Math.min(...this.model.groups[g].members.map((m) => this.model.activities[m.activity].due));
  someRadius() {
    const { random } = this;
    if (random() < 0.5) return 90;
    if (random() < 0.6) return 240;
    return random() < 0.8 ? 600 : 1440;
  }
  any() {
    return this.movable[wholeBelow(this.random, this.movable.length)];
  }
  /** Of a few at random, the activity whose place costs most. */
  dearest(tries) {
    const { state } = this;
    let chosen = -1;
    let most = -1;
    for (let i = 0; i < tries; i++) {
      const a = this.any();
      const cost = state.placeCost(a, state.starts[a], state.modes[a]);
      if (cost > most) {
        most = cost;
        chosen = a;
      }
    }
    return chosen;
  }
  atSomethingOver() {
    const over = this.somethingOver();
    if (!over) return null;
    const active = activeDraws(this.state, over.resource, over.minute).map((d) => d.activity);
    const movable = active.filter((a) => this.model.activities[a].movable);
    return movable.length === 0 ? null : movable[wholeBelow(this.random, movable.length)];
  }
  somethingOver() {
    const { state, random } = this;
    const resources = [];
    for (let r = 0; r < state.over.length; r++) if (state.over[r] > OVER2) resources.push(r);
    if (resources.length === 0) return null;
    const resource = resources[wholeBelow(random, resources.length)];
    const excess = state.excess[resource];
    const from = wholeBelow(random, this.model.horizon);
    for (let i = 0; i < this.model.horizon; i++) {
      const minute = (from + i) % this.model.horizon;
      if (excess[minute] > OVER2) return { minute, resource };
    }
    return null;
  }
  /** Which groups to take out: around something over, around a dear place, around any activity, or a run on a unit. */
  chooseGroups() {
    const { random, state } = this;
    const count = 2 + wholeBelow(random, 5) + (random() < 0.1 ? wholeBelow(random, 8) : 0);
    const pick = random();
    const chosen = /* @__PURE__ */ new Set();
    const over = pick < 0.7 ? this.somethingOver() : null;
    if (over) {
      const active = activeDraws(state, over.resource, over.minute).map((d) => d.activity);
      shuffle(random, active);
      this.addGroups(chosen, active, 1 + wholeBelow(random, 3));
      this.addAround(chosen, over.minute, 60 + wholeBelow(random, 120), count);
    } else if (pick < 0.55) {
      const a = this.dearest(4);
      this.addGroups(chosen, [a], 1);
      const inside = wholeBelow(random, state.mode(a).minutes + 1);
      const at = (random() < 0.5 ? this.model.activities[a].home.start : state.starts[a]) + inside;
      this.addAround(chosen, at, 20 + wholeBelow(random, 100), count);
    } else if (pick < 0.8) {
      const a = this.any();
      this.addGroups(chosen, [a], 1);
      const at = state.starts[a] + wholeBelow(random, state.mode(a).minutes + 1);
      this.addAround(chosen, at, 30 + wholeBelow(random, 150), count);
    } else {
      const queue = state.queues[wholeBelow(random, state.queues.length)];
      const from = wholeBelow(random, queue.length + 1);
      this.addGroups(chosen, queue.slice(from, from + 5), Math.min(count, 5));
    }
    return [...chosen];
  }
  addAround(chosen, minute, within, count) {
    const around = activitiesAround(this.state, minute, within);
    shuffle(this.random, around);
    this.addGroups(chosen, around, count);
  }
  addGroups(chosen, activities, upTo) {
    for (const a of activities) {
      if (chosen.size >= upTo) return;
      const { group } = this.model.activities[a];
      if (group >= 0) chosen.add(group);
    }
  }
};
var WIDENING = [90, 270, 810, 1440];

// src/core/levelling/evaluate.ts
function judge(problem, plan) {
  const excess = excessOf(problem, plan);
  const sums = { steam: 0, process: 0, shared: 0 };
  problem.resources.forEach((r, i) => {
    sums[r.class] += overOf(excess[i]) / divisorOf(r, problem.horizonMin);
  });
  const lateMin = problem.activities.map((a, i) => Math.max(0, endOf(a, plan, i) - (a.due ?? Infinity)));
  return {
    excess,
    processOver: sums.process,
    sharedOver: sums.shared,
    steamKg: sums.steam,
    lateMin: lateMin.reduce((x, y) => x + y, 0),
    late: lateMin.map((l, i) => l * problem.activities[i].weight),
    change: changeOf(problem, plan),
    broken: brokenMinutes(problem, plan)
  };
}
function modeIn(activity, plan, index) {
  const mode = activity.modes.find((m) => m.unitId === plan.units[index]);
  return mode ?? { unitId: plan.units[index] ?? "", minutes: 0, uses: [] };
}
function placedUses(problem, plan) {
  const own = problem.activities.flatMap(
    (a, i) => modeIn(a, plan, i).uses.map((u) => ({
      ...u,
      activity: i,
      start: plan.starts[i] + u.offsetMin,
      isCleaning: false
    }))
  );
  const cleaning = changeovers(problem, plan).flatMap(
    (c) => c.uses.map((u) => ({ ...u, activity: c.after, start: c.from + u.offsetMin, isCleaning: true }))
  );
  return [...own, ...cleaning];
}
function changeovers(problem, plan) {
  const rules = new Map(
    problem.cleaning.flatMap(
      (c) => c.unitIds.map((u) => [JSON.stringify([u, c.fromFamilyId, c.toFamilyId]), c])
    )
  );
  return sequences(problem, plan).flatMap(
    ({ unitId: unitId3, order }) => order.slice(1).flatMap((before, k) => {
      const after = order[k];
      const first = problem.activities[after];
      const second = problem.activities[before];
      const rule = rules.get(JSON.stringify([unitId3, first.familyId, second.familyId]));
      if (!rule) return [];
      const from = freeAt(problem, plan, after) + first.cleanAfterMin;
      return [{ unitId: unitId3, after, before, from, minutes: rule.minutes, uses: rule.uses }];
    })
  );
}
function sequences(problem, plan) {
  const byUnit = new Map(problem.units.map((u) => [u.id, []]));
  problem.activities.forEach((_, i) => byUnit.get(plan.units[i])?.push(i));
  const start = (i) => plan.starts[i];
  return [...byUnit].map(([unitId3, order]) => ({ unitId: unitId3, order: order.sort((a, b) => start(a) - start(b) || a - b) }));
}
function freeAt(problem, plan, index) {
  const activity = problem.activities[index];
  const end = endOf(activity, plan, index);
  const link = problem.links.find((l) => l.id === activity.takenOffBy);
  return link ? Math.max(end, momentOf2(problem, plan, link.to)) : end;
}
function momentOf2(problem, plan, end) {
  const index = indexById(problem).get(end.activityId);
  const activity = problem.activities[index];
  const start = plan.starts[index];
  return (end.anchor === "end" ? endOf(activity, plan, index) : start) + end.offsetMin;
}
var indices = /* @__PURE__ */ new WeakMap();
function indexById(problem) {
  let index = indices.get(problem);
  if (!index) {
    index = new Map(problem.activities.map((a, i) => [a.id, i]));
    indices.set(problem, index);
  }
  return index;
}
function endOf(activity, plan, index) {
  return plan.starts[index] + modeIn(activity, plan, index).minutes;
}
function excessOf(problem, plan) {
  const at = new Map(problem.resources.map((r, i) => [r.id, i]));
  const excess = problem.resources.map((r) => toMinutes(r.capacity, problem.horizonMin).map((v) => -v));
  for (const use of placedUses(problem, plan)) {
    const load = excess[at.get(use.resourceId) ?? -1];
    if (!load) continue;
    const to = Math.min(problem.horizonMin, use.start + use.minutes);
    for (let t = Math.max(0, use.start); t < to; t++) load[t] = load[t] + use.amount;
  }
  return excess;
}
function overOf(excess) {
  let sum = 0;
  for (const e of excess) if (e > 1e-6) sum += e;
  return sum;
}
function divisorOf(resource, horizonMin) {
  if (resource.class === "steam") return 60;
  if (resource.class === "process") return 1;
  return Math.max(1e-3, ...toMinutes(resource.capacity, horizonMin));
}
function changeOf(problem, plan) {
  const { batchMoved, minuteMoved, unitChanged } = problem.prices;
  const moved = /* @__PURE__ */ new Set();
  let sum = 0;
  problem.activities.forEach((a, i) => {
    const minutes = Math.abs(plan.starts[i] - a.plan.start);
    const changed = plan.units[i] !== a.plan.unitId;
    sum += a.weight * (minuteMoved * minutes + (changed ? unitChanged : 0));
    if (minutes > 0 || changed) moved.add(a.batchId);
  });
  return sum + batchMoved * moved.size;
}
function brokenMinutes(problem, plan) {
  let sum = 0;
  problem.activities.forEach((a, i) => {
    const start = plan.starts[i];
    sum += Math.max(0, a.earliestStart - start) + Math.max(0, start - a.latestStart);
    if (!a.movable && (start !== a.plan.start || plan.units[i] !== a.plan.unitId)) sum += 1;
    if (!a.modes.some((m) => m.unitId === plan.units[i])) sum += 1;
    sum += outsideShift(problem, plan, i);
  });
  for (const link of problem.links) {
    const wait = momentOf2(problem, plan, link.to) - momentOf2(problem, plan, link.from);
    sum += Math.max(0, link.leastMin - wait) + Math.max(0, wait - (link.greatestMin ?? Infinity));
  }
  return sum + clashMinutes(problem, plan);
}
function outsideShift(problem, plan, i) {
  const unit = problem.units.find((u) => u.id === plan.units[i]);
  const start = plan.starts[i];
  const end = freeAt(problem, plan, i);
  if (!unit) return 0;
  const within = unit.open.map((o) => Math.max(0, o.from - start) + Math.max(0, end - o.to));
  return Math.min(end - start, ...within);
}
function clashMinutes(problem, plan) {
  const cleaning = new Map(changeovers(problem, plan).map((c) => [c.after, c]));
  let sum = 0;
  for (const { order } of sequences(problem, plan)) {
    let busy = -Infinity;
    order.forEach((i, k) => {
      if (k > 0) sum += Math.max(0, busy - plan.starts[i]);
      const clean = cleaning.get(i);
      const free = clean ? clean.from + clean.minutes : freeAt(problem, plan, i);
      busy = Math.max(busy, free);
    });
  }
  return sum;
}

// scripts/bench/.try.tmp.ts
var cpu = () => {
  const u = process.cpuUsage();
  return (u.user + u.system) / 1e3;
};
var [src = "proto", size = "w40", seeds = "1", ms = "1000", bm = "0"] = process.argv.slice(2);
var P = await loadPrototype("/work/shared/prototype/levelling");
for (const seed of seeds.split(",").map(Number)) {
  const I = src === "proto" ? P.generate({ ...P.presets[size], seed }) : null;
  const w = src === "demo" ? JSON.parse(readFileSync("/tmp/demo.json", "utf8")) : I ? toWeek(I) : generateWeek(WEEKS[size], seed);
  const p = toProblem(w, { prices: { batchMoved: +bm }, greatestShiftMin: I ? 2e4 : 720 });
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
    units: [...s.best.modes].map((mm, i) => p.activities[i].modes[mm].unitId)
  };
  const j = judge(p, plan);
  console.log(
    src,
    size,
    seed,
    "acts",
    p.activities.length,
    "before kg",
    j0.steamKg.toFixed(0),
    "pr",
    j0.processOver,
    "sh",
    j0.sharedOver.toFixed(1),
    "broken",
    j0.broken,
    "late",
    j0.lateMin,
    "| model",
    (t1 - t0).toFixed(0),
    "flat",
    (t2 - t1).toFixed(0),
    fl.steamKg.toFixed(0),
    fl.change.toFixed(0),
    fl.lateWorse,
    "| its",
    s.iterations,
    "zero at",
    zero.toFixed(0),
    JSON.stringify(k),
    "| judged",
    j.steamKg.toFixed(2),
    j.processOver,
    j.sharedOver.toFixed(3),
    j.lateMin,
    j.change,
    "broken",
    j.broken
  );
  if (I) {
    const S = { s: Int32Array.from(plan.starts), u: Int32Array.from(plan.units, (u) => Number(u.slice(1))) };
    const e = P.evaluate(I, S);
    console.log("   ours by their evaluator", e.over.toFixed(2), e.tard, e.disp, e.unitMoves, e.viol.length);
    const a = cpu();
    const real = performance.now.bind(performance);
    performance.now = cpu;
    const D = P.lns(I, { ms: +ms, seed: 1, pf: 0.4, pen0: 100, T0: 30, T1: 1, ripplePct: 0.3, push: 0.6 });
    performance.now = real;
    const d = P.evaluate(I, D.best);
    console.log(
      "   D",
      d.over.toFixed(2),
      d.tard,
      d.disp,
      d.unitMoves,
      d.viol.length,
      "cpu",
      (cpu() - a).toFixed(0),
      "iters",
      D.stats.iters,
      "pf",
      D.stats.pf,
      "rip",
      D.stats.rip,
      "push",
      D.stats.push
    );
  }
}

/** A split order as activities and the links between them, not yet placed. */
import type { Activity, Link, LinkEnd, LinkRule, Mode, ProcessDataRef, Stage } from '../plant/activity';
import type { BatchSplit, LoadSplit, OrderSplit, RunSplit } from './split';

/** Longest waits that a product's released process data allows, first container to steam on. [min] */
export interface ReleasedWaits {
  readonly sinceClosingMin: number;
  /** null: the initial temperature sets no wait of its own. */
  readonly initialTemperatureMin: number | null;
  /** Document and issue. */
  readonly source: string;
}

export interface NetInput {
  readonly id: string;
  /** Short number that people call the order by, such as "A12". */
  readonly code: string;
  readonly title: string;
  readonly productId: string;
  readonly familyId: string;
  /** Minutes of the week. */
  readonly earliest: number;
  readonly latestStart: number | null;
  readonly due: number;
  readonly weight: number;
  /** From a load's start to steam on. [min] */
  readonly steamOnMin: number;
  readonly processData: ProcessDataRef | null;
  readonly waits: ReleasedWaits | null;
  /** How a run, batch or load runs on every eligible unit. */
  readonly modesOf: (part: RunSplit | BatchSplit | LoadSplit) => readonly Mode[];
}

export interface OrderNet {
  readonly activities: readonly Activity[];
  readonly links: readonly Link[];
}

/** The first pieces come out of a running machine so long after its start. From memory. [min] */
const THROUGH_MIN = 10;
/** What comes out of a machine goes on within so long; into a kettle, within so long. From memory. [min] */
const PASSED_ON_MIN = 30;
const INTO_KETTLE_MIN = 120;
/** A cooked batch stands in its kettle at most so long before the filler takes it. Common practice, no source. [min] */
const COOKED_STANDS_MIN = 60;

const LETTERS: Readonly<Record<Stage, string>> = {
  prepare: 'P',
  blanch: 'B',
  cook: 'K',
  fill: 'F',
  retort: '',
  pasteurise: 'T',
  other: 'X',
};

const end = (activityId: string, anchor: LinkEnd['anchor'], offsetMin: number): LinkEnd => ({
  activityId,
  anchor,
  offsetMin,
});

function flow(id: string, from: LinkEnd, to: LinkEnd, greatestMin: number | null): Link {
  return { id, from, to, leastMin: 0, greatestMin, rule: 'flow', greatestBreach: 'time', source: null };
}

function wait(id: string, from: LinkEnd, to: LinkEnd, greatestMin: number, rule: LinkRule, source: string): Link {
  return { id, from, to, leastMin: 0, greatestMin, rule, greatestBreach: 'process', source };
}

interface Made<Part> {
  readonly activity: Activity;
  readonly part: Part;
}

/** Activities of a split order, and links: product flows, kettles taken off, and the process data's longest waits. */
export function orderNet(input: NetInput, split: OrderSplit, batchStage: Stage, loadStage: Stage): OrderNet {
  const { runs, batches, loads } = split;
  const fillIndex = runs.findIndex(({ stage }) => stage === 'fill');
  const first = runs[0]?.stage === 'fill' && batches.length > 0 ? batchStage : (runs[0]?.stage ?? 'fill');
  const last = loads.length > 0 ? loadStage : (runs.at(-1)?.stage ?? 'fill');
  const made = <Part extends RunSplit | BatchSplit | LoadSplit>(part: Part, stage: Stage, code: string, own = '') => ({
    part,
    activity: activityOf(input, part, { stage, code, own, isFirst: stage === first, isLast: stage === last }),
  });
  const names = runs.map(({ stage }, i) => LETTERS[stage] + (runs.findIndex((r) => r.stage === stage) < i ? i : ''));
  const madeRuns = runs.map((run, i) => made(run, run.stage, `${input.code}${names[i]}`));
  const cooks = batches.map((batch, k) => made(batch, batchStage, `${input.code}${LETTERS.cook}${k + 1}`));
  const cooked = loads.map((load, i) => made(load, loadStage, `${input.code}-${i + 1}`, `-${i + 1}`));
  const fill = madeRuns[fillIndex];
  if (!fill) return { activities: [], links: [] };
  const before = madeRuns.slice(0, fillIndex);
  const after = madeRuns.slice(fillIndex + 1);
  return {
    activities: [...before, ...cooks, fill, ...cooked, ...after].map(({ activity }) => activity),
    links: [
      ...passedOn(before, cooks, fill),
      ...cooks.flatMap((cook) => kettleLinks(cook, fill)),
      ...cooked.flatMap((load) => loadLinks(input, load, fill)),
      ...after.map(({ activity }) =>
        flow(`${activity.id}-in`, end(fill.activity.id, 'start', 1), end(activity.id, 'start', 0), PASSED_ON_MIN),
      ),
    ],
  };
}

interface Standing {
  readonly stage: Stage;
  readonly code: string;
  /** Makes a batch of its own: levelling places loads one by one. */
  readonly own: string;
  readonly isFirst: boolean;
  readonly isLast: boolean;
}

function activityOf(input: NetInput, part: RunSplit | BatchSplit | LoadSplit, standing: Standing): Activity {
  const { stage, code, own, isFirst, isLast } = standing;
  const id = `${input.id}-${code.slice(input.code.length).replace(/^-/, '').toLowerCase()}`;
  return {
    ...{ id, kind: 'stage', stage, code, title: input.title },
    batchId: `${input.id}${own}`,
    productId: input.productId,
    familyId: input.familyId,
    modes: input.modesOf(part),
    placement: null,
    fixing: 'free',
    occupiesUntil: 'takenOffMin' in part ? { linkId: `${id}-taken-off` } : 'end',
    earliestStart: input.earliest,
    latestStart: isFirst ? input.latestStart : null,
    due: isLast ? input.due : null,
    weight: input.weight,
    processData: 'firstMin' in part ? input.processData : null,
    revision: 0,
  };
}

/** Machines before the filler: each feeds the next, the last one the kettles or the filler. */
function passedOn(before: readonly Made<RunSplit>[], cooks: readonly Made<BatchSplit>[], fill: Made<RunSplit>): Link[] {
  const [firstCook] = cooks;
  return before.flatMap(({ activity }, i) => {
    const next = before[i + 1];
    const out = end(activity.id, 'start', THROUGH_MIN);
    if (next) return [flow(`${activity.id}-out`, out, end(next.activity.id, 'start', 0), PASSED_ON_MIN)];
    if (!firstCook) return [flow(`${activity.id}-out`, out, end(fill.activity.id, 'start', 0), PASSED_ON_MIN)];
    return cooks.map((cook, k) => {
      const fed = end(activity.id, 'start', THROUGH_MIN + cook.part.neededMin);
      return flow(`${cook.activity.id}-fed`, fed, end(cook.activity.id, 'start', 0), k === 0 ? INTO_KETTLE_MIN : null);
    });
  });
}

/** A batch is ready when the filler needs it, and its kettle is free when the filler has taken it off. */
function kettleLinks({ activity, part }: Made<BatchSplit>, fill: Made<RunSplit>): Link[] {
  const ready = end(activity.id, 'end', 0);
  const atFill = (minute: number) => end(fill.activity.id, 'start', minute);
  return [
    flow(`${activity.id}-ready`, ready, atFill(part.neededMin), COOKED_STANDS_MIN),
    flow(`${activity.id}-taken-off`, ready, atFill(part.takenOffMin), null),
  ];
}

/** A load waits for its last container; the waits of the process data run from its first. */
function loadLinks(input: NetInput, { activity, part }: Made<LoadSplit>, fill: Made<RunSplit>): Link[] {
  const { id } = activity;
  const first = end(fill.activity.id, 'start', part.firstMin);
  const steamOn = end(id, 'start', input.steamOnMin);
  const links = [flow(`${id}-filled`, end(fill.activity.id, 'start', part.lastMin), end(id, 'start', 0), null)];
  const { waits } = input;
  if (!waits) return links;
  const { sinceClosingMin, initialTemperatureMin, source } = waits;
  links.push(wait(`${id}-closing`, first, steamOn, sinceClosingMin, 'sinceClosing', source));
  if (initialTemperatureMin !== null) {
    links.push(wait(`${id}-warm`, first, steamOn, initialTemperatureMin, 'initialTemperature', source));
  }
  return links;
}

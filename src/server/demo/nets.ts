/** Nets of the demo plant: one order's runs and loads with the links between them, not yet placed. */
import type { Activity, Link, LinkEnd, Mode, Stage } from '../../core/plant/activity';
import type { DemoProduct } from './products';

/** From crates in to steam on. [min] */
export const RETORT_LEAD_MIN = 8;
/** 1,680 containers at 84 a minute. [min] */
export const FILL_MINUTES_PER_LOAD = 20;
/** The first pieces come out of the blancher so long after its start; it is warm by then. [min] */
const BLANCHED_AFTER_MIN = 10;

export interface DemoNet {
  /** Such as "A12". */
  readonly code: string;
  readonly product: DemoProduct;
  readonly blanched: boolean;
  readonly kettles: number;
  readonly loads: number;
  readonly earliest: number;
  readonly due: number;
}

export interface NetParts {
  readonly net: DemoNet;
  readonly activities: readonly Activity[];
  readonly links: readonly Link[];
}

/** Modes of a product's stage on every eligible unit; loads: how many retort loads a fill run makes. */
export type ModesOf = (product: DemoProduct, stage: Stage, loads: number) => readonly Mode[];

const idOf = (code: string): string => `demo-${code.toLowerCase()}`;

function activity(net: DemoNet, modesOf: ModesOf, stage: Stage, code: string, batch: string, last: boolean): Activity {
  const { product } = net;
  return {
    id: idOf(code),
    kind: 'stage',
    stage,
    batchId: idOf(batch),
    code,
    title: product.name,
    productId: product.id,
    familyId: product.familyId,
    modes: modesOf(product, stage, net.loads),
    placement: null,
    fixing: 'free',
    occupiesUntil: stage === 'cook' ? { linkId: `${idOf(code)}-taken-off` } : 'end',
    earliestStart: net.earliest,
    latestStart: null,
    due: last ? net.due : null,
    weight: 1,
    processData:
      stage === 'retort'
        ? { id: `${product.id}-process`, document: 'TH-TP-12 demo', issue: '1', released: product.released }
        : null,
    revision: 0,
  };
}

const end = (activityId: string, anchor: LinkEnd['anchor'], offsetMin: number): LinkEnd => ({
  activityId,
  anchor,
  offsetMin,
});

function flow(id: string, from: LinkEnd, to: LinkEnd, leastMin: number, greatestMin: number | null): Link {
  return { id, from, to, leastMin, greatestMin, rule: 'flow', greatestBreach: 'time', source: null };
}

function processWait(id: string, from: LinkEnd, to: LinkEnd, greatestMin: number, rule: Link['rule'], source: string) {
  return { id, from, to, leastMin: 0, greatestMin, rule, greatestBreach: 'process', source } satisfies Link;
}

/** A load waits for its last container; the wait since closing runs from its first. */
function loadLinks(net: DemoNet, fillId: string, loadId: string, index: number): Link[] {
  const first = end(fillId, 'start', index * FILL_MINUTES_PER_LOAD);
  const last = end(fillId, 'start', (index + 1) * FILL_MINUTES_PER_LOAD);
  const steamOn = end(loadId, 'start', RETORT_LEAD_MIN);
  const links: Link[] = [
    flow(`${loadId}-filled`, last, end(loadId, 'start', 0), 0, null),
    processWait(
      `${loadId}-closing`,
      first,
      steamOn,
      120,
      'sinceClosing',
      'Two hours from the first container, demo rule',
    ),
  ];
  const warm = net.product.initialTemperatureWaitMin;
  if (warm !== null) {
    links.push(processWait(`${loadId}-warm`, first, steamOn, warm, 'initialTemperature', 'TH-TP-12, invented, demo'));
  }
  return links;
}

/** Runs, loads and links of a net. */
export function buildNet(net: DemoNet, modesOf: ModesOf): NetParts {
  const make = (stage: Stage, code: string, batch: string, last = false) =>
    activity(net, modesOf, stage, code, batch, last);
  const fill = make('fill', `${net.code}F`, net.code);
  const activities: Activity[] = [];
  const links: Link[] = [];
  if (net.blanched) {
    const blanch = make('blanch', `${net.code}B`, net.code);
    activities.push(blanch);
    const to = net.kettles === 0 ? end(fill.id, 'start', 0) : end(idOf(`${net.code}K1`), 'start', 0);
    links.push(
      flow(`${blanch.id}-out`, end(blanch.id, 'start', BLANCHED_AFTER_MIN), to, 0, net.kettles === 0 ? 30 : 120),
    );
  }
  for (let k = 1; k <= net.kettles; k++) {
    const cook = make('cook', `${net.code}K${k}`, net.code);
    activities.push(cook);
    const emptiedAt = end(fill.id, 'start', Math.round((k / net.kettles) * FILL_MINUTES_PER_LOAD * net.loads));
    const neededAt = end(fill.id, 'start', Math.round(((k - 1) / net.kettles) * FILL_MINUTES_PER_LOAD * net.loads));
    links.push(flow(`${cook.id}-ready`, end(cook.id, 'end', 0), neededAt, 0, 60));
    links.push(flow(`${cook.id}-taken-off`, end(cook.id, 'end', 0), emptiedAt, 0, null));
  }
  activities.push(fill);
  for (let load = 1; load <= net.loads; load++) {
    const retort = make('retort', `${net.code}-${load}`, `${net.code}-${load}`, true);
    activities.push(retort);
    links.push(...loadLinks(net, fill.id, retort.id, load - 1));
  }
  return { net, activities, links };
}

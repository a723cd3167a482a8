/** A product's route as orders are split over it, from route rows and the inputs of their duties. Pure. */
import { STAGE_NAMES } from '@/contracts/products';
import type { OrderRoute, OrderStage } from '@/core/orders/route';
import { piecesPerMinOf } from '@/core/orders/route';
import type { Mode } from '@/core/plant/activity';
import { fail, ok, problem, type Result } from '@/core/result';
import type { RouteRow } from '../products/products.repo';

/** A route's row on one unit, its duty's inputs as they are stored, and its mode for a full batch or load. */
export interface StageRow {
  readonly row: RouteRow;
  readonly inputs: Readonly<Record<string, unknown>>;
  readonly mode: Mode;
}

/** The stages' rows in order, each on every eligible unit. */
export type StageRows = readonly (readonly StageRow[])[];

interface Around {
  readonly fillKg: number;
  /** Longest wait from the first container to steam on. [min] */
  readonly longestWaitMin: number;
}

const figure = (inputs: StageRow['inputs'], name: string): number | null => {
  const value = inputs[name];
  return typeof value === 'number' && value > 0 ? value : null;
};

const sizeKgOf = ({ row, inputs }: StageRow): number | null => row.sizeKg ?? figure(inputs, 'batchKg');
const piecesOf = ({ row, inputs }: StageRow): number | null => row.pieces ?? figure(inputs, 'containers');

/** kg in containers for every kg that goes in. */
export function yieldOf({ row, inputs }: StageRow): number {
  if (row.yield !== null) return row.yield;
  const [batchKg, boilOffKg] = [figure(inputs, 'batchKg'), figure(inputs, 'boilOffKg')];
  return batchKg === null || boilOffKg === null ? 1 : (batchKg - boilOffKg) / batchKg;
}

/** Containers a minute; where nothing says it, a load of the retort in the route's minutes. */
function rateOf(stage: StageRow, fillKg: number, loadPieces: number | null): number | null {
  const { row, inputs } = stage;
  const kgPerH = figure(inputs, 'productKgPerH');
  const said = row.piecesPerMin ?? figure(inputs, 'containersPerMin');
  if (said !== null) return said;
  if (kgPerH !== null) return piecesPerMinOf(kgPerH, yieldOf(stage), fillKg);
  return loadPieces !== null && row.minutes > 0 ? loadPieces / row.minutes : null;
}

const least = (values: readonly (number | null)[]): number | null =>
  values.some((value) => value === null) || values.length === 0 ? null : Math.min(...(values as number[]));

/** @returns ORDER-ROUTE with the stage whose size or rate nothing says. */
export function orderRoute(stages: StageRows, around: Around): Result<OrderRoute> {
  const loadPieces = least(stages.flatMap((rows) => rows.map(piecesOf)).filter((pieces) => pieces !== null));
  const made: OrderStage[] = [];
  for (const rows of stages) {
    const stage = stageOf(rows, around, loadPieces);
    if (!stage.ok) return stage;
    made.push(stage.value);
  }
  return ok({ stages: made, fillKg: around.fillKg });
}

function stageOf(rows: readonly StageRow[], around: Around, loadPieces: number | null): Result<OrderStage> {
  const [first] = rows;
  if (!first) return fail(problem('ORDER-ROUTE', 'A stage of the route has no unit.'));
  const { stage } = first.row;
  const unitMin = rows.map(({ mode }) => Math.max(1, mode.minutes));
  const sizeKg = least(rows.map(sizeKgOf));
  if (sizeKg !== null && stage !== 'fill') {
    return ok({ kind: 'batch', stage, sizeKg, yield: Math.min(...rows.map(yieldOf)), unitMin });
  }
  const pieces = least(rows.map(piecesOf));
  if (pieces !== null && stage !== 'fill') {
    const leadMin = steamOnMin(rows);
    return ok({
      kind: 'load',
      stage,
      pieces: Math.floor(pieces),
      unitMin,
      leadMin,
      longestWaitMin: around.longestWaitMin,
    });
  }
  const needsPieces = stage === 'retort';
  const piecesPerMin = needsPieces ? null : least(rows.map((row) => rateOf(row, around.fillKg, loadPieces)));
  if (piecesPerMin !== null) return ok({ kind: 'run', stage, piecesPerMin });
  const missing = needsPieces ? 'how many containers a load has' : 'how much it takes: a batch, or a rate';
  const message = `The route does not say of ${STAGE_NAMES[stage]} ${missing}. Enter it in the stage’s duty.`;
  return fail(problem('ORDER-ROUTE', message));
}

/** From a load's start to steam on, the longest of its units. [min] */
export const steamOnMin = (rows: readonly StageRow[]): number => Math.max(0, ...rows.map(({ row }) => row.leadMin));

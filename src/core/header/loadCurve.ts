import { addableKgPerH, placedPhases } from '../demand/activityLoad';
import type { Activity, Placement } from '../plant/activity';
import type { HeaderCapacity, PlantModel } from '../plant/plant';
import { fromMinutes, toMinutes, type Step } from '../time/stepFunction';
import { feedPath, headersOfUnit } from './network';

/** What a load is built from; cleanings that follow from the sequence are among the activities. */
export interface LoadSource {
  readonly horizonMin: number;
  readonly plant: PlantModel;
  readonly capacities: readonly HeaderCapacity[];
  readonly activities: readonly Activity[];
}

interface Draw {
  readonly headerIds: readonly string[];
  readonly from: number;
  readonly to: number;
  readonly kgPerH: number;
}

/**
 * The load on every header, minute by minute [kg/h], base load included. Adding, removing and moving an activity costs
 * the minutes of its phases, and leaves exactly what a curve built anew would have: see {@link addableKgPerH}.
 */
export class LoadCurve {
  readonly horizonMin: number;
  readonly #plant: PlantModel;
  readonly #minutes = new Map<string, Float64Array>();
  readonly #drawn = new Map<string, readonly Draw[]>();

  constructor(source: Omit<LoadSource, 'activities'>) {
    this.horizonMin = source.horizonMin;
    this.#plant = source.plant;
    for (const header of source.plant.headers) this.#minutes.set(header.id, new Float64Array(source.horizonMin));
    for (const capacity of source.capacities) this.#addBaseLoad(capacity);
  }

  /** Load of a header per minute [kg/h]: a live view, to be read only; zeros for an unknown header. */
  kgPerH(headerId: string): Float64Array {
    return this.#minutes.get(headerId) ?? new Float64Array(this.horizonMin);
  }

  /** Load of a header as a step function. [kg/h] */
  steps(headerId: string): Step[] {
    return fromMinutes(this.kgPerH(headerId));
  }

  /** Adds an activity's draw; one that is in already is replaced; one that is not placed draws nothing. */
  add(activity: Activity): void {
    this.remove(activity.id);
    const unitId = activity.placement?.unitId;
    const headerIds = unitId === undefined ? [] : headersOfUnit(this.#plant, unitId);
    if (headerIds.length === 0) return;
    const draws = placedPhases(activity).map(({ from, to, steamKgPerH }) => {
      return { headerIds, from, to, kgPerH: addableKgPerH(steamKgPerH) };
    });
    this.#drawn.set(activity.id, draws);
    for (const draw of draws) this.#pour(draw, 1);
  }

  /** Takes an activity's draw out; nothing happens where it is not in. */
  remove(activityId: string): void {
    for (const draw of this.#drawn.get(activityId) ?? []) this.#pour(draw, -1);
    this.#drawn.delete(activityId);
  }

  /** Moves an activity and returns it as placed. */
  move(activity: Activity, placement: Placement | null): Activity {
    const moved = { ...activity, placement };
    this.add(moved);
    return moved;
  }

  #pour(draw: Draw, sign: 1 | -1): void {
    const from = Math.max(0, draw.from);
    const to = Math.min(this.horizonMin, draw.to);
    const change = sign * draw.kgPerH;
    for (const headerId of draw.headerIds) {
      const values = this.#minutes.get(headerId) as Float64Array;
      for (let t = from; t < to; t++) values[t] = (values[t] as number) + change;
    }
  }

  #addBaseLoad(capacity: HeaderCapacity): void {
    const base = toMinutes(capacity.baseLoadKgPerH, this.horizonMin).map(addableKgPerH);
    for (const headerId of feedPath(this.#plant, capacity.headerId)) {
      const values = this.#minutes.get(headerId) as Float64Array;
      for (let t = 0; t < values.length; t++) values[t] = (values[t] as number) + (base[t] as number);
    }
  }
}

/** The load of all activities, from scratch. */
export function loadOf(source: LoadSource): LoadCurve {
  const curve = new LoadCurve(source);
  for (const activity of source.activities) curve.add(activity);
  return curve;
}

import { OVER_TOLERANCE_KG_PER_H } from './over';

/** A rise of the load that the boilers in fire follow too slowly. */
export interface SteepStep {
  readonly from: number;
  /** The minute after the supply has caught up. */
  readonly to: number;
  /** Greatest distance between load and supply. [kg/h] */
  readonly heightKgPerH: number;
  /** Steam missing until the supply has caught up. [kg] */
  readonly kg: number;
  /** Estimated fall of header pressure. [bar] */
  readonly sagBar: number;
}

/** What the boilers in fire can do, per minute. */
export interface SupplyMinutes {
  /** null: no bound known. [kg/h] */
  readonly exportKgPerH: ArrayLike<number> | null;
  readonly greatestRiseKgPerHPerMin: ArrayLike<number>;
  readonly storedKgPerBar: ArrayLike<number>;
}

/**
 * Steps of a load [kg/h per minute] under which the header falls by more than `toleranceBar`. The supply follows the load, as
 * far as the boilers can send it, by the greatest rise per minute; it falls as fast as the load. A step of h kg/h at
 * r kg/h per minute leaves h^2 / (2 r) / 60 kg missing.
 */
export function steepSteps(load: ArrayLike<number>, supply: SupplyMinutes, toleranceBar: number): SteepStep[] {
  const found: SteepStep[] = [];
  const targetAt = (t: number) => Math.min(load[t] as number, supply.exportKgPerH?.[t] ?? Infinity);
  let sent = load.length > 0 ? targetAt(0) : 0;
  let open: { from: number; heightKgPerH: number; kg: number } | null = null;
  const close = (to: number) => {
    const stored = open ? (supply.storedKgPerBar[open.from] ?? 0) : 0;
    if (open && stored > 0 && open.kg / stored > toleranceBar) found.push({ ...open, to, sagBar: open.kg / stored });
    open = null;
  };
  for (let t = 0; t < load.length; t++) {
    const target = targetAt(t);
    const height = target - sent;
    if (height <= OVER_TOLERANCE_KG_PER_H) {
      close(t);
      sent = target;
      continue;
    }
    const rise = supply.greatestRiseKgPerHPerMin[t] as number;
    open = open ?? { from: t, heightKgPerH: 0, kg: 0 };
    open.heightKgPerH = Math.max(open.heightKgPerH, height);
    open.kg += (height <= rise ? (height * height) / (2 * rise) : height - rise / 2) / 60;
    sent = Math.min(target, sent + rise);
    if (height <= rise) close(t + 1);
  }
  close(load.length);
  return found;
}

import type { Line, PlantModel, Unit } from '../../core/plant/plant';

export const ROW_PX = 46;
export const LINE_PX = 28;

export type Row =
  | { readonly kind: 'line'; readonly line: Line; readonly top: number; readonly height: number }
  | { readonly kind: 'unit'; readonly unit: Unit; readonly top: number; readonly height: number };

export interface Rows {
  readonly rows: readonly Row[];
  readonly heightPx: number;
  readonly topOfUnit: ReadonlyMap<string, number>;
  /** In the order drawn. */
  readonly unitIds: readonly string[];
}

/** Units below the line that they belong to, in the plant's order. */
export function layOutRows(plant: PlantModel): Rows {
  const rows: Row[] = [];
  const topOfUnit = new Map<string, number>();
  let top = 0;
  const push = (row: Row): void => {
    rows.push(row);
    top += row.height;
  };
  for (const line of plant.lines) {
    const units = plant.units.filter((unit) => unit.lineId === line.id);
    if (units.length === 0) continue;
    push({ kind: 'line', line, top, height: LINE_PX });
    for (const unit of units) {
      topOfUnit.set(unit.id, top);
      push({ kind: 'unit', unit, top, height: ROW_PX });
    }
  }
  return { rows, heightPx: top, topOfUnit, unitIds: [...topOfUnit.keys()] };
}

/** The unit at so many px below the first row; null over a line's name and outside the rows. */
export function unitAt(rows: Rows, y: number): string | null {
  const row = rows.rows.find((r) => y >= r.top && y < r.top + r.height);
  return row?.kind === 'unit' ? row.unit.id : null;
}

/** The next of some units above or below one, in the order drawn; the unit itself at the end of the rows. */
export function unitBeside(rows: Rows, unitId: string, by: 1 | -1, among: (unitId: string) => boolean): string {
  const from = rows.unitIds.indexOf(unitId);
  for (let i = from + by; i >= 0 && i < rows.unitIds.length; i += by) {
    const candidate = rows.unitIds[i] as string;
    if (among(candidate)) return candidate;
  }
  return unitId;
}

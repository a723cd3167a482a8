/** What a duty asks of a header, as lists and forms show it. Pure. */
import type { DutiesDto } from '@/contracts/duties';
import { toGrid } from '@/core/demand/grid';
import { processDifferences } from '@/core/duty/processDifferences';
import type { Duty } from '@/core/duty/duty';
import { workOut, type DutyModel } from '@/core/duty/model';
import { supplyOf } from '@/core/duty/supply';
import type { Phase } from '@/core/plant/activity';
import { fail, ok, problem, type Result } from '@/core/result';

/** Steam of a plant's headers. */
export type Headers = Pick<DutiesDto, 'headers' | 'altitudeM'>;

/** Works a duty out on a header of the plant; refuses with the model's own problem. */
export function workOutOn({ headers, altitudeM }: Headers, headerId: string, duty: DutyModel): Result<Duty> {
  const header = headers.find(({ id }) => id === headerId);
  if (!header) return fail(problem('DUTY-HEADER', 'Choose a header to try it on.', 'tryOnHeaderId'));
  const supply = supplyOf(header, altitudeM);
  return supply.ok ? workOut(duty, supply.value) : supply;
}

/** A duty's draw on whole minutes with its totals. */
export interface Demand {
  readonly grid: readonly Phase[];
  readonly minutes: number;
  readonly steamKg: number;
  readonly peakKgPerH: number;
}

/** The draw of phases on the grid [kg/h]; its greatest minute is the peak. */
export function demandOf({ phases, steamKg }: Duty): Demand {
  const grid = toGrid(phases);
  const minutes = Math.max(0, ...grid.map((phase) => phase.offsetMin + phase.minutes));
  return { grid, minutes, steamKg, peakKgPerH: Math.max(0, ...grid.map((phase) => phase.steamKgPerH)) };
}

/** Peak, steam and length of a duty on a header, for a list; null where it can't be worked out there. */
export function figuresOf(headers: Headers, headerId: string | null, duty: DutyModel | null): Result<Demand> | null {
  if (!duty) return null;
  const worked = workOutOn(headers, headerId ?? headers.headers[0]?.id ?? '', duty);
  return worked.ok ? ok(demandOf(worked.value)) : worked;
}

/** Where a duty's thermal process is another than that of a product whose route has it. */
export interface Difference {
  readonly document: string;
  readonly isReleased: boolean;
  readonly sentences: readonly string[];
}

/** Differences from the process data of every product that the duty is for; none where all agree. */
export function differencesOf(
  duty: DutyModel,
  processData: readonly {
    readonly productName: string;
    readonly document: string;
    readonly issue: string;
    readonly isReleased: boolean;
    readonly values: Parameters<typeof processDifferences>[1];
  }[],
): Difference[] {
  return processData.flatMap(({ productName, document, issue, isReleased, values }) => {
    const sentences = processDifferences(duty, values);
    return sentences.length > 0
      ? [{ document: `${productName}: ${document} issue ${issue}`, isReleased, sentences }]
      : [];
  });
}

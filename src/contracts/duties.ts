import { z } from 'zod';
import type { DutyModel } from '../core/duty/model';
import type { SpecificHeatBasis } from '../core/duty/specificHeat';
import { dutyModelSchema, words } from './dutyInputs';
import type { ProcessValuesDto } from './processData';

const idText = z.string().min(1).max(80);

/** What a duty is saved with; `tryOnHeaderId` is the header that the person saw it worked out on. */
const saved = {
  name: words('Give the duty a name that people know it by.', 120),
  tryOnHeaderId: idText,
  duty: dutyModelSchema,
};

/** POST /api/duties */
export const newDutySchema = z.object(saved);
export type NewDutyRequest = z.infer<typeof newDutySchema>;

/** POST /api/duties/:id */
export const changeDutySchema = z.object({
  ...saved,
  /** The revision that was read; a save on an older one is refused. */
  revision: z.int().min(0),
});
export type ChangeDutyRequest = z.infer<typeof changeDutySchema>;

/** POST /api/duties/:id/retire */
export const retireSchema = z.object({ revision: z.int().min(0) });

/** What uses a duty, in words that lead there. */
export interface DutyUseDto {
  readonly kind: 'route' | 'cleaning' | 'plan';
  readonly text: string;
  readonly href: string | null;
}

/** Process data of a product whose route has this duty. */
export interface DutyProcessDataDto {
  readonly productId: string;
  readonly productName: string;
  readonly document: string;
  readonly issue: string;
  readonly isReleased: boolean;
  readonly values: ProcessValuesDto;
}

/** A duty as the plant has it. */
export interface DutyDto {
  readonly id: string;
  readonly name: string;
  /** null: what is stored no longer fits its model; `fault` says why. */
  readonly duty: DutyModel | null;
  readonly model: DutyModel['model'];
  readonly fault: string | null;
  readonly revision: number;
  readonly changedBy: string | null;
  /** ISO instant. */
  readonly changedAt: string | null;
  readonly isRetired: boolean;
  /** The header that most of its units draw on, to work it out on. */
  readonly headerId: string | null;
  readonly uses: readonly DutyUseDto[];
  readonly processData: readonly DutyProcessDataDto[];
}

/** A header's steam as a form works a duty out on it. */
export interface DutyHeaderDto {
  readonly id: string;
  readonly name: string;
  readonly pressureBarG: number;
  readonly dryness: number | null;
  readonly superheatK: number | null;
}

/** A product whose composition a duty can take over. */
export interface DutyProductDto {
  readonly id: string;
  readonly name: string;
  readonly basis: SpecificHeatBasis;
}

/** GET /api/duties */
export interface DutiesDto {
  readonly timeZone: string;
  readonly altitudeM: number;
  readonly headers: readonly DutyHeaderDto[];
  readonly products: readonly DutyProductDto[];
  readonly duties: readonly DutyDto[];
}

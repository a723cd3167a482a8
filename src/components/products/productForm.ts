/** What a product's form holds while it is typed. Pure. */
import { newProductSchema, type ProductDto, type ProductRequest } from '@/contracts/products';
import { specificHeatBasisSchema } from '@/contracts/dutyInputs';
import { specificHeat, type SpecificHeat } from '@/core/duty/specificHeat';
import { blankBasis } from '../duties/formModel';
import type { Blank } from '../ui/form/useZodForm';

export const productSchema = newProductSchema;

/** What the form starts from: the product as it is, or nothing but a family. */
export function productStart(saved: ProductDto | null, familyId: string): Blank<ProductRequest> {
  if (saved) {
    const { name, basis, containerKg, fillKg, casePieces, initialC } = saved;
    return {
      name,
      familyId: saved.familyId,
      basis,
      containerKg,
      fillKg,
      casePieces,
      initialC,
    };
  }
  const basis = blankBasis('composition') as Blank<ProductRequest['basis']>;
  return { name: '', familyId, basis, containerKg: null, fillKg: null, casePieces: null, initialC: null };
}

/** Temperatures that a specific heat is shown at [degC]: chilled to sterilised. */
export const SHOWN_AT_C = [20, 60, 90, 120] as const;

/** The specific heat as typed at a temperature [degC]; null while it can't be said. */
export function heatAt(basis: unknown, tC: number): SpecificHeat | null {
  const parsed = specificHeatBasisSchema.safeParse(basis);
  const heat = parsed.success ? specificHeat(parsed.data, tC) : null;
  return heat?.ok ? heat.value : null;
}

/**
 * Specific heat of a food from its composition.
 * Source: Choi and Okos (1986), as in Becker and Fricke, "Freezing: Principles", Encyclopedia of Food Sciences and
 * Nutrition, 2nd ed. (2003), Table 2; the fat's linear term is from memory. Fallback: Siebel (1892).
 */
import { checkRange } from '../quantity/range';
import { fail, ok, problem, type Result } from '../result';
import { checkInputs, DUTY_RANGE, range, type InputRanges } from './inputs';

/** Mass fractions. Carbohydrate is net of fibre, so that fibre counts once. */
export interface FoodComposition {
  readonly water: number;
  readonly protein: number;
  readonly fat: number;
  readonly carbohydrate: number;
  readonly fibre: number;
  readonly ash: number;
}

/** Where a specific heat comes from: composition, the water content alone, or a figure with its origin. */
export type SpecificHeatBasis =
  | { readonly kind: 'composition'; readonly composition: FoodComposition }
  | { readonly kind: 'waterOnly'; readonly water: number }
  | { readonly kind: 'given'; readonly kJPerKgK: number; readonly source: string };

export interface SpecificHeat {
  /** [kJ/kgK] */
  readonly value: number;
  readonly formula: string;
  readonly source: string;
  /** What the formula took: symbol to value and unit. */
  readonly inputs: Readonly<Record<string, readonly [value: number, unit: string]>>;
}

/** a + b t + c t2 [kJ/kgK], t in degC. */
const CHOI_OKOS: Readonly<Record<keyof FoodComposition, readonly [a: number, b: number, c: number]>> = {
  water: [4.1762, -9.0864e-5, 5.4731e-6],
  protein: [2.0082, 1.2089e-3, -1.3129e-6],
  fat: [1.9842, 1.4733e-3, -4.8008e-6],
  carbohydrate: [1.5488, 1.9625e-3, -5.9399e-6],
  fibre: [1.8459, 1.8306e-3, -4.6509e-6],
  ash: [1.0926, 1.8896e-3, -3.6817e-6],
};

const fraction = (name: string) => range(name, '', 0, 1);
export const FRACTIONS: InputRanges<FoodComposition> = {
  water: fraction('Water fraction'),
  protein: fraction('Protein fraction'),
  fat: fraction('Fat fraction'),
  carbohydrate: fraction('Carbohydrate fraction (net of fibre)'),
  fibre: fraction('Fibre fraction'),
  ash: fraction('Ash fraction'),
};
/** Published compositions are rounded; a larger gap is a slip, most often fibre counted twice. */
export const FRACTIONS_SUM = range('Sum of the fractions', '', 0.98, 1.02);
/** Of a figure that is given. */
export const GIVEN_SPECIFIC_HEAT = range('Specific heat', 'kJ/kgK', 0.5, 4.5);
const TEMPERATURE = range('Temperature for the specific heat', '°C', 0, 150);

/** The parts that a composition is given in. */
export const COMPONENTS = Object.keys(CHOI_OKOS) as (keyof FoodComposition)[];

/** cp [kJ/kgK] at t [degC]: sum of fraction times component, fractions not rescaled. Unchecked; 0 to 150 degC. */
export function choiOkos(composition: FoodComposition, tC: number): number {
  return COMPONENTS.reduce((cp, name) => {
    const [a, b, c] = CHOI_OKOS[name];
    return cp + composition[name] * (a + b * tC + c * tC ** 2);
  }, 0);
}

/** cp [kJ/kgK] above freezing from the water fraction alone; low by up to 0.4 for dry foods. Unchecked. */
export const siebel = (water: number): number => 0.837 + 3.349 * water;

/** cp [kJ/kgK] above freezing from the solids, 1 - water: Chen (1985), from memory. A cross-check; unchecked. */
export function chen(water: number): number {
  const solids = 1 - water;
  return 4.19 - 2.3 * solids - 0.628 * solids ** 3;
}

/** Sum of the mass fractions; 1 but for rounding. */
export const sumOfFractions = (composition: FoodComposition): number =>
  COMPONENTS.reduce((total, name) => total + composition[name], 0);

function fromComposition(composition: FoodComposition, tC: number): Result<SpecificHeat> {
  const sum = sumOfFractions(composition);
  const bad = checkInputs(composition, FRACTIONS) ?? checkRange(DUTY_RANGE, FRACTIONS_SUM, sum, 'composition');
  if (bad) return fail(bad);
  const fractions = COMPONENTS.map((name) => [`x_${name}`, [composition[name], '']] as const);
  return ok({
    value: choiOkos(composition, tC),
    formula: 'Σ x_i · (a_i + b_i · t + c_i · t²)',
    source: 'Choi & Okos (1986)',
    inputs: { t: [tC, '°C'], ...Object.fromEntries(fractions) },
  });
}

const fromWater = (water: number): SpecificHeat => ({
  value: siebel(water),
  formula: '0.837 + 3.349 · x_w',
  source: 'Siebel (1892), from water alone: rough',
  inputs: { x_w: [water, ''] },
});

/**
 * Specific heat at a temperature [degC].
 * @returns DUTY-RANGE when the temperature (0 to 150), a fraction, their sum (0.98 to 1.02) or a given figure is out
 * of range.
 */
export function specificHeat(basis: SpecificHeatBasis, tC: number): Result<SpecificHeat> {
  const badT = checkRange(DUTY_RANGE, TEMPERATURE, tC, 'specificHeatAtC');
  if (badT) return fail(badT);
  switch (basis.kind) {
    case 'composition':
      return fromComposition(basis.composition, tC);
    case 'waterOnly': {
      const bad = checkRange(DUTY_RANGE, FRACTIONS.water, basis.water, 'water');
      if (bad) return fail(bad);
      return ok(fromWater(basis.water));
    }
    case 'given': {
      const bad = checkRange(DUTY_RANGE, GIVEN_SPECIFIC_HEAT, basis.kJPerKgK, 'kJPerKgK');
      if (bad) return fail(bad);
      if (basis.source.trim() === '') {
        return fail(problem('DUTY-SOURCE', 'Say where the specific heat comes from.', 'source'));
      }
      return ok({ value: basis.kJPerKgK, formula: 'as given', source: basis.source, inputs: {} });
    }
  }
}

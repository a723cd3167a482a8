/** The demo plant's products. Thermal-process values are invented: they are no process for any food. */
import type { FoodComposition } from '../../core/duty/specificHeat';
import type { DemoFamily } from './plant';

export interface DemoProduct {
  readonly id: string;
  readonly name: string;
  readonly line: 'a' | 'b' | 'c';
  readonly familyId: DemoFamily;
  readonly composition: FoodComposition;
  /** Contents temperature at steam on. [degC] */
  readonly initialC: number;
  readonly processC: number;
  readonly processMinutes: number;
  /** Longest wait from the first container for its initial temperature; null where two hours rule. [min] */
  readonly initialTemperatureWaitMin: number | null;
  /** Water boiled off in the kettle [kg] and its hold [min]; null where nothing is cooked. */
  readonly cook: { readonly boilOffKg: number; readonly holdMin: number } | null;
  readonly released: boolean;
}

const composition = (
  water: number,
  protein: number,
  fat: number,
  carbohydrate: number,
  fibre: number,
  ash: number,
): FoodComposition => ({ water, protein, fat, carbohydrate, fibre, ash });

export const DEMO_PRODUCTS: readonly DemoProduct[] = [
  {
    id: 'demo-sweetcorn',
    name: 'Sweetcorn 425 g',
    line: 'a',
    familyId: 'demo-corn',
    composition: composition(0.7596, 0.0322, 0.0118, 0.1632, 0.027, 0.0062),
    initialC: 60,
    processC: 121.1,
    processMinutes: 38,
    initialTemperatureWaitMin: 115,
    cook: null,
    released: true,
  },
  {
    id: 'demo-carrots',
    name: 'Carrot dice 425 g',
    line: 'a',
    familyId: 'demo-vegetables',
    composition: composition(0.8779, 0.0103, 0.0019, 0.0714, 0.03, 0.0087),
    initialC: 62,
    processC: 121.1,
    processMinutes: 34,
    initialTemperatureWaitMin: null,
    cook: null,
    released: true,
  },
  {
    id: 'demo-beans',
    name: 'Cut green beans 425 g',
    line: 'a',
    familyId: 'demo-vegetables',
    composition: composition(0.9027, 0.0182, 0.0012, 0.0374, 0.034, 0.0066),
    initialC: 58,
    processC: 121.1,
    processMinutes: 30,
    initialTemperatureWaitMin: null,
    cook: null,
    released: true,
  },
  {
    id: 'demo-lentil',
    name: 'Lentil soup 400 g',
    line: 'b',
    familyId: 'demo-soups',
    composition: composition(0.82, 0.045, 0.012, 0.093, 0.02, 0.01),
    initialC: 72,
    processC: 121.1,
    processMinutes: 42,
    initialTemperatureWaitMin: 90,
    cook: { boilOffKg: 24, holdMin: 25 },
    released: true,
  },
  {
    id: 'demo-tomato',
    name: 'Tomato and bean soup 400 g',
    line: 'b',
    familyId: 'demo-soups',
    composition: composition(0.85, 0.03, 0.015, 0.075, 0.02, 0.01),
    initialC: 74,
    processC: 121.1,
    processMinutes: 36,
    initialTemperatureWaitMin: null,
    cook: { boilOffKg: 30, holdMin: 15 },
    released: true,
  },
  {
    id: 'demo-leek',
    name: 'Leek broth 400 g',
    line: 'b',
    familyId: 'demo-soups',
    composition: composition(0.9, 0.015, 0.01, 0.055, 0.01, 0.01),
    initialC: 74,
    processC: 121.1,
    processMinutes: 32,
    initialTemperatureWaitMin: null,
    cook: { boilOffKg: 12, holdMin: 20 },
    released: true,
  },
  {
    id: 'demo-cream-leek',
    name: 'Cream of leek soup 400 g',
    line: 'b',
    familyId: 'demo-cream',
    composition: composition(0.86, 0.02, 0.045, 0.055, 0.01, 0.01),
    initialC: 70,
    processC: 121.1,
    processMinutes: 40,
    initialTemperatureWaitMin: 90,
    cook: { boilOffKg: 12, holdMin: 20 },
    released: true,
  },
  {
    id: 'demo-chickpea',
    name: 'Chickpea stew 380 g',
    line: 'c',
    familyId: 'demo-meals',
    composition: composition(0.76, 0.06, 0.03, 0.105, 0.033, 0.012),
    initialC: 66,
    processC: 121.1,
    processMinutes: 44,
    initialTemperatureWaitMin: null,
    cook: { boilOffKg: 20, holdMin: 30 },
    released: true,
  },
  {
    id: 'demo-rice',
    name: 'Vegetable rice 380 g',
    line: 'c',
    familyId: 'demo-meals',
    composition: composition(0.7, 0.03, 0.03, 0.213, 0.016, 0.011),
    initialC: 64,
    processC: 121.1,
    processMinutes: 36,
    initialTemperatureWaitMin: null,
    cook: { boilOffKg: 6, holdMin: 20 },
    released: true,
  },
  {
    id: 'demo-mild-curry',
    name: 'Mild vegetable curry 380 g',
    line: 'c',
    familyId: 'demo-meals',
    composition: composition(0.78, 0.03, 0.05, 0.1, 0.025, 0.015),
    initialC: 66,
    processC: 121.1,
    processMinutes: 40,
    initialTemperatureWaitMin: null,
    cook: { boilOffKg: 18, holdMin: 25 },
    // Entered, and waiting for its release: what is planned with it shows as a process limit passed.
    released: false,
  },
];

export const productById = (id: string): DemoProduct => {
  const found = DEMO_PRODUCTS.find((p) => p.id === id);
  if (!found) throw new Error(`no demo product ${id}`);
  return found;
};

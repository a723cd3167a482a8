/**
 * Specific heats. ASHRAE's table adds total carbohydrate and fibre both, so fibre stands in it twice; the product counts
 * it once.
 */
import { chen, choiOkos, siebel, type FoodComposition } from '@/core/duty/specificHeat';
import { absolute, printed, within, type Check, type Table } from './check';

const GROUP = 'Specific heat of foods';
const ASHRAE: Table = {
  group: GROUP,
  source: 'ASHRAE Handbook Refrigeration (SI), Thermal properties of foods, Table 3',
  mark: 'published',
};
const CHOI: Table = { group: GROUP, source: 'Choi & Okos (1986), computed independently', mark: 'independent' };
const SIEBEL: Table = {
  group: GROUP,
  source: 'Siebel, Ice and Refrigeration 2:256-257 (1892), computed independently',
  mark: 'independent',
};
const CHEN: Table = { group: GROUP, source: 'Chen (1985), formula from memory', mark: 'memory' };
const US_TABLE: Table = {
  group: GROUP,
  source: 'Freezing point and properties of foods, engineering reference table (Btu/lb°F)',
  mark: 'published',
};
/** kJ/kgK in a Btu/lbF, exact by definition. */
const KJ_PER_BTU_LB_F = 4.1868;

/**
 * per cent: water, protein, fat, total carbohydrate, fibre, ash; kJ/kgK: published, the table's way at 20 degC, fibre once
 * at 20, once at 60, Siebel, Chen.
 */
const FOODS: readonly (readonly [food: string, figures: readonly number[]])[] = [
  ['asparagus', [92.4, 2.28, 0.2, 4.54, 2.1, 0.57, 4.03, 4.0274, 3.9941, 4.0111, 3.9315, 4.0149]],
  ['beans, snap', [90.27, 1.82, 0.12, 7.14, 3.4, 0.66, 3.99, 3.9942, 3.9403, 3.9583, 3.8601, 3.9656]],
  ['beans, lima', [70.24, 6.84, 0.86, 20.16, 4.9, 1.89, 3.52, 3.5231, 3.4454, 3.4717, 3.1893, 3.489]],
  ['beets', [87.58, 1.61, 0.17, 9.56, 2.8, 1.08, 3.91, 3.9104, 3.866, 3.8853, 3.7701, 3.9031]],
  ['broccoli', [90.69, 2.98, 0.35, 5.24, 3.0, 0.92, 4.01, 4.0052, 3.9576, 3.9754, 3.8742, 3.9754]],
  ['cabbage', [92.15, 1.44, 0.27, 5.43, 2.3, 0.71, 4.02, 4.0208, 3.9843, 4.0015, 3.9231, 4.0091]],
  ['carrots', [87.79, 1.03, 0.19, 10.14, 3.0, 0.87, 3.92, 3.9184, 3.8708, 3.8901, 3.7771, 3.908]],
  ['corn, sweet', [75.96, 3.22, 1.18, 19.02, 2.7, 0.62, 3.62, 3.6211, 3.5782, 3.6024, 3.3809, 3.6284]],
  ['cucumbers', [96.01, 0.69, 0.13, 2.76, 0.8, 0.41, 4.09, 4.09, 4.0773, 4.0929, 4.0524, 4.0982]],
  ['garlic', [58.58, 6.36, 0.5, 33.07, 2.1, 1.5, 3.17, 3.1667, 3.1334, 3.1652, 2.7988, 3.1927]],
  ['horseradish', [78.66, 9.4, 1.4, 8.28, 2.0, 2.26, 3.7, 3.6989, 3.6672, 3.6892, 3.4713, 3.6931]],
  ['kale', [84.46, 3.3, 0.7, 10.01, 2.0, 1.53, 3.82, 3.8223, 3.7906, 3.811, 3.6656, 3.8302]],
  ['leeks', [83.0, 1.5, 0.3, 14.15, 1.8, 1.05, 3.77, 3.7731, 3.7446, 3.766, 3.6167, 3.7959]],
  ['mushrooms', [91.81, 2.09, 0.42, 4.65, 1.2, 0.89, 3.99, 3.9918, 3.9727, 3.9899, 3.9117, 4.0013]],
  ['artichokes, globe', [84.94, 3.27, 0.15, 10.51, 5.4, 1.13, 3.9, 3.898, 3.8124, 3.8326, 3.6816, 3.8415]],
  ['Jerusalem artichoke', [78.01, 2.0, 0.01, 17.44, 1.6, 2.54, 3.63, 3.6343, 3.6089, 3.6326, 3.4496, 3.6776]],
  ['Brussels sprouts', [86.0, 3.38, 0.3, 8.96, 3.8, 1.37, 3.9, 3.8956, 3.8353, 3.855, 3.7171, 3.8663]],
  ['cauliflower', [91.91, 1.98, 0.21, 5.2, 2.5, 0.71, 4.02, 4.0206, 3.981, 3.9982, 3.9151, 4.0036]],
  ['celeriac', [88.0, 1.5, 0.3, 9.2, 1.8, 1.0, 3.9, 3.9029, 3.8744, 3.8935, 3.7841, 3.9129]],
  ['celery', [94.64, 0.75, 0.14, 3.65, 1.7, 0.82, 4.07, 4.0699, 4.0429, 4.0591, 4.0065, 4.0666]],
  ['collards', [90.55, 1.57, 0.22, 7.11, 3.6, 0.55, 4.01, 4.0049, 3.9478, 3.9657, 3.8695, 3.9721]],
  ['eggplant', [92.03, 1.02, 0.18, 6.07, 2.5, 0.71, 4.02, 4.0193, 3.9797, 3.997, 3.9191, 4.0064]],
  ['endive', [93.79, 1.25, 0.2, 3.35, 3.1, 1.41, 4.07, 4.074, 4.0248, 4.0413, 3.978, 4.047]],
  ['ginger root', [81.67, 1.74, 0.73, 15.09, 2.0, 0.77, 3.75, 3.7466, 3.7149, 3.7368, 3.5721, 3.7645]],
  ['kohlrabi', [91.0, 1.7, 0.1, 6.2, 3.6, 1.0, 4.02, 4.0145, 3.9575, 3.9752, 3.8846, 3.9825]],
  ['lettuce, iceberg', [95.89, 1.01, 0.19, 2.09, 1.4, 0.48, 4.09, 4.0941, 4.0719, 4.0873, 4.0484, 4.0954]],
];

/** The table's way of adding (fibre twice), and ours (once). */
function compositions(figures: readonly number[]): { twice: FoodComposition; once: FoodComposition } {
  const [water = 0, protein = 0, fat = 0, total = 0, fibre = 0, ash = 0] = figures.map((percent) => percent / 100);
  const twice = { water, protein, fat, carbohydrate: total, fibre, ash };
  return { twice, once: { ...twice, carbohydrate: total - fibre } };
}

const foods = FOODS.flatMap(([food, figures]): Check[] => {
  const { twice, once } = compositions(figures);
  const [published = 0, tablesWay = 0, once20 = 0, once60 = 0, siebelValue = 0, chenValue = 0] = figures.slice(6);
  const digits = (of: Table, how: string, figure: number, computed: () => number) =>
    printed(of, `${food}, ${how}`, 'kJ/kgK', figure.toFixed(4), computed);
  return [
    within(ASHRAE, `${food}, fibre twice as in the table`, 'kJ/kgK', published, absolute(0.006), () =>
      choiOkos(twice, 20),
    ),
    digits(CHOI, 'fibre twice, 20 °C', tablesWay, () => choiOkos(twice, 20)),
    digits(CHOI, 'fibre once, 20 °C', once20, () => choiOkos(once, 20)),
    digits(CHOI, 'fibre once, 60 °C', once60, () => choiOkos(once, 60)),
    digits(SIEBEL, 'water alone', siebelValue, () => siebel(twice.water)),
    digits(CHEN, 'solids alone', chenValue, () => chen(twice.water)),
  ];
});

const figuresOf = (food: string): readonly number[] => FOODS.find(([name]) => name === food)?.[1] ?? [];

const inBtu = (
  [
    ['beans, snap', 0.95],
    ['carrots', 0.94],
    ['corn, sweet', 0.86],
  ] as const
).map(([food, btu]) =>
  within(
    US_TABLE,
    `${food}, fibre twice as in the table`,
    'Btu/lb°F',
    btu,
    absolute(0.0055),
    () => choiOkos(compositions(figuresOf(food)).twice, 20) / KJ_PER_BTU_LB_F,
  ),
);

const NONE: FoodComposition = { water: 0, protein: 0, fat: 0, carbohydrate: 0, fibre: 0, ash: 0 };
const TEMPERATURES = [20, 60, 100, 121.1];
/** At the four temperatures above. The linear term of fat is from memory: printed copies differ. */
const COMPONENTS: readonly (readonly [keyof FoodComposition, Table['mark'], ...string[]])[] = [
  ['water', 'independent', '4.17657', '4.19045', '4.22184', '4.24546'],
  ['protein', 'independent', '2.03185', '2.07601', '2.11596', '2.13534'],
  ['fat', 'memory', '2.01175', '2.05532', '2.08352', '2.09221'],
  ['carbohydrate', 'independent', '1.58567', '1.64517', '1.68565', '1.69935'],
  ['fibre', 'independent', '1.88065', '1.93899', '1.98245', '1.99938'],
  ['ash', 'independent', '1.12892', '1.19272', '1.24474', '1.26744'],
];

const components = COMPONENTS.flatMap(([component, mark, ...figures]) =>
  TEMPERATURES.map((t, i) =>
    printed({ ...CHOI, mark }, `${component} at ${t} °C`, 'kJ/kgK', figures[i] ?? '', () =>
      choiOkos({ ...NONE, [component]: 1 }, t),
    ),
  ),
);

export const specificHeatChecks: readonly Check[] = [...foods, ...inBtu, ...components];

/** Fields of duty models that are no plain numbers, what they are called, and what a form says beside some. */
import type { Range } from '../quantity/range';
import type { Problem } from '../result';
import type { WorkedModel } from './catalogue';
import type { DutyModel } from './model';
import { HOLD_COUNT, HOLD_RANGES, VENT_STEPS } from './stillRetortInput';
import { STEP_COUNT, STEP_RANGES } from './overpressureRetortInput';

/** A choice between words; the first is no default. */
export interface DutyChoice {
  readonly name: string;
  readonly options: readonly { readonly value: string; readonly label: string }[];
}

/** Rows of numbers, such as the pieces of a process time. */
export interface DutyList {
  readonly name: string;
  readonly count: Range;
  readonly ranges: Readonly<Record<string, Range>>;
}

/** The specific heat of what is heated, and the temperature that it is taken at [degC]. */
export interface DutyBasis {
  readonly field: 'product' | 'contents';
  readonly atC: (inputs: Readonly<Record<string, unknown>>) => number;
}

const choice = (name: string, options: Readonly<Record<string, string>>): DutyChoice => ({
  name,
  options: Object.entries(options).map(([value, label]) => ({ value, label })),
});

const HEATING = choice('Heated by', { direct: 'steam blown in', exchanger: 'an exchanger' });

export const DUTY_CHOICES: Readonly<Partial<Record<WorkedModel, Readonly<Record<string, DutyChoice>>>>> = {
  waterBlancher: { heating: HEATING },
  overpressureRetort: {
    medium: choice('Over-pressure by', {
      steamAir: 'steam and air',
      waterSpray: 'water spray',
      waterImmersion: 'water immersion',
    }),
    heating: HEATING,
  },
  continuousCooker: { kind: choice('Cooker', { hydrostatic: 'hydrostatic', rotary: 'rotary' }) },
  tunnelPasteuriser: { heating: HEATING },
  hotWater: { use: choice('Use', { makeUp: 'make-up water', washDown: 'wash-down' }), heating: HEATING },
  waterHeating: { kind: choice('For', { rinse: 'a rinse', wash: 'a wash' }) },
  cleaningInPlace: {
    part: choice('Part', {
      whole: 'the whole cleaning',
      tank: 'heating the tank, by itself',
      circuit: 'wash and rinse, by themselves',
    }),
    heating: HEATING,
  },
};

const HOLDS: DutyList = { name: 'Process time in pieces', count: HOLD_COUNT, ranges: HOLD_RANGES };

export const DUTY_LISTS: Readonly<Partial<Record<WorkedModel, Readonly<Record<string, DutyList>>>>> = {
  stillRetort: { holds: HOLDS },
  overpressureRetort: {
    comeUp: { name: 'Come-up in steps', count: STEP_COUNT, ranges: STEP_RANGES },
    holds: HOLDS,
  },
};

/** Numbers that may be left out: they are whole, and the model has its own way without them. */
export const DUTY_OPTIONAL: Readonly<Partial<Record<WorkedModel, Readonly<Record<string, Range>>>>> = {
  stillRetort: { ventSteps: VENT_STEPS },
};

/** Numbers of things: no part of one. */
export const DUTY_WHOLE: Readonly<Partial<Record<WorkedModel, readonly string[]>>> = { evaporator: ['effects'] };

const meanOf = (a: string, b: string) => (inputs: Readonly<Record<string, unknown>>) =>
  (Number(inputs[a] ?? Number.NaN) + Number(inputs[b] ?? Number.NaN)) / 2;
const asEntered = (inputs: Readonly<Record<string, unknown>>) => Number(inputs.specificHeatAtC ?? Number.NaN);

/** A model without one heats water. */
export const DUTY_BASES: Readonly<Partial<Record<WorkedModel, DutyBasis>>> = {
  steamBlancher: { field: 'product', atC: meanOf('productInC', 'productOutC') },
  waterBlancher: { field: 'product', atC: meanOf('productInC', 'productOutC') },
  jacketedKettle: { field: 'product', atC: meanOf('startC', 'endC') },
  injectionCooker: { field: 'product', atC: meanOf('startC', 'endC') },
  stillRetort: { field: 'contents', atC: asEntered },
  overpressureRetort: { field: 'contents', atC: asEntered },
  continuousCooker: { field: 'product', atC: meanOf('inC', 'outC') },
  exhaustBox: { field: 'product', atC: meanOf('inC', 'outC') },
  platePasteuriser: { field: 'product', atC: meanOf('inC', 'pasteuriseC') },
  tunnelPasteuriser: { field: 'product', atC: meanOf('inC', 'outC') },
  evaporator: { field: 'product', atC: meanOf('feedC', 'boilingC') },
};

/** Fields that a choice makes idle; they keep their figure and are not asked for. */
export const DUTY_ONLY_WITH: Readonly<Record<string, { readonly field: string; readonly is: string }>> = {
  exchangerPressureBarG: { field: 'heating', is: 'exchanger' },
};

/** Values that the process authority sets; Steadmain works out their steam and alters none. */
export const DUTY_PROCESS_FIELDS: Readonly<Partial<Record<WorkedModel, readonly string[]>>> = {
  stillRetort: ['initialC', 'ventMin', 'ventEndC', 'comeUpMin', 'processC', 'holds'],
  overpressureRetort: ['initialC', 'comeUp', 'holds'],
  continuousCooker: ['processC', 'inC'],
  platePasteuriser: ['pasteuriseC'],
  tunnelPasteuriser: ['sprayC', 'outC'],
};

const OFF = 'A length of 0 leaves it out.';
const FROM_RECORD = 'Mean of the contents, from a heat-penetration record.';

/** Sentences beside fields, by field name; one that a model names for itself stands before these. */
const HINTS: Readonly<Record<string, string>> = {
  warmUpMin: OFF,
  idleMin: OFF,
  holdMin: OFF,
  coolMin: `Without steam. ${OFF}`,
  rinseMin: OFF,
  heatUpMin: 'The draw is even over this time.',
  escapeFraction: 'Share of the steam supplied. The figure that decides: measure it or take it from the meter.',
  shellC: 'Cold: the room. The plan takes it warmer after a short gap.',
  ventSteps: 'Left empty: one even draw. More show how it runs; the kg stay the same.',
  contentsAfterVentC: FROM_RECORD,
  contentsAfterComeUpC: FROM_RECORD,
  contentsEndC: FROM_RECORD,
  specificHeatAtC: 'A mean of the heating, not the process temperature.',
  surfaceLossWPerM2K: 'About 14 for bare steel near 120 °C; less when lagged.',
  regeneration: '(T after regeneration − T in) / (T hot − T in)',
  recipeRoomKg: 'The steam stays in the batch as water.',
  economyShare: 'Of effects times what the first one boils off.',
  containerKJPerKgK: 'Steel 0.50; glass 0.84 and plastic about 1.9 from memory.',
  storeKg: '0 for a heater without a store.',
  reheatMin: 'Longer is a lower peak.',
};

const HINTS_OF: Readonly<Partial<Record<WorkedModel, Readonly<Record<string, string>>>>> = {
  continuousCooker: { heatUpMin: 'From cold, before the first container.', waterKg: '0 for a rotary cooker.' },
  tunnelPasteuriser: { regeneration: 'Share of the containers’ heat that cooling zones give back.' },
};

/** What a form says beside a field; undefined where its name says it all. */
export const hintOf = (model: WorkedModel, field: string): string | undefined =>
  HINTS_OF[model]?.[field] ?? HINTS[field];

/**
 * The field that a refusal to work a duty out belongs to; undefined where it is the header's steam. A pressure above the
 * header's is a matter of the jacket or exchanger.
 */
export function faultField(duty: DutyModel, { code, field }: Problem): string | undefined {
  if (code !== 'STEAM-THROTTLE') return field;
  return ['jacketPressureBarG', 'exchangerPressureBarG'].find((pressure) => pressure in duty.inputs);
}

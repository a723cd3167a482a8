/** What forms need of every duty model: its name, the range of each number, the figures to start from. */
import type { Range } from '../quantity/range';
import { CLEANING_IN_PLACE_DEFAULTS, CLEANING_IN_PLACE_RANGES } from './cleaningInPlace';
import { CONTINUOUS_COOKER_DEFAULTS, CONTINUOUS_COOKER_RANGES } from './continuousCooker';
import { EVAPORATOR_DEFAULTS, EVAPORATOR_RANGES } from './evaporator';
import { EXHAUST_BOX_DEFAULTS, EXHAUST_BOX_RANGES } from './exhaustBox';
import { HOT_WATER_DEFAULTS, HOT_WATER_RANGES } from './hotWater';
import { INJECTION_COOKER_DEFAULTS, INJECTION_COOKER_RANGES } from './injectionCooker';
import { JACKETED_KETTLE_DEFAULTS, JACKETED_KETTLE_RANGES } from './jacketedKettleInput';
import { OVERPRESSURE_RETORT_DEFAULTS, OVERPRESSURE_RETORT_RANGES } from './overpressureRetortInput';
import { PLATE_PASTEURISER_DEFAULTS, PLATE_PASTEURISER_RANGES } from './platePasteuriser';
import { STEAM_BLANCHER_DEFAULTS, STEAM_BLANCHER_RANGES } from './steamBlancher';
import { STILL_RETORT_DEFAULTS, STILL_RETORT_RANGES } from './stillRetortInput';
import { TUNNEL_PASTEURISER_DEFAULTS, TUNNEL_PASTEURISER_RANGES } from './tunnelPasteuriser';
import { WATER_BLANCHER_DEFAULTS, WATER_BLANCHER_RANGES } from './waterBlancher';
import { WATER_HEATING_DEFAULTS, WATER_HEATING_RANGES } from './waterHeating';
import type { InputDefaults } from './inputs';
import type { DutyModel } from './model';

type Worked = Exclude<DutyModel, { readonly model: 'typed' }>;

/** Models that are worked out; a typed profile is not. */
export type WorkedModel = Worked['model'];

/** What a model is described by. */
export type InputsOf<Model extends DutyModel['model']> = Extract<DutyModel, { readonly model: Model }>['inputs'];

export interface DutyModelEntry<Model extends WorkedModel = WorkedModel> {
  readonly model: Model;
  readonly title: string;
  /** By field; a field without a range is a choice, a list or a composition. */
  readonly ranges: Readonly<Record<string, Range>>;
  readonly defaults: InputDefaults<InputsOf<Model>>;
  /** Hours of heating up: once it runs it is neither moved nor stopped. */
  readonly neverMoved: boolean;
}

type Catalogue = { readonly [Model in WorkedModel]: DutyModelEntry<Model> };

/** Every model that is worked out, in the order forms list them. A typed profile needs none of this. */
export const DUTY_CATALOGUE: Catalogue = {
  steamBlancher: {
    model: 'steamBlancher',
    title: 'Steam blancher',
    ranges: STEAM_BLANCHER_RANGES,
    defaults: STEAM_BLANCHER_DEFAULTS,
    neverMoved: false,
  },
  waterBlancher: {
    model: 'waterBlancher',
    title: 'Water blancher',
    ranges: WATER_BLANCHER_RANGES,
    defaults: WATER_BLANCHER_DEFAULTS,
    neverMoved: false,
  },
  jacketedKettle: {
    model: 'jacketedKettle',
    title: 'Jacketed kettle',
    ranges: JACKETED_KETTLE_RANGES,
    defaults: JACKETED_KETTLE_DEFAULTS,
    neverMoved: false,
  },
  injectionCooker: {
    model: 'injectionCooker',
    title: 'Cooker with direct steam',
    ranges: INJECTION_COOKER_RANGES,
    defaults: INJECTION_COOKER_DEFAULTS,
    neverMoved: false,
  },
  stillRetort: {
    model: 'stillRetort',
    title: 'Still retort',
    ranges: STILL_RETORT_RANGES,
    defaults: STILL_RETORT_DEFAULTS,
    neverMoved: false,
  },
  overpressureRetort: {
    model: 'overpressureRetort',
    title: 'Over-pressure retort: steam and air, water spray, water immersion',
    ranges: OVERPRESSURE_RETORT_RANGES,
    defaults: OVERPRESSURE_RETORT_DEFAULTS,
    neverMoved: false,
  },
  continuousCooker: {
    model: 'continuousCooker',
    title: 'Continuous cooker: hydrostatic, rotary',
    ranges: CONTINUOUS_COOKER_RANGES,
    defaults: CONTINUOUS_COOKER_DEFAULTS,
    neverMoved: true,
  },
  exhaustBox: {
    model: 'exhaustBox',
    title: 'Exhaust box',
    ranges: EXHAUST_BOX_RANGES,
    defaults: EXHAUST_BOX_DEFAULTS,
    neverMoved: false,
  },
  platePasteuriser: {
    model: 'platePasteuriser',
    title: 'Plate pasteuriser',
    ranges: PLATE_PASTEURISER_RANGES,
    defaults: PLATE_PASTEURISER_DEFAULTS,
    neverMoved: false,
  },
  tunnelPasteuriser: {
    model: 'tunnelPasteuriser',
    title: 'Tunnel pasteuriser',
    ranges: TUNNEL_PASTEURISER_RANGES,
    defaults: TUNNEL_PASTEURISER_DEFAULTS,
    neverMoved: false,
  },
  evaporator: {
    model: 'evaporator',
    title: 'Evaporator',
    ranges: EVAPORATOR_RANGES,
    defaults: EVAPORATOR_DEFAULTS,
    neverMoved: false,
  },
  hotWater: {
    model: 'hotWater',
    title: 'Hot make-up water and wash-down',
    ranges: HOT_WATER_RANGES,
    defaults: HOT_WATER_DEFAULTS,
    neverMoved: false,
  },
  waterHeating: {
    model: 'waterHeating',
    title: 'Heating water by direct steam',
    ranges: WATER_HEATING_RANGES,
    defaults: WATER_HEATING_DEFAULTS,
    neverMoved: false,
  },
  cleaningInPlace: {
    model: 'cleaningInPlace',
    title: 'Cleaning in place',
    ranges: CLEANING_IN_PLACE_RANGES,
    defaults: CLEANING_IN_PLACE_DEFAULTS,
    neverMoved: false,
  },
};

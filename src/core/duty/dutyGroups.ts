/** Every input of every model in the order that a form asks for it, under headings. */
import type { WorkedModel } from './catalogue';

/** A heading of a form and the fields under it. */
export interface DutyGroup {
  readonly title: string;
  readonly fields: readonly string[];
}

const group = (title: string, fields: string): DutyGroup => ({ title, fields: fields.split(' ') });

const LOSSES = 'ambientC surfaceLossWPerM2K';
const FLOW = 'containersPerMin contentsKgEach containerKgEach containerKJPerKgK product inC outC';

/** Each field of a model stands in one group. */
export const DUTY_GROUPS: Readonly<Record<WorkedModel, readonly DutyGroup[]>> = {
  steamBlancher: [
    group('Product', 'productKgPerH productInC productOutC product'),
    group('Escape', 'escapeFraction idleEscapeKgPerH'),
    group('Times', 'warmUpMin runMin idleMin'),
    group('Machine', 'steelKg sumpWaterKg coldC chamberC'),
    group('Losses', `shellAreaM2 ${LOSSES}`),
  ],
  waterBlancher: [
    group('Product', 'productKgPerH productInC productOutC product'),
    group('Escape', 'escapeFraction'),
    group('Heating', 'heating exchangerPressureBarG bathC'),
    group('Times', 'warmUpMin runMin idleMin'),
    group('Water', 'tankWaterKg makeUpKgPerH makeUpC openAreaM2 evaporationKgPerM2H'),
    group('Machine and losses', `steelKg coldC shellAreaM2 ${LOSSES}`),
  ],
  jacketedKettle: [
    group('Batch', 'batchKg startC endC product boilOffKg holdMin'),
    group('Jacket', 'jacketPressureBarG heatTransferWPerM2K jacketAreaM2'),
    group('Kettle and losses', 'kettleSteelKg heatingLossKW holdLossKW'),
  ],
  injectionCooker: [
    group('Batch', 'batchKg startC endC product recipeRoomKg'),
    group('Steam blown in', 'heatUpMin escapeFraction holdMin'),
    group('Vessel and losses', 'vesselSteelKg heatingLossKW holdLossKW'),
  ],
  stillRetort: [
    group('Load', 'containers contentsKgEach containerSteelKgEach containerVolumeM3 contents specificHeatAtC initialC'),
    group(
      'Scheduled process',
      'ventMin ventEndC contentsAfterVentC comeUpMin processC contentsAfterComeUpC holds coolMin',
    ),
    group('Vents and bleeders', 'vents ventBoreMm ventDischarge ventPressureBarG ventSteps bleeders bleederBoreMm'),
    group('Retort and losses', `shellKg shellDiameterM shellLengthM shellC basketsKg basketsC ${LOSSES}`),
  ],
  overpressureRetort: [
    group('Over-pressure by', 'medium heating exchangerPressureBarG carriedOffKgPerH'),
    group(
      'Load',
      'containers contentsKgEach containerKgEach containerKJPerKgK contents specificHeatAtC initialC basketsKg basketsC',
    ),
    group('Scheduled process', 'comeUp holds coolMin'),
    group('Circulating water', 'circulatingWaterKg freshWaterC reusedWaterShare reusedWaterC'),
    group('Retort and losses', `shellKg surfaceAreaM2 freeVolumeM3 shellC ${LOSSES}`),
  ],
  continuousCooker: [
    group('Cooker', 'kind processC heatUpMin runMin idleMin'),
    group('Containers', FLOW),
    group('Machine', 'steelKg waterKg coldC legWaterKgPerH legWaterInC legWaterOutC bleedKgPerH'),
    group('Losses', `surfaceAreaM2 ${LOSSES}`),
  ],
  exhaustBox: [
    group('Containers', FLOW),
    group('Escape', 'escapeFraction idleEscapeKgPerH'),
    group('Times', 'warmUpMin runMin idleMin'),
    group('Machine and losses', `steelKg coldC chamberC shellAreaM2 ${LOSSES}`),
  ],
  platePasteuriser: [
    group('Product', 'productKgPerH inC pasteuriseC product regeneration'),
    group('Times', 'warmUpMin runMin idleMin'),
    group('Machine and losses', 'exchangerPressureBarG steelKg waterKg coldC lossKW'),
  ],
  tunnelPasteuriser: [
    group('Containers', FLOW),
    group('Sprays', 'sprayC regeneration heating exchangerPressureBarG overflowKgPerH makeUpC'),
    group('Times', 'warmUpMin runMin idleMin'),
    group('Machine and losses', `steelKg waterKg coldC shellAreaM2 ${LOSSES}`),
  ],
  evaporator: [
    group('Feed', 'feedKgPerH feedC product solidsIn solidsOut'),
    group('Effects', 'boilingC effects economyShare exchangerPressureBarG'),
    group('Times', 'warmUpMin runMin idleMin'),
    group('Machine and losses', 'steelKg waterKg coldC lossKW'),
  ],
  hotWater: [
    group('Water', 'use waterKg coldC hotC drawMin'),
    group('Store and heater', 'storeKg reheatMin heating exchangerPressureBarG lossKW'),
  ],
  waterHeating: [group('Water', 'kind waterKg fromC toC minutes')],
  cleaningInPlace: [
    group('Tank', 'part solutionKg tankC setC reheatMin heating exchangerPressureBarG tankLossKW'),
    group('Wash', 'circuitSteelKg circuitC warmingMin washMin circuitLossKW'),
    group('Hot rinse', 'rinseMin rinseKg coldWaterC rinseC'),
  ],
};

/** Stations between boilers and headers, flash steam, accumulators' charge, turndown, and the boiler in thinner air. */
import { firingMinPerHour } from '@/core/duty/boilerFigures';
import { boilerExport } from '@/core/duty/boilerExport';
import { accumulatorFigures } from '@/core/header/accumulator';
import { flashCredit } from '@/core/header/condensate';
import { boilerOutlet, headerSteam } from '@/core/header/headerSteam';
import { stationBalance } from '@/core/header/station';
import { STANDARD_ATMOSPHERE } from '@/core/quantity/pressure';
import { barAbsolute } from '@/core/quantity/units';
import { valueOf } from '../outcome';
import { printed, relative, within, type Check, type Table } from './check';

const INDEPENDENT = 'Computed with an independent implementation of IAPWS-IF97 (python3-iapws 1.5.3)';
const independent = (group: string): Table => ({ group, source: INDEPENDENT, mark: 'independent' });
const header = (pressureBarG: number, dryness: number, ambientBarA = 1.01325) =>
  valueOf(headerSteam({ pressureBarG, dryness, superheatK: null }, ambientBarA));

const boilerInto7 = () =>
  valueOf(
    stationBalance({
      upstreamName: 'the boiler',
      upstream: valueOf(boilerOutlet(10, STANDARD_ATMOSPHERE)),
      headerName: 'the header',
      stated: header(7, 0.98),
      kgPerH: 3546.94,
      ambient: STANDARD_ATMOSPHERE,
    }),
  );
const superheatOf = (steam: ReturnType<typeof boilerInto7>['afterValve']) =>
  steam.kind === 'superheated' ? steam.superheatK : Number.NaN;
const drynessOf = (steam: ReturnType<typeof boilerInto7>['afterValve']) =>
  steam.kind === 'wet' ? steam.dryness : Number.NaN;

const STATION = independent('Station');
const stations = [
  printed(STATION, '10 bar g dry into 7 bar g: superheat by the valve alone', 'K', '4.82899', () =>
    superheatOf(boilerInto7().afterValve),
  ),
  printed(STATION, '… heat lost where the header is 0.98', 'kJ/kg', '53.2819', () => boilerInto7().lostKJPerKg),
  printed(STATION, '… at 3546.94 kg/h', 'kW', '52.4966', () => boilerInto7().lostKW),
  printed(STATION, '… share that condenses', '', '0.0200000', () => boilerInto7().condensedFraction),
  printed(STATION, '… or dryness at the boiler', '', '0.973349', () => drynessOf(boilerInto7().upstreamNeeded)),
];

const kettleHeader = {
  name: 'the header',
  pressureBarG: 3,
  flash: { fromHeaderId: 'main', share: 1, condensateBarG: 7 },
};
const vessel = {
  waterTonnes: 5,
  highBarG: 10,
  lowBarG: 5,
  greatestChargeKgPerH: 0,
  greatestDischargeKgPerH: 0,
  shareAtWeekStart: 0,
};
const charging = (pressureBarG: number, dryness: number) =>
  valueOf(accumulatorFigures(vessel, header(pressureBarG, dryness), 1.01325)).chargePerKg;

const credits = [
  printed(
    independent('Flash steam'),
    'credit of a 3 bar g header, all condensate of 7 bar g',
    'kg/kg',
    '0.0544227',
    () => valueOf(flashCredit(kettleHeader, 1.01325))?.steamPerDraw ?? Number.NaN,
  ),
  printed(independent('Accumulator'), 'charge per kg given up, 10 to 5 bar g, dry 10 bar g', 'kg/kg', '0.995173', () =>
    charging(10, 1),
  ),
];

const TURNDOWN: Table = {
  group: 'Turndown',
  source: 'Boiler maker’s technical brief: 4 to 1 at a tenth of the load fires 24 min in each hour',
  mark: 'published',
};
const turndown = [within(TURNDOWN, 'fires in each hour', 'min', 24, relative(1e-9), () => firingMinPerHour(400, 1000))];

const thin = () =>
  valueOf(
    boilerExport(
      {
        ratingFromAndAtKgPerH: 4000,
        boilerPressureBarG: 10,
        feedTankPressureBarG: 0.2,
        blowdownFraction: 0.05,
        condensateReturnFraction: 0.6,
        condensateC: 90,
        makeUpC: 15,
      },
      { header: header(7, 0.98, 0.845), ambient: barAbsolute(0.845) },
    ),
  );
const THIN = independent('Boiler chain at 0.845 bar a');
const altitude = [
  printed(THIN, 'gross', 'kg/h', '3828.70', () => thin().grossKgPerH),
  printed(THIN, 'feed tank steam', 'kg/h', '278.803', () => thin().feedTankSteamKgPerH),
  printed(THIN, 'net export', 'kg/h', '3549.898', () => thin().netKgPerH),
];

export const networkChecks: readonly Check[] = [...stations, ...credits, ...turndown, ...altitude];

/** Hot condensate of a header's users that flashes into a lower header: steam that no valve has to pass. */
import type { Header, PlantModel } from '../plant/plant';
import { toAbsolute } from '../quantity/pressure';
import { barAbsolute, barGauge } from '../quantity/units';
import { ENERGY_BALANCE, IF97 } from '../duty/balance';
import { ESTIMATE_CAUTION } from '../duty/duty';
import { allOf } from '../duty/inputs';
import { openWorking, type Working } from '../duty/working';
import { ok, type Result } from '../result';
import { flashFraction } from '../steam/flash';
import { saturationAtPressure, type Saturation } from '../steam/saturation';

/** How much of a higher header's draw comes back as flash steam. */
export interface FlashCredit {
  readonly fromHeaderId: string;
  /** Steam per steam drawn by the users of the header that the condensate is from, 0 to 1. */
  readonly steamPerDraw: number;
  /** Dry saturated at the header's own pressure. [kJ/kg] */
  readonly hg: number;
  readonly working: Working;
}

/**
 * Flash steam of a header's condensate feed: share of the users' condensate that is collected, times the fraction of it
 * that flashes. The share is the plant's figure: users that take steam in directly return nothing and are left out of it.
 * Draws of lower headers and the base load count as returning none.
 * @returns null where the header takes no flash; FLASH-ORDER where the condensate is colder than the header; STEAM-RANGE.
 */
export function flashCredit(
  header: Pick<Header, 'name' | 'pressureBarG' | 'flash'>,
  ambientBarA: number,
): Result<FlashCredit | null> {
  const { flash } = header;
  if (!flash) return ok(null);
  const pressureOf = (barG: number) => toAbsolute(barGauge(barG), barAbsolute(ambientBarA));
  const [from, to] = [pressureOf(flash.condensateBarG), pressureOf(header.pressureBarG)];
  const at = allOf<{ fraction: number; hot: Saturation; low: Saturation }>({
    fraction: flashFraction(from, to),
    hot: saturationAtPressure(from),
    low: saturationAtPressure(to),
  });
  if (!at.ok) return at;
  const sheet = openWorking(`Flash steam into ${header.name}`, [ESTIMATE_CAUTION]);
  sheet.section('What flashes');
  const fraction = sheet.step({
    symbol: 'x_f',
    name: `Share of condensate at ${flash.condensateBarG} bar g that flashes at ${header.pressureBarG} bar g`,
    formula: '(h_f1 − h_f2) / h_fg2',
    unit: '',
    source: `${ENERGY_BALANCE}; ${IF97}`,
    inputs: {
      h_f1: [at.value.hot.hf, 'kJ/kg'],
      h_f2: [at.value.low.hf, 'kJ/kg'],
      h_fg2: [at.value.low.hfg, 'kJ/kg'],
    },
    value: ({ h_f1, h_f2, h_fg2 }) => (h_f1 - h_f2) / h_fg2,
  });
  const steamPerDraw = sheet.step({
    symbol: 'c',
    name: 'Flash steam per kg that those users draw',
    formula: 's · x_f',
    unit: 'kg/kg',
    source: 'Share collected as entered for the header',
    inputs: { s: [flash.share, ''], x_f: [fraction, ''] },
    value: ({ s, x_f }) => s * x_f,
  });
  return ok({ fromHeaderId: flash.fromHeaderId, steamPerDraw, hg: at.value.low.hg, working: sheet.finish() });
}

/** The credit of every header of a plant that has one that can be worked out, by header. */
export function flashCredits(plant: PlantModel): ReadonlyMap<string, FlashCredit> {
  const found = new Map<string, FlashCredit>();
  for (const header of plant.headers) {
    const credit = flashCredit(header, plant.ambientBarA);
    if (credit.ok && credit.value) found.set(header.id, credit.value);
  }
  return found;
}

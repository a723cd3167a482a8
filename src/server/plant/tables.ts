import type { Thing, ThingKind, ThingValues } from '@/contracts/plantLibrary';
import { accumulators, baseLoads, boilers, headers, lines, sharedLimits, units, ventGroups } from '@/db/schema/index';

/** Where things of each kind are kept; every such table has id, plantId, position and retiredAt. */
export const TABLES = { headers, boilers, units, ventGroups, accumulators, sharedLimits, baseLoads, lines } as const;

type Row<K extends ThingKind> = (typeof TABLES)[K]['$inferSelect'];
type Columns<K extends ThingKind> = Partial<(typeof TABLES)[K]['$inferInsert']>;

interface Mapping<K extends ThingKind> {
  readonly values: (row: Row<K>) => ThingValues<K>;
  readonly columns: (values: ThingValues<K>) => Columns<K>;
}

/** Of a vent group without a released rule: one at a time. */
export const ONE_AT_A_TIME = {
  ventsAtOnce: 1,
  steamOnsAtOnce: 1,
  steamOnMinutes: 1,
  source: 'No rule released: one at a time',
} as const;

function headerValues(row: Row<'headers'>): ThingValues<'headers'> {
  const { name, pressureBarG, dryness, superheatK, feed, flash, warmUpMinutes, warmUpKg } = row;
  const letdown = feed.kind === 'letdown' ? feed : null;
  return {
    name,
    pressureBarG,
    dryness,
    superheatK,
    feedKind: feed.kind,
    feedFromHeaderId: letdown?.fromHeaderId ?? null,
    greatestKgPerH: letdown?.greatestKgPerH ?? null,
    leastKgPerH: letdown?.leastKgPerH ?? null,
    flashFromHeaderId: flash?.fromHeaderId ?? null,
    flashShare: flash?.share ?? null,
    flashCondensateBarG: flash?.condensateBarG ?? null,
    warmUpMinutes,
    warmUpKg,
  };
}

function feedOf(values: ThingValues<'headers'>): Row<'headers'>['feed'] {
  const { feedKind, feedFromHeaderId, greatestKgPerH, leastKgPerH } = values;
  if (feedKind === 'boilers' || feedFromHeaderId === null || greatestKgPerH === null) return { kind: 'boilers' };
  const least = leastKgPerH === null ? {} : { leastKgPerH };
  return { kind: 'letdown', fromHeaderId: feedFromHeaderId, greatestKgPerH, ...least };
}

function flashOf(values: ThingValues<'headers'>): Row<'headers'>['flash'] {
  const { flashFromHeaderId, flashShare, flashCondensateBarG } = values;
  if (flashFromHeaderId === null || flashShare === null || flashCondensateBarG === null) return null;
  return { fromHeaderId: flashFromHeaderId, share: flashShare, condensateBarG: flashCondensateBarG };
}

function boilerValues(row: Row<'boilers'>): ThingValues<'boilers'> {
  const { id: _, plantId: _plant, position: _position, retiredAt: _retired, ...values } = row;
  return values;
}

function accumulatorValues(row: Row<'accumulators'>): ThingValues<'accumulators'> {
  const { id: _, plantId: _plant, position: _position, retiredAt: _retired, ...values } = row;
  return values;
}

const MAPPINGS: { readonly [K in ThingKind]: Mapping<K> } = {
  headers: {
    values: headerValues,
    columns: (values) => {
      const { name, pressureBarG, dryness, superheatK, warmUpMinutes, warmUpKg } = values;
      const own = { name, pressureBarG, dryness, superheatK, warmUpMinutes, warmUpKg };
      return { ...own, feed: feedOf(values), flash: flashOf(values) };
    },
  },
  boilers: { values: boilerValues, columns: (values) => values },
  units: {
    values: ({ name, lineId, kind, headerId, ventGroupId }) => ({ name, lineId, kind, headerId, ventGroupId }),
    columns: (values) => values,
  },
  ventGroups: { values: ({ name }) => ({ name }), columns: ({ name }) => ({ name }) },
  accumulators: { values: accumulatorValues, columns: (values) => values },
  sharedLimits: {
    values: ({ name, unit, capacity }) => ({ name, unit, capacity }),
    columns: (values) => values,
  },
  baseLoads: {
    values: ({ headerId, fromHour, toHour, kgPerH, note }) => ({ headerId, fromHour, toHour, kgPerH, note }),
    columns: (values) => values,
  },
  lines: { values: ({ name }) => ({ name }), columns: ({ name }) => ({ name }) },
};

/** A row as its form has it. */
export function thingOf<K extends ThingKind>(kind: K, row: Row<K>): Thing<K> {
  return { id: row.id, values: MAPPINGS[kind].values(row), retiredAt: row.retiredAt?.toISOString() ?? null };
}

/** A form's values as columns; a new vent group has one vent and one steam on at a time until a rule is released. */
export function columnsOf<K extends ThingKind>(kind: K, values: ThingValues<K>, isNew: boolean): Columns<K> {
  const columns = MAPPINGS[kind].columns(values);
  return kind === 'ventGroups' && isNew ? { ...ONE_AT_A_TIME, ...columns } : columns;
}

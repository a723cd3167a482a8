import { RANGES, UNIT_KINDS, type PlantLibraryDto, type Thing, type ThingKind } from '../../contracts/plantLibrary';
import { EMISSION_FACTORS } from '../../core/duty/fuel';
import type { Range } from '../../core/quantity/range';
import { hourText } from './hours';
import { UNIT_KIND_WORDS } from './kinds';

export type Raw = Readonly<Record<string, unknown>>;

export interface Option {
  readonly value: string;
  readonly label: string;
}

/** What a form needs to know of the plant and of what is typed. */
export interface FormContext {
  readonly library: PlantLibraryDto;
  /** null: a new thing. */
  readonly id: string | null;
  readonly typed: Raw;
}

interface Common {
  readonly name: string;
  readonly label: string;
  /** Left out: always shown. */
  readonly isShown?: (context: FormContext) => boolean;
}
export type FieldSpec =
  | (Common & { readonly type: 'text'; readonly hint?: string })
  | (Common & { readonly type: 'steps' })
  | (Common & {
      readonly type: 'number';
      readonly range: Range;
      readonly standard?: number;
      readonly hint?: (context: FormContext) => string | undefined;
    })
  | (Common & {
      readonly type: 'select';
      readonly options: (context: FormContext) => readonly Option[];
      readonly none?: string;
      readonly hint?: string;
    });

export interface Section {
  readonly title: string;
  readonly fields: readonly FieldSpec[];
}

const text = (name: string, label: string, hint?: string): FieldSpec => ({
  type: 'text',
  name,
  label,
  ...(hint ? { hint } : {}),
});
type Table = Readonly<Record<string, Range>>;

function figure(ranges: Table, name: string, more: { hint?: string; standard?: number } = {}): FieldSpec {
  const range = ranges[name];
  if (!range) throw new Error(`no range for ${name}`);
  const { hint, ...rest } = more;
  return { type: 'number', name, label: range.name, range, ...rest, ...(hint ? { hint: () => hint } : {}) };
}

const choices = (things: readonly Thing<'headers' | 'lines' | 'ventGroups'>[], except?: string | null): Option[] =>
  things
    .filter(({ id, retiredAt }) => retiredAt === null && id !== except)
    .map(({ id, values }) => ({ value: id, label: values.name }));

const onBoilers = ({ library }: FormContext): Option[] =>
  choices(library.things.headers.filter(({ values }) => values.feedKind === 'boilers'));
const allHeaders = ({ library }: FormContext): Option[] => choices(library.things.headers);
const otherHeaders = ({ library, id }: FormContext): Option[] => choices(library.things.headers, id);
const CHOOSE = 'choose …';
const isLetdown = ({ typed }: FormContext): boolean => typed.feedKind === 'letdown';
const flashes = ({ typed }: FormContext): boolean => Boolean(typed.flashFromHeaderId);
const shownWhere = (isShown: (context: FormContext) => boolean, fields: readonly FieldSpec[]): FieldSpec[] =>
  fields.map((field) => ({ ...field, isShown }));

const H = RANGES.headers;
const headers: readonly Section[] = [
  {
    title: 'Steam',
    fields: [
      text('name', 'Name'),
      figure(H, 'pressureBarG'),
      figure(H, 'dryness', { hint: '0.5 to 1, where saturated; 1 is dry' }),
      figure(H, 'superheatK', { hint: 'instead, where superheated' }),
    ],
  },
  {
    title: 'Fed by',
    fields: [
      {
        type: 'select',
        name: 'feedKind',
        label: 'Fed by',
        options: () => [
          { value: 'boilers', label: 'boilers' },
          { value: 'letdown', label: 'a letdown from another header' },
        ],
      },
      ...shownWhere(isLetdown, [
        { type: 'select', name: 'feedFromHeaderId', label: 'From', options: otherHeaders, none: CHOOSE },
        figure(H, 'greatestKgPerH'),
        figure(H, 'leastKgPerH', { hint: 'below it the valve does not hold; may stay empty' }),
      ]),
    ],
  },
  {
    title: 'Flash from condensate',
    fields: [
      { type: 'select', name: 'flashFromHeaderId', label: 'Condensate of', options: otherHeaders, none: 'none' },
      ...shownWhere(flashes, [
        figure(H, 'flashShare', { hint: 'of those users’ steam, 0 to 1' }),
        figure(H, 'flashCondensateBarG'),
      ]),
    ],
  },
  {
    title: 'Opening after a standstill',
    fields: [figure(H, 'warmUpMinutes', { standard: 20 }), figure(H, 'warmUpKg', { standard: 0 })],
  },
];

const B = RANGES.boilers;
const boilers: readonly Section[] = [
  {
    title: 'Boiler',
    fields: [
      text('name', 'Name'),
      { type: 'select', name: 'headerId', label: 'Feeds', options: onBoilers, none: CHOOSE },
      figure(B, 'ratingFromAndAtKgPerH', { hint: 'as on the plate' }),
      figure(B, 'pressureBarG'),
      figure(B, 'waterTonnes', { hint: 'at working level' }),
    ],
  },
  {
    title: 'Feed and blowdown',
    fields: [
      figure(B, 'feedTankBarG', { standard: 0.2 }),
      figure(B, 'blowdownFraction', { hint: 'of the feed, 0 to 0.5', standard: 0.05 }),
      figure(B, 'condensateReturnFraction', { hint: 'of the feed, 0 to 1' }),
      figure(B, 'condensateC', { standard: 90 }),
      figure(B, 'makeUpC', { standard: 15 }),
    ],
  },
  {
    title: 'Fire',
    fields: [
      figure(B, 'turndown', { hint: '4: down to a quarter', standard: 4 }),
      figure(B, 'greatestRiseFractionPerMin', { hint: 'share of its export a minute', standard: 0.1 }),
      figure(B, 'efficiency', { hint: '0.5 to 1, on the fuel’s heating value', standard: 0.8 }),
      {
        type: 'select',
        name: 'fuel',
        label: 'Fuel',
        options: () => Object.entries(EMISSION_FACTORS).map(([value, { name }]) => ({ value, label: name })),
      },
    ],
  },
  {
    title: 'From lighting to export',
    fields: [
      figure(B, 'purgeMinutes', { standard: 5 }),
      figure(B, 'warmReadyMinutes', { hint: 'in fire within half a day', standard: 30 }),
      figure(B, 'coldReadyMinutes', { standard: 120 }),
    ],
  },
];

const lineChoices = ({ library }: FormContext): Option[] => choices(library.things.lines);
const groupChoices = ({ library }: FormContext): Option[] => choices(library.things.ventGroups);
const units: readonly Section[] = [
  {
    title: 'Unit',
    fields: [
      text('name', 'Name', 'as painted on the door'),
      { type: 'select', name: 'lineId', label: 'Line', options: lineChoices, none: CHOOSE },
      {
        type: 'select',
        name: 'kind',
        label: 'Kind',
        options: () => UNIT_KINDS.map((kind) => ({ value: kind, label: UNIT_KIND_WORDS[kind] })),
        none: CHOOSE,
      },
      { type: 'select', name: 'headerId', label: 'Header', options: allHeaders, none: 'none: draws no steam' },
      {
        type: 'select',
        name: 'ventGroupId',
        label: 'Vent group',
        options: groupChoices,
        none: 'none',
        isShown: ({ typed }) => typed.kind === 'retort' || Boolean(typed.ventGroupId),
      },
    ],
  },
];

const A = RANGES.accumulators;
const accumulators: readonly Section[] = [
  {
    title: 'Accumulator',
    fields: [
      text('name', 'Name'),
      { type: 'select', name: 'chargedFromHeaderId', label: 'Charged from', options: allHeaders, none: CHOOSE },
      { type: 'select', name: 'feedsHeaderId', label: 'Feeds', options: allHeaders, none: CHOOSE },
      figure(A, 'waterTonnes'),
      figure(A, 'highBarG'),
      figure(A, 'lowBarG'),
    ],
  },
  {
    title: 'Limits',
    fields: [
      figure(A, 'greatestChargeKgPerH'),
      figure(A, 'greatestDischargeKgPerH'),
      figure(A, 'shareAtWeekStart', { hint: '0 to 1', standard: 0 }),
    ],
  },
];

const hourHint =
  (name: string) =>
  ({ typed, library }: FormContext): string | undefined => {
    const hour = typed[name];
    const isHour = typeof hour === 'number' && Number.isInteger(hour) && hour >= 0 && hour <= 168;
    return isHour ? hourText(hour, library.weekStartsOn) : 'hour of the week, 0 is its first';
  };
const L = RANGES.baseLoads;
const baseLoads: readonly Section[] = [
  {
    title: 'Base load',
    fields: [
      text('note', 'What it is', 'mains losses, space heating, …'),
      { type: 'select', name: 'headerId', label: 'Header', options: allHeaders, none: CHOOSE },
      { ...figure(L, 'fromHour'), hint: hourHint('fromHour') } as FieldSpec,
      { ...figure(L, 'toHour'), hint: hourHint('toHour') } as FieldSpec,
      figure(L, 'kgPerH'),
    ],
  },
];

const sharedLimits: readonly Section[] = [
  { title: 'Shared limit', fields: [text('name', 'Name'), text('unit', 'Counted in', 'crates, m³/h, operators')] },
  { title: 'Capacity by hour of the week', fields: [{ type: 'steps', name: 'capacity', label: 'Capacity' }] },
];

/** The forms by kind. */
export const SECTIONS: Readonly<Record<ThingKind, readonly Section[]>> = {
  headers,
  boilers,
  units,
  ventGroups: [{ title: 'Vent group', fields: [text('name', 'Name')] }],
  accumulators,
  sharedLimits,
  baseLoads,
  lines: [{ title: 'Line', fields: [text('name', 'Name')] }],
};

/** What an empty form holds: figures with a plant-specific default are filled in and marked. */
export function blankOf(kind: ThingKind): Record<string, unknown> {
  const fields = SECTIONS[kind].flatMap((section) => section.fields);
  const empty = fields.map((field) => {
    if (field.type === 'text') return [field.name, ''] as const;
    if (field.type === 'steps') return [field.name, [{ fromHour: 0, value: null }]] as const;
    return [field.name, field.type === 'number' ? (field.standard ?? null) : null] as const;
  });
  const blank: Record<string, unknown> = Object.fromEntries(empty);
  if (kind === 'headers') blank.feedKind = 'boilers';
  if (kind === 'boilers') blank.fuel = 'naturalGasUs';
  return blank;
}

import type { ThingKind } from '../../contracts/plantLibrary';

export interface KindWords {
  readonly kind: ThingKind;
  /** In the address: /plant/vent-groups. */
  readonly slug: string;
  readonly title: string;
  /** 'a new ...', 'this ...' */
  readonly one: string;
  /** What the list is for, in a sentence. */
  readonly says: string;
}

/** The parts of the plant's library, in the order in which a plant is described. */
export const KINDS: readonly KindWords[] = [
  {
    kind: 'headers',
    slug: 'headers',
    title: 'Headers',
    one: 'header',
    says: 'Pressure and state of the steam that units draw, and what feeds it.',
  },
  {
    kind: 'boilers',
    slug: 'boilers',
    title: 'Boilers',
    one: 'boiler',
    says: 'From the rating on the plate to what each sends to its header.',
  },
  {
    kind: 'accumulators',
    slug: 'accumulators',
    title: 'Accumulators',
    one: 'accumulator',
    says: 'Hot water under pressure that carries steam over peaks.',
  },
  {
    kind: 'lines',
    slug: 'lines',
    title: 'Lines',
    one: 'line',
    says: 'Units in the order of the week board stand under their line.',
  },
  {
    kind: 'units',
    slug: 'units',
    title: 'Units',
    one: 'unit',
    says: 'What a batch or a run occupies, with its number as painted on the door.',
  },
  {
    kind: 'ventGroups',
    slug: 'vent-groups',
    title: 'Vent groups',
    one: 'vent group',
    says: 'Retorts on one vent manifold. Their numbers change by practice rules alone.',
  },
  {
    kind: 'sharedLimits',
    slug: 'shared-limits',
    title: 'Shared limits',
    one: 'shared limit',
    says: 'Crates, cooling water, hoist, operators: anything else that is limited across units.',
  },
  {
    kind: 'baseLoads',
    slug: 'base-loads',
    title: 'Base load',
    one: 'base load',
    says: 'Losses and users outside the plan, by hour of the week.',
  },
];

/** The part of the library at an address; undefined where there is none. */
export const kindAt = (slug: string | undefined): KindWords | undefined => KINDS.find((kind) => kind.slug === slug);

/** The words of a kind. */
export function wordsOf(kind: ThingKind): KindWords {
  const words = KINDS.find((one) => one.kind === kind);
  if (!words) throw new Error(`no words for ${kind}`);
  return words;
}

export const UNIT_KIND_WORDS = {
  blancher: 'blancher',
  kettle: 'kettle',
  cooker: 'cooker',
  filler: 'filler',
  retort: 'retort',
  pasteuriser: 'pasteuriser',
  other: 'another kind',
} as const;

/** 'an accumulator', 'a unit': a word of the library with its article. */
export const withArticle = (one: string): string => `${one.startsWith('a') ? 'an' : 'a'} ${one}`;

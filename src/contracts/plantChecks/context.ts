import { barAbsolute, barGauge, type BarAbsolute } from '../../core/quantity/units';
import type { Result } from '../../core/result';
import { steamState, type SteamState } from '../../core/steam/steamState';
import type { PlantLibraryDto, Thing, ThingKind, ThingValues } from '../plantLibrary';

/** What is wrong, at its field. */
export interface Fault {
  readonly path: string;
  readonly message: string;
}

/** What a form's values are held against: the plant as it stands, and which thing is edited (null: a new one). */
export interface CheckContext {
  readonly library: PlantLibraryDto;
  readonly id: string | null;
}

/** Values of which those that are out of range by themselves are left out. */
export type Given<K extends ThingKind> = Partial<ThingValues<K>>;

/** Things in use, without the one edited. */
export function others<K extends ThingKind>({ library, id }: CheckContext, kind: K): readonly Thing<K>[] {
  const things: readonly Thing<K>[] = library.things[kind];
  return things.filter((thing) => thing.id !== id && thing.retiredAt === null);
}

/** A thing in use by its id; undefined where there is none. */
export function inUse<K extends ThingKind>(library: PlantLibraryDto, kind: K, id: string | null | undefined) {
  const things: readonly Thing<K>[] = library.things[kind];
  return things.find((thing) => thing.id === id && thing.retiredAt === null);
}

export const ambientOf = (library: PlantLibraryDto): BarAbsolute => barAbsolute(library.ambientBarA);

/** The steam of a header as it is stated. @returns as core's `steamState`. */
export function steamOfHeader(
  header: Pick<ThingValues<'headers'>, 'pressureBarG' | 'dryness' | 'superheatK'>,
  ambient: BarAbsolute,
): Result<SteamState> {
  const quality =
    header.superheatK === null
      ? { kind: 'wet' as const, dryness: header.dryness ?? 1 }
      : { kind: 'superheated' as const, superheatK: header.superheatK };
  return steamState({ pressure: barGauge(header.pressureBarG), quality, ambient });
}

/** A name that another thing in use of its kind has. */
export function takenName(
  context: CheckContext,
  kind: Exclude<ThingKind, 'baseLoads'>,
  name: string | undefined,
): Fault[] {
  const same = (other: string): boolean => other.trim().toLowerCase() === name?.trim().toLowerCase();
  const taken = others(context, kind).some(({ values }) => same(values.name));
  return taken ? [{ path: 'name', message: `There is a ${name?.trim()} already.` }] : [];
}

import type { PlantLibraryDto, Thing, ThingKind } from '../../contracts/plantLibrary';
import { useUnits } from '../ui/units';
import { LISTINGS, type Listing } from './listing';
import { wordsOf } from './kinds';

interface Props {
  readonly kind: ThingKind;
  readonly library: PlantLibraryDto;
  readonly selected: string | null;
  /** A form stands beside it: name and key figure alone. */
  readonly isNarrow: boolean;
  readonly onSelect: (id: string) => void;
}

/** Things of a kind with their key figures; a row opens its form. */
export function ThingList({ kind, library, selected, isNarrow, onSelect }: Props) {
  const units = useUnits();
  const listing = LISTINGS[kind] as unknown as Listing<ThingKind>;
  const things = (library.things[kind] as readonly Thing<ThingKind>[]).filter(({ retiredAt }) => retiredAt === null);
  if (things.length === 0) return <p className="py-6 text-md">No {wordsOf(kind).one} has been entered yet.</p>;
  const look = (i: number): string => {
    const its = listing.columns[i];
    const side = its?.isFigure ? 'text-right whitespace-nowrap' : 'text-left';
    if (i === 0 || its?.isKey) return side;
    return `${side} ${isNarrow ? 'hidden' : 'max-sm:hidden'}`;
  };
  return (
    <div className="overflow-x-auto">
      <table className="w-full border-collapse text-base">
        <thead>
          <tr className="border-b border-edge">
            {listing.columns.map(({ title }, i) => (
              <th key={title} scope="col" className={`label px-2 py-2 ${look(i)}`}>
                {title}
              </th>
            ))}
          </tr>
        </thead>
        <tbody className="divide-y divide-rule">
          {things.map((thing) => (
            <tr key={thing.id} className={thing.id === selected ? 'bg-room-soft' : 'hover:bg-sunken'}>
              <th scope="row" className="p-0 text-left font-medium">
                <button
                  type="button"
                  className="min-h-11 w-full px-2 text-left underline-offset-2 hover:underline"
                  aria-current={thing.id === selected ? 'true' : undefined}
                  onClick={() => onSelect(thing.id)}
                >
                  {listing.name(thing.values)}
                </button>
              </th>
              {listing.cells(thing, library, units).map((cell, i) => (
                <td key={listing.columns[i + 1]?.title} className={`px-2 py-2 text-ink-muted ${look(i + 1)}`}>
                  {cell}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

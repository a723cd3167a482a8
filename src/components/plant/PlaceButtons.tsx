import { useMutation } from '@tanstack/react-query';
import type { PlantLibraryDto, SavedThingDto, ThingKind } from '../../contracts/plantLibrary';
import { api, messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { wordsOf } from './kinds';

interface Props {
  readonly kind: ThingKind;
  readonly library: PlantLibraryDto;
  readonly id: string;
  readonly onChanged: (library: PlantLibraryDto) => void;
}

/** The ids with one moved by a place up (-1) or down (1). */
function moved(ids: readonly string[], id: string, by: -1 | 1): string[] {
  const at = ids.indexOf(id);
  const rest = ids.filter((one) => one !== id);
  rest.splice(Math.max(0, at + by), 0, id);
  return rest;
}

/** Moves a thing up or down its list: the order of lists, menus and the board's rows. */
export function PlaceButtons({ kind, library, id, onChanged }: Props) {
  const things = library.things[kind] as readonly { readonly id: string; readonly retiredAt: string | null }[];
  const ids = things.filter(({ retiredAt }) => retiredAt === null).map((thing) => thing.id);
  const place = useMutation({
    mutationFn: (by: -1 | 1) =>
      api<SavedThingDto>(`/api/plant/${kind}/order`, { method: 'POST', body: { ids: moved(ids, id, by) } }),
    onSuccess: (saved) => onChanged(saved.library),
  });
  const at = ids.indexOf(id);
  const { one } = wordsOf(kind);
  return (
    <span className="mr-auto flex items-center gap-1">
      <Button
        look="quiet"
        size="small"
        aria-label={`Move this ${one} up the list`}
        disabled={at <= 0 || place.isPending}
        onClick={() => place.mutate(-1)}
      >
        Up
      </Button>
      <Button
        look="quiet"
        size="small"
        aria-label={`Move this ${one} down the list`}
        disabled={at === ids.length - 1 || place.isPending}
        onClick={() => place.mutate(1)}
      >
        Down
      </Button>
      {place.error ? (
        <span role="alert" className="text-sm text-over">
          {messageOf(place.error)}
        </span>
      ) : null}
    </span>
  );
}

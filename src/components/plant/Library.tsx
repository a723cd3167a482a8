import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useCallback, useEffect, useRef, useState } from 'react';
import type { PlantLibraryDto, Thing, ThingKind } from '../../contracts/plantLibrary';
import { api } from '../query/api';
import { usePlantEvents } from '../query/usePlantEvents';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import { LeaveDialog } from './LeaveDialog';
import { LISTINGS, type Listing } from './listing';
import { withArticle, wordsOf } from './kinds';
import { ThingForm } from './ThingForm';
import { ThingList } from './ThingList';

export interface LibraryProps {
  readonly kind: ThingKind;
  readonly first: PlantLibraryDto;
  readonly canEdit: boolean;
  /** Said where the person may not edit. */
  readonly whoMay: string;
}

const NEW = 'new';
const KEY = ['plant'];

const idInAddress = (): string | null => new URLSearchParams(location.search).get('id');

function putInAddress(id: string | null): void {
  const search = id === null ? '' : `?id=${encodeURIComponent(id)}`;
  history.replaceState(null, '', `${location.pathname}${search}`);
}

/** The library as the server holds it, read again whenever somebody changes the plant. */
function useLibrary(first: PlantLibraryDto) {
  const client = useQueryClient();
  const query = useQuery({
    queryKey: KEY,
    queryFn: ({ signal }) => api<PlantLibraryDto>('/api/plant', { signal }),
    initialData: first,
  });
  usePlantEvents((notice) => {
    if (notice === null || notice.kind === 'plant') void client.invalidateQueries({ queryKey: KEY });
  });
  return { library: query.data, set: (library: PlantLibraryDto) => client.setQueryData(KEY, library) };
}

/** The list of one part of the plant and the form of what is chosen in it. */
export function Library({ kind, first, canEdit, whoMay }: LibraryProps) {
  const { library, set } = useLibrary(first);
  const [selected, setSelected] = useState<string | null>(idInAddress);
  const [serial, setSerial] = useState(0);
  const [said, setSaid] = useState<string | null>(null);
  const typed = useRef(false);
  const noteTyped = useCallback((isTyped: boolean) => void (typed.current = isTyped), []);
  const [asked, setAsked] = useState<{ readonly id: string | null } | null>(null);
  const panel = useRef<HTMLDivElement>(null);
  const listing = LISTINGS[kind] as unknown as Listing<ThingKind>;
  const things = library.things[kind] as readonly Thing<ThingKind>[];
  const thing = things.find((one) => one.id === selected && one.retiredAt === null) ?? null;
  const isOpen = selected === NEW || thing !== null;

  useEffect(() => putInAddress(selected), [selected]);
  useEffect(() => {
    const isBelow = matchMedia('(width < 64rem)').matches;
    if (selected !== null && isBelow) panel.current?.scrollIntoView({ block: 'start' });
  }, [selected]);

  const show = (id: string | null): void => {
    setSaid(null);
    setSelected(id);
    typed.current = false;
  };
  const open = (id: string | null): void => (typed.current && id !== selected ? setAsked({ id }) : show(id));
  return (
    <div
      className={`mt-5 grid items-start gap-8 ${isOpen ? 'lg:grid-cols-[minmax(0,17rem)_minmax(0,1fr)] 2xl:grid-cols-[minmax(0,24rem)_minmax(0,1fr)]' : ''}`}
    >
      <div className="min-w-0">
        <div className="mb-1 flex flex-wrap items-center justify-between gap-3">
          {isOpen ? null : <p className="text-md text-ink-muted">{wordsOf(kind).says}</p>}
          {canEdit ? <Button onClick={() => open(NEW)}>Add {withArticle(wordsOf(kind).one)}</Button> : null}
        </div>
        {canEdit ? null : <p className="text-sm text-ink-muted">{whoMay}</p>}
        <div aria-live="polite">
          {said ? (
            <Notice look="good" className="my-2">
              {said}
            </Notice>
          ) : null}
        </div>
        <ThingList {...{ kind, library, selected }} isNarrow={isOpen} onSelect={open} />
      </div>
      {isOpen ? (
        <div ref={panel} className="min-w-0 scroll-mt-16 rounded-md border border-rule bg-surface p-5">
          <ThingForm
            key={`${selected}-${serial}`}
            {...{ kind, library, thing, canEdit }}
            onLeave={() => open(null)}
            onChanged={set}
            onTyped={noteTyped}
            onRenew={() => setSerial(serial + 1)}
            onSaved={(saved) => {
              set(saved.library);
              const now = (saved.library.things[kind] as readonly Thing<ThingKind>[]).find(({ id }) => id === saved.id);
              show(saved.id);
              setSaid(`${now ? listing.name(now.values) : 'It'} is saved.`);
              setSerial(serial + 1);
            }}
          />
        </div>
      ) : null}
      <LeaveDialog
        open={asked !== null}
        onStay={() => setAsked(null)}
        onLeave={() => {
          setAsked(null);
          show(asked?.id ?? null);
        }}
      />
    </div>
  );
}

import { useCallback, useState } from 'react';
import { HeaderStrip } from './HeaderStrip';
import type { PointedAt } from './Pointed';
import { useStore, type Store } from './store';
import type { BoardModel } from './useBoard';

interface Props {
  readonly model: BoardModel;
  readonly pointed: Store<PointedAt | null>;
}

/** The headers above the rows: those that boilers feed always, those behind a letdown when unfolded. */
export function Strips({ model, pointed }: Props) {
  const { week, evaluation, before, carry, view, clock } = model;
  const [open, setOpen] = useState<ReadonlySet<string>>(new Set());
  const at = useStore(pointed, (p) => p);
  const point = useCallback(
    (headerId: string, minute: number | null) => pointed.set(minute === null ? null : { headerId, minute }),
    [pointed],
  );
  const toggle = (id: string): void =>
    setOpen((now) => (now.has(id) ? new Set([...now].filter((one) => one !== id)) : new Set([...now, id])));
  return week.plant.headers.map((header) => {
    const judgement = evaluation.headers.find((h) => h.headerId === header.id);
    if (!judgement) return null;
    const main = header.feed.kind === 'boilers';
    return (
      <HeaderStrip
        key={header.id}
        header={header}
        capacity={week.capacities.find((c) => c.headerId === header.id)}
        judgement={judgement}
        before={before?.headers.find((h) => h.headerId === header.id) ?? null}
        carried={carry.store}
        scale={view.scale}
        clock={clock}
        open={main || open.has(header.id)}
        onToggle={main ? null : () => toggle(header.id)}
        main={main}
        onPoint={point}
        pointedMin={at?.headerId === header.id ? at.minute : null}
      />
    );
  });
}

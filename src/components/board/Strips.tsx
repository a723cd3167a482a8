import { useCallback, useMemo, useState } from 'react';
import { HeaderStrip } from './HeaderStrip';
import { LimitStrips } from './LimitStrips';
import type { PointedAt } from './Pointed';
import { SpreadRow } from './SpreadRow';
import { useStore, type Store } from './store';
import type { BoardModel } from './useBoard';

interface Props {
  readonly model: BoardModel;
  readonly pointed: Store<PointedAt | null>;
  readonly limitsOpen: boolean;
  readonly onLimits: () => void;
}

/**
 * Above the rows: the headers that boilers feed always, each with its early and late starts; those behind a letdown and
 * the shared limits when unfolded.
 */
export function Strips({ model, pointed, limitsOpen, onLimits }: Props) {
  const { week, evaluation, before, carry, view, clock, spread } = model;
  const [open, setOpen] = useState<ReadonlySet<string>>(new Set());
  const at = useStore(pointed, (p) => p);
  const point = useMemo(() => {
    const of = (kind: PointedAt['kind']) => (id: string, minute: number | null) =>
      pointed.set(minute === null ? null : { kind, id, minute });
    return { header: of('header'), chance: of('chance'), limit: of('limit') };
  }, [pointed]);
  const minuteAt = (kind: PointedAt['kind'], id: string) => (at?.kind === kind && at.id === id ? at.minute : null);
  const go = useCallback((minute: number) => view.reveal({ from: minute - 30, to: minute + 30 }, null), [view]);
  const toggle = (id: string): void =>
    setOpen((now) => (now.has(id) ? new Set([...now].filter((one) => one !== id)) : new Set([...now, id])));
  const headers = week.plant.headers.map((header) => {
    const judgement = evaluation.headers.find((h) => h.headerId === header.id);
    if (!judgement) return null;
    const main = header.feed.kind === 'boilers';
    return [
      <HeaderStrip
        key={header.id}
        header={header}
        capacity={week.capacities.find((c) => c.headerId === header.id)}
        judgement={judgement}
        before={before?.headers.find((h) => h.headerId === header.id) ?? null}
        carried={carry.store}
        spreads={spread.store}
        scale={view.scale}
        clock={clock}
        open={main || open.has(header.id)}
        onToggle={main ? null : () => toggle(header.id)}
        main={main}
        onPoint={point.header}
        pointedMin={minuteAt('header', header.id)}
      />,
      main || (spread.on && open.has(header.id)) ? (
        <SpreadRow
          key={`${header.id} spread`}
          header={header}
          main={main}
          control={spread}
          scale={view.scale}
          clock={clock}
          nowMin={model.nowMin}
          onPoint={point.chance}
          pointedMin={minuteAt('chance', header.id)}
          onGo={go}
        />
      ) : null,
    ];
  });
  return (
    <>
      {headers}
      <LimitStrips
        {...{ week, evaluation, clock }}
        carried={carry.store}
        scale={view.scale}
        open={limitsOpen}
        onToggle={onLimits}
        onPoint={point.limit}
        pointed={at?.kind === 'limit' ? at : null}
      />
    </>
  );
}

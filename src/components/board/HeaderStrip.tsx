import { memo, useMemo } from 'react';
import type { Carried } from '../../core/header/carry';
import type { HeaderJudgement } from '../../core/header/judgement';
import type { Header, HeaderCapacity } from '../../core/plant/plant';
import { toMinutes } from '../../core/time/stepFunction';
import type { Clock } from '../time';
import { useUnits } from '../ui/units';
import type { Units } from '../units';
import { Fold } from './Fold';
import { StripFace } from './StripFace';
import { greatestOf, rateMarks, stripTop, yOfRate, type StripScale } from './strip';
import { useStore, type Store } from './store';
import type { TimeScale } from './timeScale';
import type { Carrying } from './useCarry';
import type { SpreadShown } from './useStartSpread';
import { markText, overWords } from './words';

interface Props {
  readonly header: Header;
  readonly capacity: HeaderCapacity | undefined;
  readonly judgement: HeaderJudgement;
  /** The load that a proposal is compared with. */
  readonly before: HeaderJudgement | null;
  readonly carried: Store<Carrying | null>;
  readonly scale: TimeScale;
  readonly clock: Clock;
  /** Early and late starts, while they are shown. */
  readonly spreads: Store<SpreadShown | null>;
  readonly open: boolean;
  /** Only headers that may be folded away. */
  readonly onToggle: (() => void) | null;
  readonly main: boolean;
  readonly onPoint: (headerId: string, minute: number | null) => void;
  readonly pointedMin: number | null;
}

const FIGURE_LOOKS = { over: 'text-over', room: 'text-room', quiet: 'text-ink-muted' } as const;

/** A header's load against its limit over the week, always in view above the rows. */
export const HeaderStrip = memo(function HeaderStrip(props: Props) {
  const { header, capacity, judgement, carried, scale, clock, open, onToggle, main, onPoint, pointedMin } = props;
  const units = useUnits();
  const heightPx = open ? (main ? 128 : 76) : 0;
  const live = useStore(carried, (c) => c?.preview?.evaluation.headers.find((h) => h.headerId === header.id)) ?? null;
  const shown = live ?? judgement;
  const spread = useStore(props.spreads, (s) => s?.byHeader[header.id]) ?? null;
  const spreadKgPerH = useStore(props.spreads, (s) => s?.greatestKgPerH[header.id]) ?? 0;
  const base = useMemo(
    () => (capacity ? toMinutes(capacity.baseLoadKgPerH, scale.horizonMin) : null),
    [capacity, scale.horizonMin],
  );
  const limit = useMemo(() => limitOf(judgement, header), [judgement, header]);
  const topKgPerH = useMemo(
    () =>
      stripTop(
        Math.max(
          greatestOf(judgement.drawnKgPerH),
          props.before?.peak.kgPerH ?? 0,
          limit ? greatestOf(limit) : 0,
          spreadKgPerH,
        ),
        units,
      ),
    [judgement, props.before, limit, spreadKgPerH, units],
  );
  const strip: StripScale = { pxPerMin: scale.pxPerMin, topKgPerH, heightPx };
  const words = overWords(shown, clock, units);

  return (
    <section className="flex border-b border-rule bg-surface" aria-label={`${header.name}: steam load`}>
      <div
        className={`board-label !bg-surface px-4 max-sm:px-2 ${open ? 'py-2' : 'py-1.5'}`}
        style={{ minHeight: open ? heightPx + 8 : 30 }}
      >
        <StripTitle {...{ header, open, onToggle }} />
        {open ? (
          <>
            {main ? <p className="text-2xs text-ink-muted max-sm:hidden">{stateText(header, units)}</p> : null}
            <p
              className={`mt-0.5 font-semibold ${main ? 'text-lg max-lg:text-md max-sm:text-sm' : 'text-sm'} ${FIGURE_LOOKS[words.look]} ${words.look === 'over' ? '' : '!text-sm'} ${main ? '' : 'md:pr-9'}`}
              data-testid={`over-${header.id}`}
            >
              {words.figure}
            </p>
            <p className="text-2xs leading-4 text-ink-muted md:pr-9">{words.line}</p>
            {main && shown.carried ? <CarriedWords carried={shown.carried} /> : null}
            <Marks {...{ strip, topKgPerH }} />
          </>
        ) : null}
      </div>
      <div className="board-track" style={{ width: scale.widthPx }}>
        {open ? null : (
          <p className="sticky left-(--label-w) inline-block px-3 py-1.5 text-xs leading-4.5">
            <span className={`font-medium ${FIGURE_LOOKS[words.look]}`}>{words.figure}</span>
            <span className="text-ink-muted">, {words.line}</span>
          </p>
        )}
        {open ? (
          <StripFace
            {...{ header, strip, scale, clock, base, limit, onPoint, pointedMin, spread, carrying: live !== null }}
            carried={shown.carried}
            load={shown.loadKgPerH}
            before={live ? judgement.loadKgPerH : (props.before?.loadKgPerH ?? null)}
          />
        ) : null}
      </div>
    </section>
  );
});

function limitOf(judgement: HeaderJudgement, header: Header): Float64Array | null {
  if (judgement.limitKgPerH) return judgement.limitKgPerH;
  if (header.feed.kind !== 'letdown') return null;
  return new Float64Array(judgement.loadKgPerH.length).fill(header.feed.greatestKgPerH);
}

/** What accumulators give here at most: drawn in the strip on top of what is left to the boilers. */
function CarriedWords({ carried }: { readonly carried: Carried }) {
  const units = useUnits();
  const most = useMemo(() => greatestOf(carried.dischargeKgPerH), [carried]);
  const words = most > 0 ? `accumulator carries up to ${units.rate(most)}` : 'accumulator stands by';
  return <p className="text-2xs leading-4 text-room">{words}</p>;
}

function stateText(header: Header, units: Units): string {
  const pressure = units.text('gaugePressure', header.pressureBarG);
  if (header.dryness !== null) return `${pressure} · x ${header.dryness}`;
  return header.superheatK
    ? `${pressure} · ${units.text('temperatureDifference', header.superheatK)} superheat`
    : pressure;
}

function StripTitle({ header, open, onToggle }: Pick<Props, 'header' | 'open' | 'onToggle'>) {
  if (!onToggle) return <h2 className="line-clamp-2 text-sm leading-5 font-semibold max-sm:text-xs">{header.name}</h2>;
  return <Fold name={header.name} {...{ open, onToggle }} />;
}

function Marks({ strip, topKgPerH }: { readonly strip: StripScale; readonly topKgPerH: number }) {
  const units = useUnits();
  return (
    <div className="pointer-events-none absolute top-1 right-1.5 max-md:hidden" aria-hidden="true">
      {rateMarks(topKgPerH, units).map((mark) => (
        <span
          key={mark}
          className="absolute right-0 -translate-y-1/2 text-2xs whitespace-nowrap text-ink-muted"
          style={{ top: yOfRate(strip, mark) }}
          title={units.rate(mark)}
        >
          {markText(mark, topKgPerH, units)}
        </span>
      ))}
    </div>
  );
}

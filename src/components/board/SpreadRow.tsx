import { memo, useMemo } from 'react';
import type { SampledSpread } from '../../core/header/spread/sampledLoads';
import type { Header } from '../../core/plant/plant';
import type { Clock } from '../time';
import { chancePath, CONFIDENCES, greatestChance, percentText, type Confidence } from './chance';
import { Fold } from './Fold';
import { minuteWalk } from './minuteWalk';
import { SAMPLES } from './spreadDesk';
import { useStore } from './store';
import type { TimeScale } from './timeScale';
import type { SpreadControl } from './useStartSpread';

const FACE_PX = 34;

interface Props {
  readonly header: Header;
  /** Only below the headers that are always in view can the row be folded away, for all of them. */
  readonly main: boolean;
  readonly control: SpreadControl;
  readonly scale: TimeScale;
  readonly clock: Clock;
  /** What is past is no chance any more. */
  readonly nowMin: number;
  readonly pointedMin: number | null;
  readonly onPoint: (headerId: string, minute: number | null) => void;
  readonly onGo: (minute: number) => void;
}

/** The chance of going over the limit when starts are early or late, minute by minute, below the header's load. */
export const SpreadRow = memo(function SpreadRow(props: Props) {
  const { header, main, control, scale, clock, nowMin, onGo } = props;
  const { on, choose } = control;
  const spread = useStore(control.store, (s) => s?.byHeader[header.id]) ?? null;
  return (
    <section className="flex border-b border-rule bg-surface" aria-label={`${header.name}: early and late starts`}>
      <div
        className="board-label !bg-surface py-1.5 pr-2 pl-4 max-sm:px-2"
        style={{ minHeight: on ? FACE_PX + 18 : 30 }}
      >
        {main ? (
          <Fold name="Early and late starts" open={on} onToggle={() => choose({ on: !on })} />
        ) : (
          <h2 className="text-xs">Early and late starts</h2>
        )}
        {on && control.known ? <Head {...{ header, main, control, spread, clock, nowMin, onGo }} /> : null}
      </div>
      <div className="board-track" style={{ width: scale.widthPx }}>
        {on && spread?.overChance ? (
          <ChanceFace {...props} chances={spread.overChance} />
        ) : (
          <p className="sticky left-(--label-w) inline-block px-3 py-1.5 text-xs leading-4.5 text-ink-muted">
            <Words control={control} spread={spread} />
          </p>
        )}
      </div>
    </section>
  );
});

function Words({ control, spread }: { readonly control: SpreadControl; readonly spread: SampledSpread | null }) {
  if (!control.on) {
    return (
      <>
        the chance of going over when starts are not on the minute;{' '}
        <a href="/plant/spread" className="link">
          how early and late they are
        </a>
      </>
    );
  }
  if (!control.known) {
    return (
      <>
        No unit has a start spread yet.{' '}
        <a href="/plant/spread" className="link">
          Say how early and late starts are
        </a>
      </>
    );
  }
  if (control.failed) return 'The chances can’t be worked out in this browser. Reload the page to try again.';
  return spread ? 'not judged: no steam limit is set' : `working out ${SAMPLES} weeks…`;
}

interface HeadProps extends Pick<Props, 'header' | 'main' | 'control' | 'clock' | 'nowMin' | 'onGo'> {
  readonly spread: SampledSpread | null;
}

function Head({ header, main, control, spread, clock, nowMin, onGo }: HeadProps) {
  const { confidence, choose } = control;
  const from = nowMin >= 0 && nowMin < (spread?.confidentKgPerH.length ?? 0) ? Math.floor(nowMin) : 0;
  const greatest = useMemo(() => (spread?.overChance ? greatestChance(spread.overChance, from) : null), [spread, from]);
  const tooMuch = greatest !== null && greatest.chance > 1 - confidence;
  return (
    <div className="mt-0.5 flex flex-wrap items-center justify-between gap-x-1 text-2xs leading-4">
      <span data-testid={`greatest-chance-${header.id}`}>
        {greatest ? (
          <button type="button" className="rounded-sm text-left hover:underline" onClick={() => onGo(greatest.minute)}>
            <span className={`text-xs font-semibold ${tooMuch ? 'text-over' : 'text-ink'}`}>
              {percentText(greatest.chance)}
            </span>{' '}
            <span className="text-ink-muted">{clock.dayTime(greatest.minute)}</span>
          </button>
        ) : spread?.overChance ? (
          <span className="font-semibold text-room">never over{from > 0 ? ' from now' : ''}</span>
        ) : null}
      </span>
      {main ? <ConfidenceChoice {...{ confidence, choose }} /> : null}
    </div>
  );
}

function ConfidenceChoice({ confidence, choose }: Pick<SpreadControl, 'confidence' | 'choose'>) {
  return (
    <select
      aria-label="Part of the weeks that the load shown covers"
      title="The load shown is not passed in this part of the weeks"
      className="cursor-pointer rounded-sm border border-edge bg-surface px-0.5 text-2xs"
      value={confidence}
      onChange={(event) => choose({ confidence: Number(event.target.value) as Confidence })}
    >
      {CONFIDENCES.map((one) => (
        <option key={one} value={one}>
          {Math.round(100 * one)} %
        </option>
      ))}
    </select>
  );
}

function ChanceFace({
  header,
  control,
  scale,
  clock,
  pointedMin,
  onPoint,
  chances,
}: Props & { chances: Float64Array }) {
  const { at, props: walking } = minuteWalk({ scale, pointedMin, onPoint: (minute) => onPoint(header.id, minute) });
  const { confidence } = control;
  const drawn = useMemo(() => {
    const strip = { pxPerMin: scale.pxPerMin, heightPx: FACE_PX };
    return { all: chancePath(chances, 0, strip), tooLikely: chancePath(chances, 1 - confidence, strip) };
  }, [chances, confidence, scale.pxPerMin]);
  return (
    <div
      {...walking}
      aria-label={`${header.name}, chance of going over by minute of the week`}
      aria-valuetext={`${clock.dayTime(at)}: chance of going over ${percentText(chances[at] ?? 0)}`}
      className="relative mt-2 cursor-crosshair focus-visible:outline-offset-[-2px]"
      style={{ height: FACE_PX }}
    >
      <svg width={scale.widthPx} height={FACE_PX} className="absolute inset-0" aria-hidden="true" focusable="false">
        <path
          d={`M0 .5H${scale.widthPx}M0 ${FACE_PX / 2}H${scale.widthPx}`}
          className="stroke-rule"
          strokeDasharray="1 5"
        />
        <path d={drawn.all} className="fill-ink-muted" fillOpacity={0.45} />
        <path d={drawn.tooLikely} fill="url(#board-hatch-over)" data-testid="too-likely" />
      </svg>
    </div>
  );
}

import { drawnMode } from '../../core/plant/activity';
import type { Names } from '../../core/schedule/sentences';
import type { Clock } from '../time';
import { Outline } from './Block';
import { modeOn } from './carry';
import { ROW_PX, type Rows } from './rows';
import { useStore, type Store } from './store';
import { xOf, type TimeScale } from './timeScale';
import type { Carrying } from './useCarry';
import { verdictOf, type Fits } from './verdict';

interface Props {
  readonly carried: Store<Carrying | null>;
  readonly rows: Rows;
  readonly scale: TimeScale;
  readonly peak: number;
  readonly names: Names;
  readonly clock: Clock;
}

/** What shows while an activity is carried: starts at which its steam fits, rows it can't run on, and where it lands. */
export function CarryLayer(props: Props) {
  const id = useStore(props.carried, (c) => c?.carry.activity.id ?? null);
  if (id === null) return null;
  return (
    <div className="pointer-events-none absolute top-0 left-(--label-w) z-[5]" style={{ width: props.scale.widthPx }}>
      <Lights {...props} />
      <Landing {...props} />
    </div>
  );
}

function Lights({ carried, rows, scale }: Props) {
  const fits = useStore(carried, (c) => c?.fits ?? null);
  const activity = useStore(carried, (c) => c?.carry.activity ?? null);
  if (!activity || !fits) return null;
  return rows.rows.map((row) => {
    if (row.kind === 'line') return null;
    const eligible = modeOn(activity, row.unit.id) !== undefined;
    return (
      <div
        key={row.unit.id}
        className="absolute left-0 w-full"
        style={{ top: row.top, height: row.height - 1 }}
        data-testid={eligible ? 'lit-row' : 'dim-row'}
      >
        {eligible ? <RowLights {...{ fits, scale }} unitId={row.unit.id} /> : <div className="row-dim" />}
      </div>
    );
  });
}

function RowLights({
  fits,
  scale,
  unitId,
}: {
  readonly fits: Fits;
  readonly scale: TimeScale;
  readonly unitId: string;
}) {
  return (fits.get(unitId) ?? []).map((span) => {
    const style = { left: xOf(scale, span.from), width: Math.max(1, xOf(scale, span.to - span.from)) };
    return (
      <span key={span.from}>
        <span className="fit-ground" style={style} />
        <span className="fit-light" style={style} />
      </span>
    );
  });
}

/** Room to the left of the landing into which its words may move where the view ends. */
const TAG_PX = 300;

function Landing({ carried, rows, scale, peak, names, clock }: Props) {
  const carrying = useStore(carried, (c) => c);
  const target = carrying?.carry.target;
  if (!carrying || !target) return null;
  const { activity } = carrying.carry;
  const mode = modeOn(activity, target.unitId) ?? drawnMode(activity);
  const top = rows.topOfUnit.get(target.unitId);
  if (!mode || top === undefined) return null;
  const verdict = verdictOf(activity.id, target, carrying.fits, carrying.preview, names, clock);
  const left = xOf(scale, target.start);
  const below = top < 60;
  return (
    <>
      <div
        className="landing"
        data-testid="landing"
        data-look={verdict.look}
        style={{ top: top + 4, left, width: Math.max(3, xOf(scale, mode.minutes) - 1) }}
      >
        <Outline mode={mode} peak={peak} />
      </div>
      <div
        className="absolute right-0 z-[8] flex"
        style={{
          left: left - TAG_PX,
          top: below ? top + ROW_PX + 2 : top - 4,
          transform: below ? '' : 'translateY(-100%)',
        }}
      >
        <span className="shrink-0" style={{ width: TAG_PX }} />
        <div className="float sticky right-3 left-(--label-w) max-w-72 self-start px-2 py-1 text-xs">
          <span className="font-semibold whitespace-nowrap">{clock.dayTime(target.start)}</span>{' '}
          <span className={verdict.look === 'over' ? 'text-over' : verdict.look === 'room' ? 'text-room' : ''}>
            {verdict.steam}
          </span>
          {verdict.others.slice(0, 2).map((words) => (
            <span key={words} className="block text-2xs text-ink-muted">
              {words}
            </span>
          ))}
        </div>
      </div>
    </>
  );
}

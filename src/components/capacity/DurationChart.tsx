import { Area, AreaChart, CartesianGrid, ReferenceLine, Tooltip, XAxis, YAxis } from 'recharts';
import { groupDigits } from '../time';
import { useUnits } from '../ui/units';
import type { DurationPoint } from './durationCurve';
import { rateTicks } from './scale';

interface Props {
  readonly points: readonly DurationPoint[];
  readonly width: number;
  readonly height: number;
  /** Usual limit of the week; null: not judged. [kg/h] */
  readonly limitKgPerH: number | null;
}

const TICK = { fill: 'var(--color-ink-muted)', fontSize: 11.5 };

interface Hovered {
  readonly active?: boolean;
  readonly payload?: readonly { readonly payload?: DurationPoint }[];
}

function Reading({ active, payload }: Hovered) {
  const units = useUnits();
  const point = payload?.[0]?.payload;
  if (!active || !point) return null;
  return (
    <p className="rounded-sm border border-rule bg-surface px-2 py-1 text-xs shadow-float">
      {units.rate(point.loadKgPerH)} or more for {point.hours.toFixed(1)} h
    </p>
  );
}

/** The load-duration curve drawn; loaded apart, for it brings a chart library with it. */
export default function DurationChart({ points, width, height, limitKgPerH }: Props) {
  const units = useUnits();
  const hours = points.at(-1)?.hours ?? 168;
  const greatest = Math.max(limitKgPerH ?? 0, points[0]?.loadKgPerH ?? 0);
  const ticks = [0, ...rateTicks(greatest * 1.1, units)];
  return (
    <AreaChart
      width={width}
      height={height}
      data={[...points]}
      margin={{ top: 26, right: 12, bottom: 18, left: 0 }}
      accessibilityLayer
    >
      <CartesianGrid stroke="var(--color-rule)" strokeDasharray="1 4" vertical={false} />
      <XAxis
        dataKey="hours"
        type="number"
        domain={[0, hours]}
        ticks={[0, 24, 48, 72, 96, 120, 144, 168].filter((tick) => tick <= hours)}
        tick={TICK}
        stroke="var(--color-edge)"
        label={{ value: 'hours of the week', position: 'insideBottom', offset: -12, ...TICK }}
      />
      <YAxis
        width={56}
        tick={TICK}
        stroke="var(--color-edge)"
        ticks={ticks}
        domain={[0, ticks.at(-1) ?? greatest]}
        tickFormatter={(rate: number) => groupDigits(units.shown('steamRate', rate))}
        label={{ value: units.symbol('steamRate'), position: 'insideTopLeft', dx: 22, dy: -24, ...TICK }}
      />
      <Tooltip content={<Reading />} isAnimationActive={false} cursor={{ stroke: 'var(--color-ink)' }} />
      <Area
        dataKey="loadKgPerH"
        type="stepAfter"
        stroke="var(--color-steam)"
        strokeWidth={1.5}
        fill="var(--color-steam-soft)"
        isAnimationActive={false}
      />
      {limitKgPerH === null ? null : (
        <ReferenceLine y={limitKgPerH} stroke="var(--color-room)" strokeWidth={2.5} ifOverflow="extendDomain" />
      )}
    </AreaChart>
  );
}

import type { CapacityDto } from '@/contracts/capacity';
import type { HeaderJudgement } from '@/core/header/judgement';
import { NOT_JUDGED_KG_PER_H } from '@/core/header/capacity';
import type { HeaderCapacity } from '@/core/plant/plant';
import { valueAt } from '@/core/time/stepFunction';
import { spanText, type Clock } from '../time';
import { useUnits } from '../ui/units';
import type { Units } from '../units';

interface Props {
  readonly dto: CapacityDto;
  readonly capacity: HeaderCapacity | undefined;
  readonly judged: HeaderJudgement | undefined;
  /** Judged with the largest boiler out. */
  readonly largestOut: HeaderJudgement | undefined;
  readonly clock: Clock;
  readonly nowMin: number;
}

interface Figure {
  readonly name: string;
  readonly value: string;
  readonly unit: string;
  readonly note: string;
  readonly look?: 'over';
}

function overFigure(name: string, judged: HeaderJudgement | undefined, units: Units): Figure {
  const over = judged?.over;
  if (!over) return { name, value: 'not judged', unit: '', note: 'no limit is set' };
  if (over.kg < 0.5) return { name, value: 'nothing', unit: '', note: 'the whole week fits' };
  const places = over.spans.length === 1 ? 'one place' : `${over.spans.length} places`;
  return {
    name,
    value: units.number('mass', over.kg),
    unit: units.symbol('mass'),
    note: `by up to ${units.rate(over.peakOverKgPerH)}, ${spanText(over.minutes)} in ${places}`,
    look: 'over',
  };
}

function figures({ dto, capacity, judged, largestOut, clock, nowMin }: Props, units: Units): Figure[] {
  const round = (kgPerH: number): string => units.number('steamRate', kgPerH);
  const perHour = units.symbol('steamRate');
  const inWeek = nowMin >= 0 && nowMin < dto.horizonMin;
  const minute = inWeek ? nowMin : 0;
  const when = inWeek ? 'now' : 'as the week begins';
  const sent = capacity?.exportKgPerH ? valueAt(capacity.exportKgPerH, minute) : null;
  const limit = capacity?.limitKgPerH ? valueAt(capacity.limitKgPerH, minute) : null;
  const kept = sent === null ? null : sent * (1 - dto.reserveFraction);
  const isSet = limit !== null && (kept === null || limit < kept - 1);
  const isJudged = limit !== null && limit < NOT_JUDGED_KG_PER_H;
  return [
    {
      name: `Net export ${when}`,
      value: sent === null ? 'not known' : round(sent),
      unit: sent === null ? '' : perHour,
      note: sent === null ? 'no boiler feeds this header' : 'of the boilers in fire, at the header',
    },
    {
      name: `Reserve, ${Math.round(dto.reserveFraction * 100)} %`,
      value: sent === null ? 'none' : round(sent * dto.reserveFraction),
      unit: sent === null ? '' : perHour,
      note: 'kept back from the plan',
    },
    {
      name: `Steam limit ${when}`,
      value: isJudged ? round(limit) : 'not judged',
      unit: isJudged ? perHour : '',
      note: !isJudged ? 'no limit is set' : isSet ? 'set by hand' : 'net export less the reserve',
    },
    {
      name: 'Peak of the plan',
      value: judged ? round(judged.peak.kgPerH) : '0',
      unit: perHour,
      note: judged ? clock.dayTime(judged.peak.minute) : '',
    },
    overFigure('Plan over the limit', judged, units),
    ...(capacity?.exportKgPerH ? [overFigure('With the largest boiler out', largestOut, units)] : []),
  ];
}

/** The week in six numbers. */
export function Figures(props: Props) {
  const units = useUnits();
  return (
    <dl className="grid grid-cols-2 gap-x-6 gap-y-4 sm:grid-cols-3 2xl:grid-cols-6">
      {figures(props, units).map(({ name, value, unit, note, look }) => (
        <div key={name} className="flex min-w-0 gap-3">
          {look === 'over' ? <span className="hatch-over w-1 shrink-0 rounded-sm" aria-hidden="true" /> : null}
          <div className="min-w-0">
            <dt className="label">{name}</dt>
            <dd>
              <span className={`text-xl font-semibold ${look === 'over' ? 'text-over' : ''}`}>{value}</span>
              {unit ? <span className="ml-1 text-sm text-ink-muted">{unit}</span> : null}
              <span className="block text-xs text-ink-muted">{note}</span>
            </dd>
          </div>
        </div>
      ))}
    </dl>
  );
}

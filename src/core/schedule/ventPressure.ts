import type { HeaderJudgement } from '../header/judgement';
import type { Activity } from '../plant/activity';
import type { Header, VentGroup } from '../plant/plant';
import { overlapMinutes, type Interval } from '../time/interval';
import type { ProcessBreach } from './breach';
import type { JudgedWeek } from './judged';
import { ventSpans } from './processBreaches';
import { indexOf } from './weekIndex';

/** A vent of an activity. */
interface Vent extends Interval {
  readonly activityId: string;
}

/**
 * Vents below the least header pressure that they were validated at: because the header is set lower, or because it would
 * sag below by the estimate of what is over or too steep at the time. Where the header is set lower, all its vents are one
 * breach. Groups without a least pressure are not judged.
 */
export function ventPressureBreaches(judged: JudgedWeek, headers: readonly HeaderJudgement[]): ProcessBreach[] {
  const { ventGroups, headers: plantHeaders } = judged.week.plant;
  return ventGroups.flatMap((group) => {
    const least = group.leastHeaderBarG ?? null;
    if (least === null) return [];
    return plantHeaders.flatMap((header) => {
      const vents = ventsOf(judged, group, header);
      if (vents.length === 0) return [];
      if (header.pressureBarG < least) return [breachOf(group, vents, header.pressureBarG, least)];
      const sags = sagsOf(headers.find(({ headerId }) => headerId === header.id));
      return vents.flatMap((vent) => {
        const during = sags.filter((sag) => overlapMinutes(vent, sag) > 0);
        const barG = header.pressureBarG - Math.max(0, ...during.map(({ sagBar }) => sagBar));
        return barG >= least ? [] : [breachOf(group, [vent], barG, least)];
      });
    });
  });
}

function ventsOf({ week, drawn }: JudgedWeek, group: VentGroup, header: Header): Vent[] {
  const { units } = indexOf(week);
  const inGroup = ({ placement }: Activity): boolean => {
    const unit = units.get(placement?.unitId ?? '');
    return unit?.ventGroupId === group.id && unit.headerId === header.id;
  };
  return drawn
    .filter(inGroup)
    .flatMap((activity) => ventSpans(activity).map(({ from, to }) => ({ activityId: activity.id, from, to })))
    .sort((a, b) => a.from - b.from || (a.activityId < b.activityId ? -1 : 1));
}

/** Spans in which the header falls, by the estimate; a span whose fall is not known is left out. */
function sagsOf(header: HeaderJudgement | undefined): (Interval & { readonly sagBar: number })[] {
  const over = (header?.over?.spans ?? []).flatMap(({ from, to, sagBar }) => {
    return sagBar === null ? [] : [{ from, to, sagBar }];
  });
  return [...over, ...(header?.steps ?? [])];
}

function breachOf(group: VentGroup, vents: readonly Vent[], barG: number, least: number): ProcessBreach {
  const { activityId, from } = vents[0] as Vent;
  return {
    id: `ventPressure:${activityId}:${from}`,
    class: 'process',
    code: 'ventPressure',
    from,
    to: Math.max(...vents.map((vent) => vent.to)),
    activityIds: [...new Set(vents.map(({ activityId }) => activityId))],
    found: barG,
    limit: least,
    ventGroupId: group.id,
  };
}

import type { HeaderJudgement } from '../header/judgement';
import type { OverSummary } from '../header/over';
import { drawFinder, type DrawFinder } from '../header/whoDraws';
import type { Activity } from '../plant/activity';
import type { PlantModel } from '../plant/plant';
import type { SteamBreach } from './breach';

/** Spans over the limit or over a letdown, and steps too steep, of the headers judged. */
export function steamBreaches(
  headers: readonly HeaderJudgement[],
  source: { readonly plant: PlantModel; readonly activities: readonly Activity[] },
): SteamBreach[] {
  const drawn = drawFinder(source);
  return headers.flatMap((header) => [
    ...overBreaches('overLimit', header.headerId, header.over, drawn),
    ...overBreaches('letdownOver', header.headerId, header.letdown, drawn),
    ...stepBreaches(header, drawn),
  ]);
}

function overBreaches(
  code: 'overLimit' | 'letdownOver',
  headerId: string,
  over: OverSummary | null,
  drawn: DrawFinder,
): SteamBreach[] {
  return (over?.spans ?? []).map((span) => ({
    id: `${code}:${headerId}:${span.from}`,
    class: 'steam',
    code,
    from: span.from,
    to: span.to,
    activityIds: drawn.whoDraws(headerId, span.peakMinute).map((share) => share.activityId),
    headerId,
    overKgPerH: span.peakOverKgPerH,
    kg: span.kg,
    sagBar: span.sagBar,
  }));
}

function stepBreaches(header: HeaderJudgement, drawn: DrawFinder): SteamBreach[] {
  return header.steps.map((step) => ({
    id: `stepTooSteep:${header.headerId}:${step.from}`,
    class: 'steam',
    code: 'stepTooSteep',
    from: step.from,
    to: step.to,
    activityIds: drawn.whoRises(header.headerId, step.from).map((share) => share.activityId),
    headerId: header.headerId,
    overKgPerH: step.heightKgPerH,
    kg: step.kg,
    sagBar: step.sagBar,
  }));
}

import type { Activity, BetweenDraws, LimitUse, Mode, Phase } from '../plant/activity';
import type { Header, PlantModel, Unit, VentGroup } from '../plant/plant';
import { mergeIntervals } from '../time/interval';
import type { Use, UsesBefore } from './problem';

export const headerResource = (headerId: string): string => `header:${headerId}`;
export const letdownResource = (headerId: string): string => `letdown:${headerId}`;
export const ventResource = (groupId: string): string => `vents:${groupId}`;
export const steamOnResource = (groupId: string): string => `steamOns:${groupId}`;
export const limitResource = (limitId: string): string => `limit:${limitId}`;

/** The steam resources that a draw on a header counts against: the header, its letdown, and all those above it. */
export function steamResources(plant: PlantModel, headerId: string | null): string[] {
  const byId = new Map(plant.headers.map((h) => [h.id, h]));
  const found: string[] = [];
  const seen = new Set<string>();
  let header: Header | undefined = headerId === null ? undefined : byId.get(headerId);
  while (header && !seen.has(header.id)) {
    seen.add(header.id);
    found.push(headerResource(header.id));
    if (header.feed.kind !== 'letdown') break;
    found.push(letdownResource(header.id));
    header = byId.get(header.feed.fromHeaderId);
  }
  return found;
}

/** Steam phases as draws on each of the resources. */
export function steamUses(phases: readonly Phase[], resources: readonly string[]): Use[] {
  return phases
    .filter((p) => p.steamKgPerH > 0 && p.minutes > 0)
    .flatMap((p) =>
      resources.map((resourceId) => ({
        resourceId,
        offsetMin: p.offsetMin,
        minutes: p.minutes,
        amount: p.steamKgPerH,
        phase: p.kind,
      })),
    );
}

/** Idling and warming up before a run; the warm-up ends when the run begins. */
export function usesBefore(between: BetweenDraws, resources: readonly string[]): UsesBefore {
  const { idleKgPerH, idleUpToMin, warmUp } = between;
  const minutes = Math.max(0, ...warmUp.map((p) => p.offsetMin + p.minutes));
  return {
    idle: idleKgPerH > 0 ? resources.map((resourceId) => ({ resourceId, amount: idleKgPerH })) : [],
    idleUpToMin,
    warmUp: steamUses(
      warmUp.map((p) => ({ ...p, offsetMin: p.offsetMin - minutes })),
      resources,
    ),
  };
}

/** Uses of shared limits as draws. */
export function limitUses(uses: readonly LimitUse[]): Use[] {
  return uses
    .filter((u) => u.amount > 0 && u.minutes > 0)
    .map((u) => ({
      resourceId: limitResource(u.limitId),
      offsetMin: u.offsetMin,
      minutes: u.minutes,
      amount: u.amount,
      phase: null,
    }));
}

/** A vent counts until the margin after its planned closing has passed; a steam on for the group's own while. */
function ventUses(phases: readonly Phase[], group: VentGroup): Use[] {
  const vents = phases
    .filter((p) => p.kind === 'vent')
    .map((p) => ({ from: p.offsetMin, to: p.offsetMin + p.minutes }));
  return mergeIntervals(vents).map(({ from, to }) => ({
    resourceId: ventResource(group.id),
    offsetMin: from,
    minutes: to - from + group.marginMinutes,
    amount: 1,
    phase: 'vent',
  }));
}

/** The first steam into a retort counts as a steam on. */
function steamOnUses(phases: readonly Phase[], group: VentGroup): Use[] {
  const drawing = phases.filter((p) => p.steamKgPerH > 0).map((p) => p.offsetMin);
  if (drawing.length === 0 || group.steamOnMinutes <= 0) return [];
  return [
    {
      resourceId: steamOnResource(group.id),
      offsetMin: Math.min(...drawing),
      minutes: group.steamOnMinutes,
      amount: 1,
      phase: null,
    },
  ];
}

/** Everything that a mode of an activity draws on, steam first. */
export function modeUses(plant: PlantModel, unit: Unit | undefined, activity: Activity, mode: Mode): Use[] {
  const group = plant.ventGroups.find((g) => g.id === unit?.ventGroupId);
  return [
    ...steamUses(mode.phases, steamResources(plant, unit?.headerId ?? null)),
    ...(group ? ventUses(mode.phases, group) : []),
    ...(group && activity.stage === 'retort' ? steamOnUses(mode.phases, group) : []),
    ...limitUses(mode.uses),
  ];
}

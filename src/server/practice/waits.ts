import type { Link } from '@/core/plant/activity';
import type { LongestWaits } from './practice.repo';

function longestFor({ rule }: Link, waits: LongestWaits): number | null {
  if (rule === 'sinceClosing') return waits.sinceClosingMin;
  return rule === 'initialTemperature' ? waits.initialTemperatureMin : null;
}

/**
 * Links under the plant's longest waits: where a rule is shorter than what the product's document allows, the rule is
 * the process limit, with its source.
 */
export function keptWaits(links: readonly Link[], waits: LongestWaits | null): Link[] {
  return links.map((link) => {
    const longest = waits && longestFor(link, waits);
    if (!waits || longest === null || (link.greatestMin !== null && link.greatestMin <= longest)) return link;
    return { ...link, greatestMin: longest, greatestBreach: 'process', source: waits.source };
  });
}

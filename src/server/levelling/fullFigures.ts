import { plainNetwork } from '@/core/header/network';
import type { LevelFigures, LevellingProposal } from '@/core/levelling/proposal';
import { evaluateWeek, type WeekEvaluation } from '@/core/pipeline';
import type { Week } from '@/core/schedule/week';
import { overlapMinutes } from '@/core/time/interval';
import { overKgOf, tryMoves } from './checkProposal';

/**
 * A proposal with the steam figures that every other page shows: flash steam and accumulators, which the solver does not
 * know, taken off. The same value for a plant that has neither.
 */
export function withFullFigures(week: Week, proposal: LevellingProposal): LevellingProposal {
  if (plainNetwork(week.plant) === week.plant) return proposal;
  const after = tryMoves(week, proposal.moves).evaluation;
  return {
    ...proposal,
    before: steamOf(proposal.before, evaluateWeek(week)),
    after: steamOf(proposal.after, after),
    unresolved: proposal.unresolved.flatMap((left) => {
      const kg = kgWithin(after, left);
      return kg > 0 ? [{ ...left, kg }] : [];
    }),
  };
}

function steamOf(figures: LevelFigures, evaluation: WeekEvaluation): LevelFigures {
  const over = evaluation.headers.flatMap((header) => [header.over, header.letdown]).filter((one) => one !== null);
  return {
    ...figures,
    overKg: overKgOf(evaluation),
    overMinutes: over.reduce((sum, { minutes }) => sum + minutes, 0),
    worstDeficitKg: Math.max(0, ...over.map(({ worstDeficitKg }) => worstDeficitKg)),
    peakKgPerH: Object.fromEntries(evaluation.headers.map(({ headerId, peak }) => [headerId, peak.kgPerH])),
  };
}

/** Steam over on a header in the spans that meet another. [kg] */
function kgWithin({ headers }: WeekEvaluation, left: LevellingProposal['unresolved'][number]): number {
  const header = headers.find(({ headerId }) => headerId === left.headerId);
  const spans = [...(header?.over?.spans ?? []), ...(header?.letdown?.spans ?? [])];
  return spans.filter((span) => overlapMinutes(span, left) > 0).reduce((kg, span) => kg + span.kg, 0);
}

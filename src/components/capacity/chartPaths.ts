import { valueAt, type StepFunction } from '@/core/time/stepFunction';
import { xOf, yOf, type DeskScale } from './scale';

/** Where one step function stands over another, as rectangles between the two. */
export function betweenPath(scale: DeskScale, upper: StepFunction, lower: StepFunction): string {
  const edges = [...new Set([...upper, ...lower].map((step) => step.from).concat(scale.from, scale.to))]
    .filter((minute) => minute >= scale.from && minute <= scale.to)
    .sort((a, b) => a - b);
  return edges
    .slice(0, -1)
    .map((from, i) => {
      const to = edges[i + 1] ?? scale.to;
      const [high, low] = [valueAt(upper, from), valueAt(lower, from)];
      if (high <= low) return '';
      const [left, right] = [xOf(scale, from), Math.max(xOf(scale, to), xOf(scale, from) + 0.75)];
      return `M${left.toFixed(1)} ${yOf(scale, high).toFixed(1)}H${right.toFixed(1)}V${yOf(scale, low).toFixed(1)}H${left.toFixed(1)}Z`;
    })
    .join('');
}

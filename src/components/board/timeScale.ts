/** How much of the week one view shows. */
export type Zoom = 'shift' | 'day' | 'threeDays' | 'week';

/** Minutes that fill the view at each zoom; a shift is shown with some of its neighbours. */
const VIEW_MINUTES: Readonly<Record<Zoom, number>> = { shift: 720, day: 1440, threeDays: 4320, week: 10080 };

export const ZOOMS: readonly { readonly zoom: Zoom; readonly label: string }[] = [
  { zoom: 'shift', label: 'Shift' },
  { zoom: 'day', label: 'Day' },
  { zoom: 'threeDays', label: '3 days' },
  { zoom: 'week', label: 'Week' },
];

/** The week's minutes laid out along x. [px per min] */
export interface TimeScale {
  readonly pxPerMin: number;
  readonly horizonMin: number;
  readonly widthPx: number;
}

/** The scale at which a view of so many px shows a zoom's span; never narrower than the view. */
export function scaleFor(zoom: Zoom, viewPx: number, horizonMin: number): TimeScale {
  const shown = Math.min(zoom === 'week' ? horizonMin : VIEW_MINUTES[zoom], horizonMin);
  const pxPerMin = Math.max(viewPx, 240) / shown;
  return { pxPerMin, horizonMin, widthPx: Math.round(pxPerMin * horizonMin) };
}

/** px from the week's first instant. */
export function xOf(scale: TimeScale, minute: number): number {
  return minute * scale.pxPerMin;
}

/** The minute at so many px, not rounded, within the week. [min] */
export function minuteAt(scale: TimeScale, x: number): number {
  return Math.min(scale.horizonMin, Math.max(0, x / scale.pxPerMin));
}

/** The nearest multiple of `step` whole minutes; a step of 1 or less rounds to the minute. */
export function snap(minute: number, step: number): number {
  const by = Math.max(1, Math.round(step));
  return Math.round(minute / by) * by;
}

/** A start moved so that the activity stays within the week. [min] */
export function clampStart(start: number, minutes: number, horizonMin: number): number {
  return Math.max(0, Math.min(start, horizonMin - minutes));
}

/** Scroll position that brings a span to view, and where it is in view already, the present one. [px] */
export function scrollToSpan(
  view: { readonly left: number; readonly width: number },
  span: { readonly from: number; readonly to: number },
  marginPx = 80,
): number {
  const fits = span.from >= view.left + 8 && span.to <= view.left + view.width - 8;
  if (fits) return view.left;
  const wide = span.to - span.from > view.width - 2 * marginPx;
  if (wide || span.from < view.left) return Math.max(0, span.from - marginPx);
  return Math.max(0, span.to + marginPx - view.width);
}

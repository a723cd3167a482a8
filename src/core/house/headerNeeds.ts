import type { StartUpDraw } from './startUpDraws';

/** A header's mains as far as starting up is concerned. */
export interface StartUpHeader {
  readonly id: string;
  /** The header that a letdown feeds it from; null: boilers feed it. */
  readonly fromHeaderId: string | null;
  /** Opening, warming and draining the mains. [min, kg] */
  readonly warmUpMinutes: number;
  readonly warmUpKg: number;
}

/** When the mains of a header must be opened, and be warmed and drained. */
export interface HeaderNeed {
  readonly header: StartUpHeader;
  readonly openMin: number;
  readonly readyMin: number;
  /** First steam-on of the header, and the warm-ups of machines up to then; none where only headers below need it. */
  readonly firsts: readonly StartUpDraw[];
}

/**
 * What a header and those fed from it need for the draws given (by time), the header's own need first. A header must be
 * ready for its own first draw, and for the opening of the mains below it. Empty where nothing draws. A ring of
 * letdowns ends where it would repeat.
 */
export function headerNeeds(
  headerId: string,
  headers: readonly StartUpHeader[],
  draws: readonly StartUpDraw[],
  above: readonly string[] = [],
): HeaderNeed[] {
  const header = headers.find(({ id }) => id === headerId);
  if (!header || above.includes(headerId)) return [];
  const below = headers
    .filter(({ fromHeaderId }) => fromHeaderId === headerId)
    .flatMap(({ id }) => headerNeeds(id, headers, draws, [...above, headerId]));
  const firsts = firstsOf(draws.filter((draw) => draw.headerId === headerId));
  const wanted = [...firsts.map((draw) => draw.fromMin), ...below.map(({ openMin }) => openMin)];
  if (wanted.length === 0) return [];
  const readyMin = Math.min(...wanted);
  return [{ header, readyMin, openMin: readyMin - header.warmUpMinutes, firsts }, ...below];
}

/** The first run to draw, and warm-ups that begin before it. */
function firstsOf(draws: readonly StartUpDraw[]): StartUpDraw[] {
  const first = draws.find(({ kind }) => kind === 'steamOn');
  const warming = draws.filter(({ kind, fromMin }) => kind === 'warmUp' && (!first || fromMin <= first.fromMin));
  return first ? [...warming, first] : warming;
}

/** Something that a person has to know, kept until it is put away. */
export interface BoardNotice {
  readonly id: number;
  readonly look: 'note' | 'good' | 'over';
  readonly title: string;
  readonly lines: readonly string[];
}

const MOST = 4;

/** The newest last; the same words are not said twice. */
export function addNotice(notices: readonly BoardNotice[], notice: Omit<BoardNotice, 'id'>): BoardNotice[] {
  const words = (n: Omit<BoardNotice, 'id'>): string => [n.title, ...n.lines].join('\n');
  const id = (notices.at(-1)?.id ?? 0) + 1;
  const others = notices.filter((n) => words(n) !== words(notice));
  return [...others, { ...notice, id }].slice(-MOST);
}

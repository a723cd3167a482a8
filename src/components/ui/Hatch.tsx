interface Props {
  /** Unique on the page; used as fill="url(#id)". */
  readonly id: string;
  readonly look?: 'over' | 'quiet';
}

/** The hatch as an SVG pattern: what is over the limit, or closed time. Stands in <defs>. */
export function Hatch({ id, look = 'over' }: Props) {
  const over = look === 'over';
  return (
    <pattern id={id} width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
      {over ? <rect width="5" height="5" className="fill-surface" /> : null}
      <rect width={over ? 2.4 : 1} height="5" className={over ? 'fill-over' : 'fill-rule'} />
    </pattern>
  );
}

/** Dots as an SVG pattern: steam that an accumulator carries. Stands in <defs>; used as fill="url(#id)". */
export function Dots({ id }: { readonly id: string }) {
  return (
    <pattern id={id} width="4" height="4" patternUnits="userSpaceOnUse">
      <rect width="4" height="4" className="fill-surface" />
      <circle cx="2" cy="2" r="1.1" className="fill-steam-deep" />
    </pattern>
  );
}

/** Steadmain's mark: the outline of a vent's steam, a spike that steps down, under the line of the limit. */
export function Mark({ className = 'h-6 w-6' }: { readonly className?: string }) {
  return (
    <svg viewBox="0 0 24 24" className={className} aria-hidden="true" focusable="false">
      <path
        d="M4 21V8h5v7h4v3h7v3z"
        className="fill-steam-soft stroke-steam"
        strokeWidth="1.75"
        strokeLinejoin="miter"
      />
      <path d="M2 4h20" className="stroke-room" strokeWidth="2.25" strokeLinecap="square" />
    </svg>
  );
}

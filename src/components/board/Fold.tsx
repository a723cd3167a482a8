interface Props {
  readonly name: string;
  readonly open: boolean;
  readonly onToggle: () => void;
}

/** The name of a strip that can be folded away. */
export function Fold({ name, open, onToggle }: Props) {
  return (
    <h2 className="text-xs font-semibold">
      <button
        type="button"
        aria-expanded={open}
        onClick={onToggle}
        className="-ml-1 flex max-w-full items-center gap-1 rounded-sm px-1 text-left hover:bg-sunken"
      >
        <svg
          viewBox="0 0 10 10"
          className={`size-2.5 shrink-0 fill-ink-muted ${open ? 'rotate-90' : ''}`}
          aria-hidden="true"
        >
          <path d="M3 1 8 5 3 9z" />
        </svg>
        <span className="max-sm:line-clamp-3 sm:truncate">{name}</span>
      </button>
    </h2>
  );
}

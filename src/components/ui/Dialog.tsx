import { useEffect, useId, useRef, type ReactNode } from 'react';
import { Button } from './Button';

interface Props {
  readonly open: boolean;
  readonly title: string;
  readonly onClose: () => void;
  readonly children: ReactNode;
  /** Stands at the bottom, the main action last. */
  readonly actions?: ReactNode;
  readonly wide?: boolean;
}

/** A modal dialog on the browser's own element: it keeps the focus and closes with Escape. */
export function Dialog({ open, title, onClose, children, actions, wide = false }: Props) {
  const ref = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  useEffect(() => {
    const dialog = ref.current;
    if (!dialog) return;
    if (open && !dialog.open) dialog.showModal();
    if (!open && dialog.open) dialog.close();
  }, [open]);

  return (
    <dialog
      ref={ref}
      aria-labelledby={titleId}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onClick={(event) => {
        if (event.target === event.currentTarget) onClose();
      }}
      className={`m-auto w-full rounded-md border border-rule bg-surface p-0 text-ink shadow-float ${wide ? 'max-w-3xl' : 'max-w-md'} max-h-[calc(100dvh-2rem)]`}
    >
      {open ? (
        <div className="flex flex-col gap-4 p-5">
          <header className="flex items-start justify-between gap-4">
            <h2 id={titleId} className="text-md font-semibold">
              {title}
            </h2>
            <Button look="quiet" size="small" onClick={onClose} aria-label="Close">
              <svg viewBox="0 0 16 16" className="size-4 stroke-current" aria-hidden="true">
                <path d="m3.5 3.5 9 9m0-9-9 9" strokeWidth="1.5" />
              </svg>
            </Button>
          </header>
          <div>{children}</div>
          {actions ? <footer className="flex flex-wrap justify-end gap-2">{actions}</footer> : null}
        </div>
      ) : null}
    </dialog>
  );
}

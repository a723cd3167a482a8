import type { ReactNode } from 'react';

export type TagLook = 'plain' | 'steam' | 'room' | 'over' | 'quiet';

const LOOKS: Readonly<Record<TagLook, string>> = {
  plain: 'border-edge text-ink',
  steam: 'border-steam text-steam-deep bg-steam-soft',
  room: 'border-room text-room bg-room-soft',
  over: 'border-over text-over bg-over-soft',
  quiet: 'border-rule text-ink-muted',
};

/** A word about a thing: demo, late, released. */
export function Tag({ look = 'plain', children }: { readonly look?: TagLook; readonly children: ReactNode }) {
  return (
    <span
      className={`inline-flex items-center rounded-sm border px-1.5 text-2xs font-medium whitespace-nowrap ${LOOKS[look]}`}
    >
      {children}
    </span>
  );
}

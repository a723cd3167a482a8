import { useState } from 'react';
import { Dialog } from '../ui/Dialog';

const KEYS: readonly (readonly [string, string])[] = [
  ['← → ↑ ↓', 'from block to block; Home and End along the unit'],
  ['Enter or M', 'pick up, and put down'],
  ['← →', 'while picked up: by the plant’s snap; with Shift by one minute; Page Up and Down by an hour'],
  ['↑ ↓', 'while picked up: to the next unit that it can run on'],
  ['Esc', 'put back where it was'],
  ['F', 'fix, or free again'],
  ['Delete', 'take off the board'],
  ['Ctrl+Z, Ctrl+Shift+Z', 'undo, make again'],
  ['Alt', 'while dragging: to the minute'],
];

/** The board's keys, shown on demand. */
export function KeyHelp() {
  const [open, setOpen] = useState(false);
  return (
    <>
      <button
        type="button"
        className="text-2xs text-ink-muted underline underline-offset-2 hover:text-ink"
        onClick={() => setOpen(true)}
      >
        Keys
      </button>
      <Dialog open={open} title="The board by keys" onClose={() => setOpen(false)}>
        <dl className="grid grid-cols-[8rem_1fr] gap-x-4 gap-y-1.5 text-sm">
          {KEYS.map(([key, words]) => (
            <div key={key + words} className="contents">
              <dt className="font-medium">{key}</dt>
              <dd className="text-ink-muted">{words}</dd>
            </div>
          ))}
        </dl>
      </Dialog>
    </>
  );
}

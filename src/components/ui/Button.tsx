import type { ButtonHTMLAttributes } from 'react';

export type ButtonLook = 'main' | 'plain' | 'quiet' | 'over';
export type ButtonSize = 'small' | 'usual' | 'floor';

const BASE =
  'inline-flex items-center justify-center gap-2 rounded-md border font-medium select-none ' +
  'transition-colors disabled:cursor-not-allowed disabled:opacity-55 aria-busy:cursor-progress';

const LOOKS: Readonly<Record<ButtonLook, string>> = {
  main: 'border-transparent bg-room text-on-room enabled:hover:bg-room-strong [a&]:hover:bg-room-strong',
  plain: 'border-edge bg-surface text-ink enabled:hover:border-ink [a&]:hover:border-ink',
  quiet: 'border-transparent bg-transparent text-ink enabled:hover:bg-sunken [a&]:hover:bg-sunken',
  over: 'border-over bg-surface text-over enabled:hover:bg-over-soft [a&]:hover:bg-over-soft',
};

const SIZES: Readonly<Record<ButtonSize, string>> = {
  small: 'min-h-7 px-2.5 text-sm whitespace-nowrap',
  usual: 'min-h-9 px-3.5 text-base whitespace-nowrap',
  floor: 'min-h-16 w-full px-5 text-xl font-semibold',
};

/** The classes of a button, for a link that looks like one. */
export function buttonClass(look: ButtonLook = 'plain', size: ButtonSize = 'usual', more = ''): string {
  return `${BASE} ${LOOKS[look]} ${SIZES[size]} ${more}`.trim();
}

interface Props {
  readonly look?: ButtonLook;
  readonly size?: ButtonSize;
  /** Work is under way: the button stays where it is and takes no second press. */
  readonly busy?: boolean;
}

export function Button({
  look,
  size,
  busy,
  className,
  disabled,
  type,
  ...rest
}: Props & ButtonHTMLAttributes<HTMLButtonElement>) {
  return (
    <button
      type={type ?? 'button'}
      className={buttonClass(look, size, className)}
      disabled={disabled || busy}
      aria-busy={busy || undefined}
      {...rest}
    />
  );
}

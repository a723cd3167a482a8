import type { ReactNode } from 'react';
import { useHydrated } from '../useHydrated';
import type { Save } from './useSave';

interface Props {
  readonly onSubmit: Save['submit'];
  readonly children: ReactNode;
}

/** A form drawn by the server takes nothing before the page's scripts do: what was typed until then would be lost. */
export function Form({ onSubmit, children }: Props) {
  const isReady = useHydrated();
  return (
    <form onSubmit={onSubmit} noValidate>
      <fieldset className="contents" disabled={!isReady}>
        {children}
      </fieldset>
    </form>
  );
}

import type { ReactNode } from 'react';
import { Button } from '../Button';
import { Notice } from '../Notice';
import { useHydrated } from '../useHydrated';
import { useUnits } from '../units';
import type { SaveState } from './useSave';

interface Props {
  readonly state: SaveState;
  readonly save?: string;
  readonly saved?: string;
  readonly onCancel?: () => void;
  readonly cancel?: string;
  readonly disabled?: boolean;
  /** Further actions, before saving. */
  readonly children?: ReactNode;
}

/** The foot of a form: how the last save went, then leave and save. */
export function FormActions(props: Props) {
  const { state, save = 'Save', saved = 'Saved.', onCancel, cancel = 'Leave it', disabled = false, children } = props;
  const units = useUnits();
  const isReady = useHydrated();
  return (
    <div className="mt-3 flex flex-wrap items-start justify-end gap-x-4 gap-y-3 border-t border-rule pt-4">
      <div className="min-h-9 min-w-40 flex-1" aria-live="polite">
        {state.kind === 'saved' ? <Notice look="good">{saved}</Notice> : null}
        {state.kind === 'failed' ? (
          <Notice look="over" live>
            {units.message(state.message)}
          </Notice>
        ) : null}
      </div>
      <div className="flex flex-wrap justify-end gap-2">
        {children}
        {onCancel ? <Button onClick={onCancel}>{cancel}</Button> : null}
        <Button type="submit" look="main" busy={state.kind === 'saving'} disabled={disabled || !isReady}>
          {save}
        </Button>
      </div>
    </div>
  );
}

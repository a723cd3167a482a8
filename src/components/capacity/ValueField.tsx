import { useState } from 'react';
import { Field } from '../ui/Field';
import { useUnits } from '../ui/units';
import type { Units } from '../units';
import type { Draft } from './draft';

interface Props {
  readonly draft: Draft;
  /** What the boilers can send less the reserve, the least over the span; null where it is not known. [kg/h] */
  readonly keptKgPerH: number | null;
  readonly error?: string | undefined;
  readonly onChange: (value: number | null) => void;
}

const STATES = [
  { text: 'Lit', is: (share: number) => share >= 1, share: 1 },
  { text: 'Derated', is: (share: number) => share > 0 && share < 1, share: 0.7 },
  { text: 'Shut', is: (share: number) => share <= 0, share: 0 },
] as const;

/** What holds over the span: a rate for the limit, or lit, derated or shut for a boiler. */
export function ValueField(props: Props) {
  return props.draft.subject.kind === 'limit' ? <LimitValue {...props} /> : <ShareValue {...props} />;
}

function LimitValue({ draft, keptKgPerH, error, onChange }: Props) {
  const units = useUnits();
  const [typed, setTyped] = useState<string | null>(null);
  const taken = draft.value === null;
  const above = keptKgPerH !== null && draft.value !== null && draft.value > keptKgPerH + 1;
  const wrong =
    typed !== null && !taken && rateOf(typed, units) === null
      ? `A rate in ${units.symbol('steamRate')}, 0 or more.`
      : undefined;
  const change = (text: string): void => {
    setTyped(text);
    const value = rateOf(text, units);
    if (value !== null) onChange(value);
  };
  return (
    <div>
      <Field
        label="Steam limit"
        unit={units.symbol('steamRate')}
        inputMode="numeric"
        autoComplete="off"
        disabled={taken}
        value={typed ?? (draft.value === null ? '' : String(Math.round(units.shown('steamRate', draft.value))))}
        error={wrong ?? error}
        data-unread={wrong ? '' : undefined}
        hint={above ? 'Above net export less the reserve: that will hold instead.' : undefined}
        onChange={(event) => change(event.target.value)}
        onBlur={() => setTyped(wrong ? typed : null)}
      />
      <label className="flex min-h-7 items-center gap-2 text-sm">
        <input
          type="checkbox"
          className="size-4 accent-room"
          checked={taken}
          onChange={(event) => onChange(event.target.checked ? null : (keptKgPerH ?? 0))}
        />
        Take back what was set here
      </label>
    </div>
  );
}

/** A typed rate [kg/h]; null for what can't be read or is below 0. */
function rateOf(text: string, units: Units): number | null {
  const value = units.parse('steamRate', text);
  return value !== null && value >= 0 ? value : null;
}

function ShareValue({ draft, error, onChange }: Props) {
  const share = draft.value ?? 0;
  const derated = share > 0 && share < 1;
  return (
    <div className="grid grid-cols-[1fr_6.5rem] gap-2">
      <fieldset className="mb-5.5">
        <legend className="label mb-1">The boiler is then</legend>
        <div className="grid min-h-10 grid-cols-3 rounded-md border border-edge bg-surface p-0.5">
          {STATES.map((state) => (
            <label
              key={state.text}
              className="grid place-items-center rounded-sm text-sm has-checked:bg-ink has-checked:font-medium has-checked:text-paper has-focus-visible:outline-2 has-focus-visible:outline-focus"
            >
              <input
                type="radio"
                name="share"
                className="sr-only"
                checked={state.is(share)}
                onChange={() => onChange(state.share)}
              />
              {state.text}
            </label>
          ))}
        </div>
      </fieldset>
      <Field
        label="to"
        aria-label="Derated to, per cent"
        unit="%"
        inputMode="numeric"
        disabled={!derated}
        value={derated ? String(Math.round(share * 100)) : share > 0 ? '100' : '0'}
        error={error}
        onChange={(event) => onChange(Math.min(0.99, Math.max(0.01, (Number(event.target.value) || 1) / 100)))}
      />
    </div>
  );
}

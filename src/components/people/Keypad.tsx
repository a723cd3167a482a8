import { useEffect, useState } from 'react';
import { api, ApiProblem, messageOf } from '../query/api';
import { Button } from '../ui/Button';

const DIGITS = ['1', '2', '3', '4', '5', '6', '7', '8', '9'] as const;
const MOST = { number: 8, pin: 6 } as const;
const TITLES = { number: 'Badge number', pin: 'PIN' } as const;
/** What is half typed is nobody's after so long. */
const FORGET_MS = 30_000;

type Step = 'number' | 'pin';
const EMPTY = { number: '', pin: '' };

const KEY =
  'grid h-16 place-items-center rounded-md border border-edge bg-surface text-2xl font-semibold select-none ' +
  'enabled:active:bg-sunken disabled:opacity-55 sm:h-20';

/** Seconds until the next try, counted down. */
function useWait(): readonly [number, (seconds: number) => void] {
  const [left, setLeft] = useState(0);
  useEffect(() => {
    if (left <= 0) return;
    const timer = setTimeout(() => setLeft(left - 1), 1_000);
    return () => clearTimeout(timer);
  }, [left]);
  return [left, setLeft];
}

/** Badge number, then PIN; sends both and goes to the shift sheet. */
function useBadge() {
  const [step, setStep] = useState<Step>('number');
  const [typed, setTyped] = useState(EMPTY);
  const [fault, setFault] = useState('');
  const [busy, setBusy] = useState(false);
  const [wait, setWait] = useWait();

  const restart = (message = ''): void => {
    setTyped(EMPTY);
    setStep('number');
    setFault(message);
  };
  const refuse = (error: unknown): void => {
    setBusy(false);
    const seconds = error instanceof ApiProblem ? (error.body as { waitSeconds?: unknown } | null)?.waitSeconds : 0;
    if (typeof seconds === 'number') setWait(seconds);
    restart(messageOf(error));
  };
  const send = (): void => {
    setBusy(true);
    api<{ next: string }>('/api/tablet/session', { method: 'POST', body: typed })
      .then(({ next }) => location.assign(next))
      .catch(refuse);
  };
  const press = (digit: string): void => {
    setFault('');
    setTyped((before) => ({ ...before, [step]: (before[step] + digit).slice(0, MOST[step]) }));
  };
  const erase = (): void => {
    if (step === 'pin' && typed.pin === '') return setStep('number');
    setTyped((before) => ({ ...before, [step]: before[step].slice(0, -1) }));
  };
  const isEnough = step === 'number' ? typed.number.length > 0 : typed.pin.length >= 4;
  const go = (): void => {
    if (!isEnough || busy || wait > 0) return;
    if (step === 'number') setStep('pin');
    else send();
  };
  useEffect(() => {
    if (busy || typed === EMPTY) return;
    const timer = setTimeout(() => restart(), FORGET_MS);
    return () => clearTimeout(timer);
  }, [typed, busy]);
  return { step, typed, fault, wait, isEnough, isShut: busy || wait > 0, busy, press, erase, go };
}

function Shown({ step, typed }: { readonly step: Step; readonly typed: Readonly<Record<Step, string>> }) {
  const shown = step === 'number' ? typed.number : '●'.repeat(typed.pin.length);
  return (
    <p
      data-testid="typed"
      aria-live="polite"
      className="mb-4 grid h-16 place-items-center rounded-md border border-edge bg-sunken text-3xl tracking-[0.2em]"
    >
      {step === 'number' ? shown || <span className="text-lg tracking-normal text-ink-muted">—</span> : shown}
    </p>
  );
}

/** The keypad of a tablet on the floor: large enough for gloves, and open to a keyboard or a badge reader. */
export function Keypad() {
  const { step, typed, fault, wait, isEnough, isShut, busy, press, erase, go } = useBadge();
  useEffect(() => {
    const onKey = (event: KeyboardEvent): void => {
      if (isShut || event.ctrlKey || event.metaKey || event.altKey) return;
      if (/^\d$/.test(event.key)) press(event.key);
      else if (event.key === 'Backspace') erase();
      else if (event.key === 'Enter' && !(event.target instanceof HTMLButtonElement)) go();
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  });
  const label = step === 'number' ? 'Next' : 'Sign in';
  return (
    <div className="mx-auto w-full max-w-sm">
      <h1 className="mb-3 text-center text-xl">{TITLES[step]}</h1>
      <Shown {...{ step, typed }} />
      <div className="grid grid-cols-3 gap-2.5">
        {[...DIGITS, 'erase', '0', 'go'].map((key) => {
          if (key === 'erase')
            return (
              <button key={key} type="button" className={`${KEY} text-lg`} disabled={isShut} onClick={erase}>
                {step === 'pin' && typed.pin === '' ? 'Back' : 'Erase'}
              </button>
            );
          if (key === 'go')
            return (
              <Button
                key={key}
                look="main"
                className="h-16 text-lg sm:h-20"
                disabled={!isEnough || wait > 0}
                busy={busy}
                onClick={go}
              >
                {label}
              </Button>
            );
          return (
            <button key={key} type="button" className={KEY} disabled={isShut} onClick={() => press(key)}>
              {key}
            </button>
          );
        })}
      </div>
      <p role="alert" className="mt-4 min-h-12 text-center text-md text-over">
        {wait > 0 ? `Too many wrong tries. Next try in ${wait} s.` : fault}
      </p>
    </div>
  );
}

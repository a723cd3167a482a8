import { useState, type SubmitEvent } from 'react';
import { ApiProblem, messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { Field } from '../ui/Field';
import { Notice } from '../ui/Notice';
import type { Clock } from '../time';
import { useUnits } from '../ui/units';
import type { Units } from '../units';
import { shareText } from './BoilerRow';
import type { Draft } from './draft';
import { MomentField } from './MomentField';
import { ValueField } from './ValueField';
import type { DayOfWeek } from './wallTime';

interface Props {
  readonly draft: Draft;
  /** The header or the boiler by its name. */
  readonly name: string;
  readonly days: readonly DayOfWeek[];
  readonly clock: Clock;
  readonly keptKgPerH: number | null;
  /** What it would do to the plan. */
  readonly outcome: string;
  readonly isWorse: boolean;
  /** What else is to be thought of; null: nothing. */
  readonly caution: string | null;
  readonly error: unknown;
  readonly busy: boolean;
  readonly onChange: (draft: Draft) => void;
  readonly onSave: (reason: string) => void;
  readonly onCancel: () => void;
}

/** What the button does, in words: 'Set the limit to 4 300 kg/h', 'Shut Boiler 2'. */
export function actionText({ subject, value }: Draft, name: string, units: Units): string {
  if (subject.kind === 'limit')
    return value === null ? 'Take the set limit back' : `Set the limit to ${units.rate(value)}`;
  if (value === null || value <= 0) return `Shut ${name}`;
  return value >= 1 ? `Light ${name}` : `Run ${name} ${shareText(value)}`;
}

/** The span being set, typed: from, to, value, reason. */
export function SpanForm(props: Props) {
  const { draft, name, days, clock, onChange } = props;
  const units = useUnits();
  const [reason, setReason] = useState('');
  const [missing, setMissing] = useState(false);
  const problem = props.error instanceof ApiProblem ? props.error.problem : null;
  const said = (message: string | undefined) => message && units.sentence(message);
  const fieldError = (path: string): string | undefined => said(problem?.fields?.find((f) => f.path === path)?.message);
  const shownByField = problem?.fields?.some((f) =>
    ['fromMin', 'toMin', 'limitKgPerH', 'share', 'reason'].includes(f.path),
  );
  const isBackwards = draft.toMin <= draft.fromMin;

  const submit = (event: SubmitEvent): void => {
    event.preventDefault();
    setMissing(reason.trim() === '');
    const unread = (event.currentTarget as HTMLFormElement).querySelector<HTMLElement>('[data-unread]');
    if (unread) return unread.focus();
    if (reason.trim() !== '' && !isBackwards) props.onSave(reason.trim());
  };

  return (
    <form onSubmit={submit} noValidate>
      <h2 className="mb-3 text-md font-semibold">
        {draft.subject.kind === 'limit' ? `Limit of the ${name.toLowerCase()}` : name}
      </h2>
      <MomentField
        label="From"
        minute={draft.fromMin}
        {...{ days, clock }}
        error={fieldError('fromMin')}
        onChange={(fromMin) => onChange({ ...draft, fromMin })}
      />
      <MomentField
        label="To"
        isEnd
        minute={draft.toMin}
        {...{ days, clock }}
        error={isBackwards ? 'The span must end after it begins.' : fieldError('toMin')}
        onChange={(toMin) => onChange({ ...draft, toMin })}
      />
      <ValueField
        draft={draft}
        keptKgPerH={props.keptKgPerH}
        error={fieldError('limitKgPerH') ?? fieldError('share')}
        onChange={(value) => onChange({ ...draft, value })}
      />
      <Field
        className="mt-2"
        label="Why"
        value={reason}
        maxLength={500}
        autoComplete="off"
        placeholder={draft.subject.kind === 'limit' ? 'Boiler 2 on half load' : 'Yearly inspection'}
        error={missing && reason.trim() === '' ? 'Say why in a few words.' : fieldError('reason')}
        onChange={(event) => setReason(event.target.value)}
      />
      <Notice look={props.isWorse ? 'over' : 'good'} className="mb-4 min-h-11">
        {props.outcome}
      </Notice>
      {props.caution ? (
        <Notice look="caution" className="mb-4">
          {props.caution}
        </Notice>
      ) : null}
      <div className="grid gap-2">
        <Button type="submit" look="main" busy={props.busy} disabled={isBackwards}>
          {actionText(draft, name, units)}
        </Button>
        <Button onClick={props.onCancel}>Leave it</Button>
      </div>
      {props.error && !shownByField ? (
        <Notice look="over" live className="mt-3">
          {units.sentence(messageOf(props.error))}
        </Notice>
      ) : null}
    </form>
  );
}

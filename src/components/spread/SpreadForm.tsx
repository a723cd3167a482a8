import { useState } from 'react';
import {
  experienceSchema,
  GREATEST_TYPED_MIN,
  type SpreadListDto,
  type SpreadRequest,
  type SpreadStaleResponse,
  type UnitSpreadDto,
} from '../../contracts/spread';
import { uniformSpread } from '../../core/header/spread/startSpread';
import { api, ApiProblem, messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { FormActions } from '../ui/form/FormActions';
import { NumberField } from '../ui/form/NumberField';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';
import { Notice } from '../ui/Notice';
import { Histogram } from './Histogram';
import { evenMinutes, spanOf, spreadText } from './histogram';

interface Props {
  readonly unit: UnitSpreadDto;
  readonly list: Pick<SpreadListDto, 'weeks' | 'leastCount'>;
  readonly mayEdit: boolean;
  readonly whoMay: string;
  readonly onSaved: (unit: UnitSpreadDto) => void;
}

/** How early or late starts on one unit are, and from where that is known. */
export function SpreadForm(props: Props) {
  const { unit, list, mayEdit, whoMay, onSaved } = props;
  const [turn, setTurn] = useState(0);
  /** Something else than what is typed stands now: the fields start from it. */
  const startAnew = (now: UnitSpreadDto): void => {
    setTurn(turn + 1);
    onSaved(now);
  };
  return (
    <section aria-labelledby="unit-spread" className="rounded-md border border-rule bg-surface p-5">
      <h2 id="unit-spread" className="text-lg font-semibold">
        {unit.name}
      </h2>
      <p className="text-sm" data-testid="spread-now">
        {spreadText(unit.spread)}
        <span className="text-ink-muted">{unit.source ? `, ${unit.source}` : ''}</span>
      </p>
      {mayEdit ? (
        <Experience key={turn} unit={unit} onSaved={onSaved} onStale={startAnew} />
      ) : (
        <Notice look="caution" className="mt-3">
          {whoMay}
        </Notice>
      )}
      <Recorded {...{ unit, list, mayEdit }} onSaved={startAnew} />
    </section>
  );
}

const send = (unit: UnitSpreadDto, request: SpreadRequest): Promise<UnitSpreadDto> =>
  api<UnitSpreadDto>(`/api/units/${encodeURIComponent(unit.unitId)}/spread`, { method: 'POST', body: request });

/** What the server has now, where it refused because somebody was faster. */
function staleUnit(error: unknown): UnitSpreadDto | null {
  if (!(error instanceof ApiProblem) || error.problem.code !== 'SPREAD-STALE') return null;
  return (error.body as SpreadStaleResponse).unit;
}

interface ExperienceProps extends Pick<Props, 'unit' | 'onSaved'> {
  readonly onStale: (now: UnitSpreadDto) => void;
}

function Experience({ unit, onSaved, onStale }: ExperienceProps) {
  const now = evenMinutes(unit.spread);
  const form = useZodForm(experienceSchema, { earlyMin: now?.earlyMin ?? null, lateMin: now?.lateMin ?? null });
  const save = useSave(
    form,
    (values) => send(unit, { kind: 'experience', ...values, seen: unit.seen }),
    (saved) => onSaved(saved),
  );
  const stale = save.state.kind === 'failed' ? staleUnit(save.state.problem) : null;
  const [earlyMin, lateMin] = form.watch(['earlyMin', 'lateMin']);
  const tried = uniformSpread(earlyMin ?? NaN, lateMin ?? NaN);
  const outcomes =
    tried.ok && lateMin <= GREATEST_TYPED_MIN && earlyMin <= GREATEST_TYPED_MIN ? tried.value.outcomes : [];
  return (
    <form className="mt-4" onSubmit={save.submit} noValidate>
      <h3 className="text-base font-semibold">From experience</h3>
      <p className="mt-1 text-sm text-ink-muted">Every minute between the two is taken as equally likely.</p>
      <div className="mt-3 grid grid-cols-2 gap-x-4">
        <NumberField
          control={form.control}
          name="earlyMin"
          label="Early by up to"
          unit="min"
          min={0}
          max={GREATEST_TYPED_MIN}
        />
        <NumberField
          control={form.control}
          name="lateMin"
          label="Late by up to"
          unit="min"
          min={0}
          max={GREATEST_TYPED_MIN}
        />
      </div>
      <Histogram
        outcomes={outcomes}
        span={spanOf([outcomes])}
        heightPx={36}
        withAxis
        label={spreadText({ outcomes })}
      />
      <FormActions state={save.state} saved="Saved. Open boards have it now.">
        {stale ? <Button onClick={() => onStale(stale)}>See what it is now</Button> : null}
      </FormActions>
    </form>
  );
}

function Recorded({ unit, list, mayEdit, onSaved }: Omit<Props, 'whoMay'>) {
  const { recorded } = unit;
  const [failure, setFailure] = useState<unknown>(null);
  const [busy, setBusy] = useState(false);
  const set = async (kind: 'recorded' | 'onTime'): Promise<void> => {
    setBusy(true);
    setFailure(null);
    try {
      onSaved(await send(unit, { kind, seen: unit.seen }));
    } catch (error) {
      const stale = staleUnit(error);
      if (stale) onSaved(stale);
      setFailure(error);
    }
    setBusy(false);
  };
  const enough = recorded.count >= list.leastCount;
  return (
    <div className="mt-5 border-t border-rule pt-4">
      <h3 className="text-base font-semibold">From recorded starts</h3>
      <p className="mt-1 text-sm text-ink-muted">{recordedText(recorded, list)}</p>
      {recorded.count > 0 ? (
        <div className="mt-3">
          <Histogram
            outcomes={recorded.outcomes}
            span={spanOf([recorded.outcomes])}
            heightPx={56}
            withAxis
            look="quiet"
            label={`Recorded starts of ${unit.name}: ${spreadText(recorded)}`}
          />
        </div>
      ) : null}
      {failure ? (
        <Notice look="over" live className="mt-3">
          {messageOf(failure)}
        </Notice>
      ) : null}
      {mayEdit ? (
        <div className="mt-3 flex flex-wrap gap-2">
          <Button busy={busy} disabled={!enough} onClick={() => void set('recorded')}>
            Take the recorded starts
          </Button>
          <Button look="quiet" busy={busy} disabled={unit.spread === null} onClick={() => void set('onTime')}>
            Take starts as on time
          </Button>
        </div>
      ) : null}
    </div>
  );
}

function recordedText({ count, leftOut, outcomes }: UnitSpreadDto['recorded'], list: Props['list']): string {
  const span = `of the last ${list.weeks} weeks`;
  const out = leftOut === 0 ? '' : ` ${leftOut} more than a day out are left out.`;
  if (count === 0) return `The floor has recorded no start ${span} against an issue.${out}`;
  const starts = count === 1 ? '1 start' : `${count} starts`;
  const few = count < list.leastCount ? ` At least ${list.leastCount} are needed to plan by.` : '';
  return `${starts} ${span}, against the issue then on the floor: ${spreadText({ outcomes })}.${few}${out}`;
}

import { useMemo } from 'react';
import type { CapacityDto } from '@/contracts/capacity';
import type { HeaderJudgement } from '@/core/header/judgement';
import type { HeaderCapacity, PlantModel } from '@/core/plant/plant';
import { sayingIn } from '@/core/quantity/saying';
import { limitAboveStudy } from '@/core/schedule/limitAboveStudy';
import { valueAt } from '@/core/time/stepFunction';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import type { Clock } from '../time';
import { useUnits } from '../ui/units';
import type { Units } from '../units';
import { firstDraft, type Draft, type Subject } from './draft';
import { fireLitBy, overWith } from './preview';
import { limitSnap, segments } from './scale';
import { actionText, SpanForm } from './SpanForm';
import type { DayOfWeek } from './wallTime';

interface Props {
  readonly dto: CapacityDto;
  readonly headerId: string;
  readonly plant: PlantModel;
  readonly capacity: HeaderCapacity | undefined;
  readonly judged: HeaderJudgement | undefined;
  readonly days: readonly DayOfWeek[];
  readonly clock: Clock;
  readonly nowMin: number;
  readonly draft: Draft | null;
  readonly canSet: boolean;
  readonly whoMay: string;
  /** What was saved last, in words. */
  readonly saved: string | null;
  readonly busy: boolean;
  readonly error: unknown;
  readonly onDraft: (draft: Draft | null) => void;
  readonly onSave: (reason: string) => void;
}

function nameOf(subject: Subject, dto: CapacityDto): string {
  const found =
    subject.kind === 'limit'
      ? dto.headers.find((h) => h.id === subject.headerId)
      : dto.boilers.find((b) => b.id === subject.boilerId);
  return found?.name ?? '';
}

/** 'Shut Boiler 2, Tue 12:00 to Tue 14:00' */
export function spanSummary(draft: Draft, dto: CapacityDto, clock: Clock, units: Units): string {
  const span = `${clock.dayTime(draft.fromMin)} to ${clock.dayTime(draft.toMin)}`;
  return `${actionText(draft, nameOf(draft.subject, dto), units)}, ${span}`;
}

function outcomeOf(before: HeaderJudgement['over'], after: HeaderJudgement['over'], units: Units): string {
  if (!after) return 'Without a limit the plan is not judged.';
  const now = before && before.kg >= 0.5 ? units.mass(before.kg) : 'nothing';
  if (after.kg < 0.5)
    return before && before.kg >= 0.5 ? `Nothing is over any more; now ${now}.` : 'The plan still fits.';
  const places = after.spans.length === 1 ? 'one place' : `${after.spans.length} places`;
  return `The plan would be over by ${units.mass(after.kg)} in ${places}; now ${now}.`;
}

/** The least that the boilers send over a span, less the reserve. [kg/h] */
function keptOver(draft: Draft, capacity: HeaderCapacity | undefined, reserveFraction: number): number | null {
  if (!capacity?.exportKgPerH) return null;
  const parts = segments(capacity.exportKgPerH, draft.fromMin, draft.toMin);
  return Math.min(...parts.map((part) => part.value)) * (1 - reserveFraction);
}

/** A limit above what the studies of vent groups on the header saw. */
function studyCaution({ subject, value }: Draft, plant: PlantModel, units: Units): string | null {
  if (subject.kind !== 'limit' || value === null) return null;
  return limitAboveStudy(plant, subject.headerId, value, sayingIn(units.system));
}

/** When a boiler that the draft lights can export. */
function readyCaution(draft: Draft, dto: CapacityDto, clock: Clock): string | null {
  const { subject } = draft;
  const boiler = subject.kind === 'firing' ? dto.boilers.find(({ id }) => id === subject.boilerId) : undefined;
  const fire = boiler && fireLitBy(draft, boiler, dto.horizonMin);
  if (!fire) return null;
  const lit = `Lit ${clock.dayTime(fire.litMin)}, ${fire.start}`;
  return fire.readyMin < fire.outMin
    ? `${lit}: steam leaves it from ${clock.dayTime(fire.readyMin)}.`
    : `${lit}: it is out again before steam can leave it.`;
}

/** The side of the desk: what can be set, the span being set, or who may. */
export function DeskPanel(props: Props) {
  const { dto, headerId, capacity, judged, draft, clock, nowMin } = props;
  const units = useUnits();
  const snap = limitSnap(units);
  const boilers = useMemo(() => dto.boilers.filter((b) => b.headerId === headerId), [dto.boilers, headerId]);
  if (!props.canSet) return <Notice title="To be read">{props.whoMay}</Notice>;

  if (draft) {
    const input = capacity && judged;
    const after = input
      ? overWith(draft, { capacity, reserveFraction: dto.reserveFraction, boilers, loadKgPerH: judged.loadKgPerH })
      : null;
    const before = judged?.over ?? null;
    return (
      <SpanForm
        key={JSON.stringify(draft.subject)}
        draft={draft}
        name={nameOf(draft.subject, dto)}
        keptKgPerH={keptOver(draft, capacity, dto.reserveFraction)}
        outcome={outcomeOf(before, after, units)}
        caution={studyCaution(draft, props.plant, units) ?? readyCaution(draft, dto, clock)}
        isWorse={(after?.kg ?? 0) > (before?.kg ?? 0) + 0.5}
        onChange={props.onDraft}
        onCancel={() => props.onDraft(null)}
        {...{ days: props.days, clock, error: props.error, busy: props.busy, onSave: props.onSave }}
      />
    );
  }

  const limitNow = capacity?.limitKgPerH ? valueAt(capacity.limitKgPerH, Math.max(0, nowMin)) : 0;
  const begin = (subject: Subject, value: number): void =>
    props.onDraft(firstDraft(subject, nowMin, dto.horizonMin, value));
  return (
    <section>
      <h2 className="mb-1 text-md font-semibold">Set the limit or a boiler</h2>
      <p className="mb-4 text-sm text-ink-muted">
        Take hold of the green line and pull it to where it should be, or draw along a boiler’s bar. Or type it:
      </p>
      <div className="grid gap-2">
        <Button
          className="justify-start"
          onClick={() => begin({ kind: 'limit', headerId }, Math.round(Math.min(limitNow, 1e6) / snap) * snap)}
        >
          Steam limit…
        </Button>
        {boilers.map((boiler) => (
          <Button
            key={boiler.id}
            className="justify-start"
            onClick={() =>
              begin(
                { kind: 'firing', boilerId: boiler.id },
                valueAt(boiler.share, Math.min(dto.horizonMin - 1, Math.max(0, nowMin + 60))) > 0 ? 0 : 1,
              )
            }
          >
            {boiler.name}…
          </Button>
        ))}
      </div>
      <div className="mt-4 min-h-12" aria-live="polite">
        {props.saved ? (
          <Notice look="good" title="In force, and told to the planners">
            {props.saved}
          </Notice>
        ) : null}
      </div>
    </section>
  );
}

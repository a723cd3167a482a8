import { useMemo, useState } from 'react';
import type { CapacityDto } from '@/contracts/capacity';
import type { WeekDto } from '@/contracts/week';
import { evaluateWeek } from '@/core/pipeline';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import { makeClock } from '../time';
import { useUnits } from '../ui/units';
import { DeskChart } from './DeskChart';
import { DeskPanel, spanSummary } from './DeskPanel';
import type { Draft } from './draft';
import { Figures } from './Figures';
import { HouseSections } from './HouseSections';
import { Legend } from './Legend';
import { capacityOf } from './preview';
import { RecordTable } from './RecordTable';
import { useCapacity } from './useCapacity';
import { daysOf } from './wallTime';
import { WeekLinks } from './WeekLinks';

export interface DeskProps {
  readonly capacity: CapacityDto;
  readonly week: WeekDto;
  readonly canSet: boolean;
  /** 'Only a utilities lead of ... may do this.' */
  readonly whoMay: string;
}

/** The utilities lead's desk: what the boilers can send, what may be used of it, and what the plan asks for. */
export function Desk({ canSet, whoMay, ...first }: DeskProps) {
  const { capacity: dto, week, connected, save } = useCapacity(first);
  const [headerId, setHeaderId] = useState(() => dto.boilers[0]?.headerId ?? dto.headers[0]?.id ?? '');
  const [dayDate, setDayDate] = useState<string | null>(null);
  const [draft, setDraft] = useState<Draft | null>(null);
  const [saved, setSaved] = useState<string | null>(null);

  const { firstInstant, timeZone } = dto;
  const clock = useMemo(() => makeClock({ firstInstant, timeZone }), [firstInstant, timeZone]);
  const days = useMemo(() => daysOf(clock, dto.horizonMin), [clock, dto.horizonMin]);
  const evaluation = useMemo(
    () => evaluateWeek({ ...week.week, capacities: dto.capacities }),
    [week.week, dto.capacities],
  );
  const largestOut = useMemo(
    () => evaluateWeek({ ...week.week, capacities: dto.largestOut }).headers,
    [week.week, dto.largestOut],
  );
  const units = useUnits();
  const capacity = capacityOf(dto, headerId);
  const header = evaluation.headers.find((h) => h.headerId === headerId);
  const nowMin = clock.minuteOf(dto.now);

  const change = (next: Draft | null): void => {
    setDraft(next);
    setSaved(null);
    save.reset();
  };
  const store = (reason: string): void => {
    if (!draft) return;
    const done = spanSummary(draft, dto, clock, units);
    save.mutate(
      { draft, reason },
      {
        onSuccess: () => {
          setDraft(null);
          setSaved(done);
        },
      },
    );
  };

  return (
    <div className="grid flex-1 lg:grid-cols-[minmax(0,1fr)_20rem]">
      <div className="min-w-0 space-y-6 px-4 py-5 sm:px-6">
        <div className="flex flex-wrap items-center justify-between gap-3">
          <WeekLinks path="/capacity" weekStart={dto.weekStart} days={days} />
          <div className="flex flex-wrap items-center gap-1">
            {dto.headers.length > 1 ? (
              <div className="flex gap-1" role="group" aria-label="Header">
                {dto.headers.map((h) => (
                  <Button
                    key={h.id}
                    size="small"
                    look={h.id === headerId ? 'plain' : 'quiet'}
                    aria-pressed={h.id === headerId}
                    onClick={() => {
                      setHeaderId(h.id);
                      change(null);
                    }}
                  >
                    {h.name}, {units.text('gaugePressure', h.pressureBarG)}
                  </Button>
                ))}
              </div>
            ) : null}
            <a className="link px-2 text-sm" href={`/working/header/${headerId}`}>
              Working
            </a>
          </div>
        </div>
        <Figures
          {...{ dto, capacity, judged: header, clock, nowMin }}
          largestOut={largestOut.find((h) => h.headerId === headerId)}
        />
        <section aria-label="The week">
          <div className="mb-2 flex flex-wrap items-center justify-between gap-2">
            <Legend hasLargestOut={Boolean(capacity?.exportKgPerH)} hasCarried={Boolean(header?.carried)} />
            <div className="-ml-2 flex flex-wrap gap-0.5" role="group" aria-label="What is shown">
              {[{ date: null, text: 'Week' }, ...days.map((d) => ({ date: d.date, text: d.label.slice(0, 3) }))].map(
                ({ date, text }) => (
                  <Button
                    key={text}
                    size="small"
                    look={date === dayDate ? 'plain' : 'quiet'}
                    className="px-1.5 max-sm:px-1"
                    aria-pressed={date === dayDate}
                    onClick={() => setDayDate(date)}
                  >
                    {text}
                  </Button>
                ),
              )}
            </div>
          </div>
          {header ? (
            <DeskChart
              {...{ dto, headerId, capacity, judged: header, days, clock, nowMin, draft, canSet }}
              largestOut={dto.largestOut.find((one) => one.headerId === headerId)}
              day={days.find((d) => d.date === dayDate) ?? null}
              onDraft={change}
            />
          ) : null}
        </section>
        {header ? (
          <div className="grid items-start gap-x-8 gap-y-10 xl:grid-cols-2">
            <HouseSections {...{ dto, days, clock }} plant={week.week.plant} drawn={evaluation.drawn} judged={header}>
              <section aria-labelledby="record-heading">
                <h2 id="record-heading" className="mb-3 text-md font-semibold">
                  Record of changes
                </h2>
                <RecordTable entries={dto.entries} clock={clock} horizonMin={dto.horizonMin} />
              </section>
            </HouseSections>
          </div>
        ) : null}
      </div>
      <aside className="border-rule bg-surface px-4 py-5 max-lg:border-t sm:px-5 lg:border-l">
        <div className="space-y-5 lg:sticky lg:top-[calc(var(--header-height)+1.25rem)]">
          <DeskPanel
            {...{ dto, headerId, capacity, judged: header, days, clock, nowMin, draft, canSet, whoMay, saved }}
            plant={week.week.plant}
            busy={save.isPending}
            error={save.error}
            onDraft={change}
            onSave={store}
          />
          {connected ? null : (
            <Notice look="caution" live>
              No connection: what you see may be out of date. Trying again.
            </Notice>
          )}
          <p className="border-t border-rule pt-4 text-xs text-ink-muted">
            The steam load is an estimate to plan by: gauges, instruments and interlocks decide. Work on boilers and
            steam is for licensed people under local codes.
          </p>
        </div>
      </aside>
    </div>
  );
}

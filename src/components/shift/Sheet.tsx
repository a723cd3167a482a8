import { useMemo, useState } from 'react';
import type { ShiftRowDto, ShiftSheetDto } from '@/contracts/floor';
import { phasesPeakKgPerH } from '@/core/demand/activityLoad';
import { drawnMode } from '@/core/plant/activity';
import { messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import { makeClock } from '../time';
import { PrintSheet } from './PrintSheet';
import { groupRows } from './rows';
import { ShiftCard } from './ShiftCard';
import { useNowMinute, useShiftSheet } from './useShiftSheet';

export interface SheetProps {
  readonly sheet: ShiftSheetDto;
  readonly canRecord: boolean;
  /** 'Only a line supervisor of ... may do this.' */
  readonly whoMay: string;
}

const greatestPeak = (rows: readonly ShiftRowDto[]): number =>
  rows.reduce((most, { activity }) => Math.max(most, phasesPeakKgPerH(drawnMode(activity)?.phases ?? [])), 0);

/** One line's shift from the issue on the floor: what is in hand, what comes, what is done. */
export function Sheet({ sheet: first, canRecord, whoMay }: SheetProps) {
  const { sheet, connected, record } = useShiftSheet(first);
  const [openedWith] = useState(first.issue?.id ?? null);
  const clock = useMemo(() => makeClock(first), [first]);
  const nowMin = useNowMinute(sheet, clock);
  const topKgPerH = useMemo(() => greatestPeak(sheet.rows), [sheet.rows]);
  const { inHand, later, done } = groupRows(sheet.rows, nowMin);
  const { issue } = sheet;

  if (!issue)
    return (
      <section className="rounded-md border border-rule bg-surface px-5 py-8">
        <h2 className="text-xl">Nothing on the floor yet</h2>
        <p className="mt-2 text-lg text-ink-muted">
          The planner has not put this week on the floor. This page fills itself as soon as that is done.
        </p>
      </section>
    );

  const groups = [
    { name: 'In hand', rows: inHand, empty: 'Nothing needs a hand just now.' },
    { name: 'To come', rows: later, empty: null },
    { name: 'Done', rows: done, empty: null },
  ];
  return (
    <>
      <div className="space-y-6 print:hidden">
        <p className="flex items-center justify-between gap-4 text-md">
          <span>
            <strong className="font-semibold">Issue {issue.number}</strong>,{' '}
            <span className="text-ink-muted">on the floor since {clock.instantDayTime(issue.at)}</span>
          </span>
          <Button className="min-h-14 shrink-0 px-5" onClick={() => window.print()}>
            Print
          </Button>
        </p>
        {openedWith !== null && issue.id !== openedWith ? (
          <Notice look="caution" live title={`Issue ${issue.number} is on the floor now.`}>
            Times may have changed since you opened this page.
          </Notice>
        ) : null}
        {connected ? null : (
          <Notice look="over" live title="No connection">
            What you see may be out of date, and nothing can be recorded until it is back.
          </Notice>
        )}
        {canRecord ? null : <Notice title="To be read">{whoMay}</Notice>}
        {groups.map(({ name, rows, empty }) =>
          rows.length === 0 && !empty ? null : (
            <section key={name} aria-label={name}>
              <h2 className="mb-2 text-md text-ink-muted">
                {name} {rows.length > 0 ? <span className="font-normal">{rows.length}</span> : null}
              </h2>
              {rows.length === 0 ? <p className="text-lg">{empty}</p> : null}
              <ul className="space-y-3">
                {rows.map((row) => {
                  const mine = record.variables?.activityId === row.activity.id;
                  return (
                    <ShiftCard
                      key={row.activity.id}
                      {...{ row, clock, nowMin, topKgPerH, canRecord }}
                      inHand={name === 'In hand'}
                      busy={mine && record.isPending}
                      failure={mine && record.error ? messageOf(record.error) : null}
                      onRecord={(event) => record.mutate({ activityId: row.activity.id, event })}
                    />
                  );
                })}
              </ul>
            </section>
          ),
        )}
        <p className="border-t border-rule pt-4 text-sm text-ink-muted">
          Not the retort record that regulations ask for. Scheduled processes come from a process authority; Steadmain
          never alters temperature or time of one. Gauges, instruments and interlocks decide.
        </p>
      </div>
      <PrintSheet sheet={sheet} clock={clock} />
    </>
  );
}

import type { ShiftSheetDto } from '@/contracts/floor';
import type { FloorEventKind } from '@/core/shift/floorEvent';
import { groupDigits, type Clock } from '../time';

interface Props {
  readonly sheet: ShiftSheetDto;
  readonly clock: Clock;
}

const COLUMNS: readonly (readonly [FloorEventKind, string])[] = [
  ['steamOn', 'Steam on'],
  ['ventsClosed', 'Vents closed'],
  ['timingStarted', 'Process timing started'],
  ['steamOff', 'Steam off'],
  ['empty', 'Empty'],
];

/** The sheet on paper: the plan small, room beside it to write. Shown in print only. */
export function PrintSheet({ sheet, clock }: Props) {
  const { shift, issue } = sheet;
  return (
    <div className="hidden print:block">
      <header className="mb-3 flex items-end justify-between border-b-2 border-ink pb-2">
        <div>
          <h1 className="text-[15pt]">
            {sheet.line.name}, {shift.name}
          </h1>
          <p>
            {clock.day(shift.from)}, {clock.time(shift.from)} to {clock.time(shift.to)} · {sheet.plantName}
            {sheet.isDemo ? ' (demo)' : ''}
          </p>
        </div>
        <p className="text-right">
          {issue
            ? `Issue ${groupDigits(issue.number)}, on the floor since ${clock.instantDayTime(issue.at)}`
            : 'No issue'}
          <br />
          Printed {clock.instantDayTime(sheet.now)}
        </p>
      </header>
      <table className="w-full border-collapse [&_td]:border [&_td]:border-ink [&_td]:px-1.5 [&_td]:py-1 [&_td]:align-top [&_th]:border [&_th]:border-ink [&_th]:px-1.5 [&_th]:py-1 [&_th]:text-left [&_th]:font-semibold">
        <thead>
          <tr>
            <th>Unit, batch</th>
            <th>Begin</th>
            <th>Steam on by</th>
            {COLUMNS.map(([kind, name]) => (
              <th key={kind}>{name}</th>
            ))}
            <th>Initials</th>
          </tr>
        </thead>
        <tbody>
          {sheet.rows.map((row) => (
            <tr key={row.activity.id} className="h-[13mm]">
              <td className="w-[40mm]">
                <strong className="font-semibold">{row.unitName}</strong> {row.activity.code}
                <br />
                {row.activity.title}
              </td>
              <td className="w-[13mm] text-[8pt]">{clock.time(row.start)}</td>
              <td className="w-[16mm] font-semibold">{row.steamOnBy ? clock.time(row.steamOnBy.minute) : ''}</td>
              {COLUMNS.map(([kind]) => {
                const planned = row.planned.find((event) => event.kind === kind);
                return (
                  <td key={kind} className={`w-[19mm] text-[8pt] ${planned ? '' : 'hatch-quiet'}`}>
                    {planned ? clock.time(planned.minute) : ''}
                  </td>
                );
              })}
              <td className="w-[17mm]" />
            </tr>
          ))}
        </tbody>
      </table>
      <p className="mt-3">
        A sheet to work by, not the retort record that regulations ask for. Scheduled processes come from a process
        authority; Steadmain never alters temperature or time of one. Small times are as planned; write what happened.
      </p>
    </div>
  );
}

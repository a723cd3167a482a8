import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import type { ShiftSheetDto } from '@/contracts/floor';
import type { FloorEventDto } from '@/contracts/week';
import type { FloorEventKind } from '@/core/shift/floorEvent';
import { api } from '../query/api';
import { usePlantEvents } from '../query/usePlantEvents';
import type { Clock } from '../time';

const TICK_MS = 10_000;

/** The minute of the week by the server's clock, going on from when the sheet was read. */
export function useNowMinute(sheet: ShiftSheetDto, clock: Clock): number {
  const [minute, setMinute] = useState(() => clock.minuteOf(sheet.now));
  useEffect(() => {
    const readAt = performance.now();
    const serverMs = Date.parse(sheet.now);
    const tick = (): void => setMinute(clock.minuteOf(new Date(serverMs + performance.now() - readAt).toISOString()));
    tick();
    const timer = setInterval(tick, TICK_MS);
    return () => clearInterval(timer);
  }, [sheet.now, clock]);
  return minute;
}

function withEvent(sheet: ShiftSheetDto, event: FloorEventDto): ShiftSheetDto {
  const rows = sheet.rows.map((row) =>
    row.activity.id === event.activityId ? { ...row, events: [...row.events, event] } : row,
  );
  return { ...sheet, rows };
}

/** The sheet kept fresh by the plant's notices, and the way to record what happened now. */
export function useShiftSheet(first: ShiftSheetDto) {
  const client = useQueryClient();
  const { weekStart, line, shift } = first;
  const key = ['shift-sheet', weekStart, line.id, shift.shiftId, shift.date];
  const search = new URLSearchParams({ line: line.id, shift: shift.shiftId, date: shift.date });
  const sheet = useQuery({
    queryKey: key,
    queryFn: ({ signal }) => api<ShiftSheetDto>(`/api/weeks/${weekStart}/shift-sheet?${search}`, { signal }),
    initialData: first,
  });
  const connected = usePlantEvents((notice) => {
    if (notice === null || notice.kind === 'floor' || notice.kind === 'issue')
      void client.invalidateQueries({ queryKey: key });
  });
  const record = useMutation({
    mutationFn: (what: { readonly activityId: string; readonly event: FloorEventKind }) =>
      api<FloorEventDto>(`/api/weeks/${weekStart}/floor-events`, {
        method: 'POST',
        body: { ...what, issueId: sheet.data.issue?.id ?? '' },
      }),
    onSuccess: (event) => {
      client.setQueryData<ShiftSheetDto>(key, (now) => now && withEvent(now, event));
      void client.invalidateQueries({ queryKey: key });
    },
  });
  return { sheet: sheet.data, connected, record };
}

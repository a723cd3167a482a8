import { useUnits } from '../../ui/units';
import type { FormContext } from '../fields';
import { summed, type HourStep } from '../hours';
import { WeekStrip } from '../WeekStrip';

/** A shared limit over the week, drawn small. */
export function LimitFollows({ typed, library }: FormContext) {
  const unit = typeof typed.unit === 'string' ? typed.unit : '';
  const steps = (typed.capacity ?? []) as HourStep[];
  return <WeekStrip {...{ steps }} weekStartsOn={library.weekStartsOn} text={(v) => `${v} ${unit}`} title="Capacity" />;
}

const isSpan = (from: unknown, to: unknown): boolean => Number.isFinite(from) && Number.isFinite(to);

/** All base load of the header over the week, with what is typed. */
export function BaseFollows({ typed, id, library }: FormContext) {
  const units = useUnits();
  const { headerId, fromHour, toHour, kgPerH } = typed;
  const others = library.things.baseLoads
    .filter((load) => load.id !== id && load.retiredAt === null && load.values.headerId === headerId)
    .map(({ values }) => ({ ...values, value: values.kgPerH }));
  const own = isSpan(fromHour, toHour) && Number.isFinite(kgPerH);
  const mine = own ? [{ fromHour: Number(fromHour), toHour: Number(toHour), value: Number(kgPerH) }] : [];
  const text = (value: number): string => units.text('steamRate', value);
  return (
    <div className="space-y-4">
      <WeekStrip steps={summed(mine)} weekStartsOn={library.weekStartsOn} text={text} title="This base load" />
      {others.length > 0 ? (
        <WeekStrip
          steps={summed([...others, ...mine])}
          weekStartsOn={library.weekStartsOn}
          text={text}
          title="All base load of the header"
        />
      ) : null}
    </div>
  );
}

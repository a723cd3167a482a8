import type { DutiesDto, DutyDto } from '@/contracts/duties';
import type { UnitSystem } from '@/core/quantity/display';
import { Tag } from '../ui/Tag';
import { UnitsProvider, useUnits } from '../ui/units';
import { DemandOutline } from '../working/DemandOutline';
import { differencesOf, figuresOf } from './demand';
import { MODEL_OPTIONS } from './formModel';

interface Props {
  readonly dto: DutiesDto;
  readonly system: UnitSystem;
}

/** The plant's duties by kind, each with what it draws; drawn on the server. */
export function DutyRows({ dto, system }: Props) {
  const kinds = MODEL_OPTIONS.map(({ value, label }) => ({
    label,
    duties: dto.duties.filter((duty) => duty.model === value),
  })).filter(({ duties }) => duties.length > 0);
  return (
    <UnitsProvider system={system}>
      {kinds.map(({ label, duties }) => (
        <section key={label} className="mt-8" aria-label={label}>
          <h2 className="mb-1 text-md font-semibold">{label}</h2>
          <ul className="divide-y divide-rule border-y border-rule">
            {duties.map((duty) => (
              <Row key={duty.id} dto={dto} duty={duty} />
            ))}
          </ul>
        </section>
      ))}
    </UnitsProvider>
  );
}

function Row({ dto, duty }: { readonly dto: DutiesDto; readonly duty: DutyDto }) {
  const figures = figuresOf(dto, duty.headerId, duty.duty);
  const routes = duty.uses.filter(({ kind }) => kind !== 'plan').map(({ text }) => text);
  const differs = duty.duty !== null && differencesOf(duty.duty, duty.processData).length > 0;
  return (
    <li className="grid grid-cols-[minmax(0,1fr)_auto] items-center gap-x-5 gap-y-1 py-2.5 sm:grid-cols-[minmax(0,1fr)_6rem_17rem]">
      <div className="min-w-0">
        <a className="link text-base font-medium" href={`/duties/${duty.id}`}>
          {duty.name}
        </a>{' '}
        {duty.isRetired ? <Tag look="quiet">out of use</Tag> : null}
        {differs ? <Tag look="over">another process than in its data</Tag> : null}
        <p className="truncate text-xs text-ink-muted">{routes.length > 0 ? routes.join(' · ') : 'not used yet'}</p>
      </div>
      {figures?.ok ? (
        <DemandOutline small grid={figures.value.grid} minutes={figures.value.minutes} />
      ) : (
        <span className="text-xs text-over">needs a look</span>
      )}
      <Figures figures={figures} fault={duty.fault} />
    </li>
  );
}

function Figures({
  figures,
  fault,
}: {
  readonly figures: ReturnType<typeof figuresOf>;
  readonly fault: string | null;
}) {
  const units = useUnits();
  if (!figures?.ok) {
    const sentence = fault ?? (figures ? figures.error.message : '');
    return <p className="col-span-full text-xs text-ink-muted sm:col-span-1">{units.sentence(sentence)}</p>;
  }
  const { peakKgPerH, steamKg, minutes } = figures.value;
  return (
    <p className="col-span-full grid grid-cols-3 gap-x-4 text-sm sm:col-span-1 sm:text-right">
      <span className="whitespace-nowrap">{units.text('steamRate', peakKgPerH)}</span>
      <span className="whitespace-nowrap">{units.text('mass', steamKg)}</span>
      <span className="whitespace-nowrap">{minutes}&nbsp;min</span>
    </p>
  );
}

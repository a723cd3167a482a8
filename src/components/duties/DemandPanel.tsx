import type { DutyDto } from '@/contracts/duties';
import type { Duty } from '@/core/duty/duty';
import type { DutyModel } from '@/core/duty/model';
import type { Result } from '@/core/result';
import { Notice } from '../ui/Notice';
import { useUnits } from '../ui/units';
import { DemandOutline } from '../working/DemandOutline';
import { PHASE_NAMES } from '../working/numbers';
import { WorkingSteps } from '../working/WorkingSteps';
import { demandOf, differencesOf } from './demand';

interface Props {
  readonly model: DutyModel['model'];
  /** As typed; null while figures are missing or out of range. */
  readonly duty: DutyModel | null;
  readonly worked: Result<Duty> | null;
  readonly faultsLeft: number;
  readonly headerName: string;
  readonly processData: DutyDto['processData'];
  /** Where the saved duty's working stands, for print; null for one that is not saved. */
  readonly workingHref: string | null;
}

/** What the duty as typed draws: outline, totals, what to look at, and how each figure comes about. */
export function DemandPanel({ duty, worked, faultsLeft, headerName, processData, workingHref }: Props) {
  return (
    <section aria-label="Steam that it draws" className="space-y-5">
      <h2 className="text-md font-semibold">Steam that it draws</h2>
      {worked?.ok ? (
        <Drawn duty={worked.value} headerName={headerName} />
      ) : (
        <Waiting faultsLeft={faultsLeft} sentence={worked && !worked.ok ? worked.error.message : null} />
      )}
      {duty ? <Differences duty={duty} processData={processData} /> : null}
      {worked?.ok ? <Working duty={worked.value} workingHref={workingHref} /> : null}
    </section>
  );
}

function Waiting({ faultsLeft, sentence }: { readonly faultsLeft: number; readonly sentence: string | null }) {
  const units = useUnits();
  const figures = faultsLeft === 1 ? 'One figure is' : `${faultsLeft} figures are`;
  return (
    <>
      <div className="flex h-48 items-center justify-center rounded-md bg-sunken px-6 text-center text-sm text-ink-muted">
        The outline is drawn once it can be worked out.
      </div>
      <Notice look={sentence ? 'over' : 'note'}>
        {sentence ? units.sentence(sentence) : `${figures} still missing or out of range.`}
      </Notice>
    </>
  );
}

function Drawn({ duty, headerName }: { readonly duty: Duty; readonly headerName: string }) {
  const units = useUnits();
  const { grid, minutes, steamKg, peakKgPerH } = demandOf(duty);
  return (
    <>
      <dl className="flex flex-wrap gap-x-8 gap-y-2" aria-live="polite">
        <Figure name="Greatest draw" value={units.text('steamRate', peakKgPerH)} />
        <Figure name="Steam" value={units.text('mass', steamKg)} />
        <Figure name="Length" value={`${minutes}\u00a0min`} />
      </dl>
      <DemandOutline grid={grid} minutes={minutes} />
      <p className="text-xs text-ink-muted">
        On whole minutes, on the steam of the {headerName.toLowerCase()}.
        {duty.neverMoved ? ' Once it runs it is neither moved nor stopped.' : ''}
      </p>
      {duty.working.warnings.map((warning) => (
        <Notice key={warning} look="over">
          {units.sentence(warning)}
        </Notice>
      ))}
      <Phases duty={duty} />
    </>
  );
}

function Figure({ name, value }: { readonly name: string; readonly value: string }) {
  return (
    <div>
      <dt className="label">{name}</dt>
      <dd className="text-lg font-semibold">{value}</dd>
    </div>
  );
}

function Phases({ duty }: { readonly duty: Duty }) {
  const units = useUnits();
  return (
    <div className="max-h-72 overflow-y-auto">
      <table className="handbook">
        <thead>
          <tr>
            <th scope="col">phase</th>
            <th scope="col">min</th>
            <th scope="col">{units.symbol('steamRate')}</th>
            <th scope="col">{units.symbol('mass')}</th>
          </tr>
        </thead>
        <tbody>
          {duty.phases.map((phase, index) => (
            <tr key={index}>
              <td>{PHASE_NAMES[phase.kind] ?? phase.kind}</td>
              <td className="number">{Number(phase.minutes.toFixed(1))}</td>
              <td className="number">{units.number('steamRate', phase.steamKgPerH)}</td>
              <td className="number">{units.number('mass', (phase.steamKgPerH * phase.minutes) / 60)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Differences({ duty, processData }: { readonly duty: DutyModel; readonly processData: Props['processData'] }) {
  const units = useUnits();
  return differencesOf(duty, processData).map(({ document, isReleased, sentences }) => (
    <Notice key={document} look="over" title={`Another process than ${isReleased ? 'released' : 'entered'}`}>
      <p>{document}</p>
      <ul className="mt-1 list-disc pl-4">
        {sentences.map((sentence) => (
          <li key={sentence}>{units.sentence(sentence)}</li>
        ))}
      </ul>
    </Notice>
  ));
}

function Working({ duty, workingHref }: { readonly duty: Duty; readonly workingHref: string | null }) {
  return (
    <div className="space-y-3 border-t border-rule pt-4">
      {duty.working.cautions.map((caution) => (
        <p key={caution} className="text-xs text-ink-muted">
          {caution}
        </p>
      ))}
      {workingHref ? (
        <p className="text-sm">
          <a className="link" href={workingHref}>
            The saved duty’s working, for print
          </a>
        </p>
      ) : null}
      <details>
        <summary className="text-sm font-medium">Show the working as typed</summary>
        <WorkingSteps working={duty.working} compact />
      </details>
    </div>
  );
}

import { Fragment } from 'react';
import type { Working, WorkingInput, WorkingStep } from '@/core/duty/working';
import { quantityOfUnit } from '@/core/quantity/display';
import { inUnits, type Units } from '../units';
import { useUnits } from '../ui/units';
import { fullDigits } from './numbers';
import { formulaPieces } from './symbols';

interface Section {
  readonly name: string;
  readonly steps: { readonly number: number; readonly step: WorkingStep }[];
}

function sectionsOf(steps: readonly WorkingStep[]): Section[] {
  const sections: Section[] = [];
  steps.forEach((step, index) => {
    const last = sections.at(-1);
    const numbered = { number: index + 1, step };
    if (last?.name === step.section) last.steps.push(numbered);
    else sections.push({ name: step.section, steps: [numbered] });
  });
  return sections;
}

/** Formula, inputs and source of every figure, in order. Formulas hold in SI; another system stands beside. */
export function WorkingSteps({ working, compact = false }: { readonly working: Working; readonly compact?: boolean }) {
  return sectionsOf(working.steps).map((section, index) => (
    <section key={`${index} ${section.name}`} className={compact ? 'mt-5' : 'mt-8'}>
      <h2 className={compact ? 'mb-2 text-md' : 'mb-3 text-lg'}>{section.name}</h2>
      <ol className="space-y-4">
        {section.steps.map(({ number, step }) => (
          <Step key={number} number={number} step={step} />
        ))}
      </ol>
    </section>
  ));
}

function Step({ number, step }: { readonly number: number; readonly step: WorkingStep }) {
  const units = useUnits();
  return (
    <li className="keep-together grid grid-cols-[2.25rem_minmax(0,1fr)] gap-x-2">
      <span className="pt-0.5 text-right text-sm text-ink-muted">({number})</span>
      <div className="min-w-0 border-l border-rule pl-4">
        <p className="text-sm text-ink-muted">{units.sentence(step.name)}</p>
        <p className="text-md break-words">
          <strong className="font-semibold">
            <Formula text={step.symbol} />
          </strong>
          {step.formula ? (
            <>
              {'\u00a0= '}
              <Formula text={step.formula} />
            </>
          ) : null}
          <span className="whitespace-nowrap">
            {'\u00a0=\u00a0'}
            <strong className="font-semibold text-steam-deep">{fullDigits(step.value)}</strong>
            {'\u00a0'}
            {step.unit}
          </span>
          {beside(units, step)}
        </p>
        {step.inputs.length > 0 ? <Inputs inputs={step.inputs} /> : null}
        <p className="text-xs text-ink-muted">{step.source}</p>
      </div>
    </li>
  );
}

function Inputs({ inputs }: { readonly inputs: readonly WorkingInput[] }) {
  return (
    <p className="mt-0.5 flex flex-wrap gap-x-5 text-sm">
      {inputs.map((input) => (
        <span key={input.symbol} className="whitespace-nowrap">
          <span className="text-ink-muted">
            <Formula text={input.symbol} />
          </span>
          {'\u00a0'}
          {fullDigits(input.value)}
          {'\u00a0'}
          {input.unit}
        </span>
      ))}
    </p>
  );
}

/** The figure in the units shown, where they are not those of the formula. */
function beside(units: Units, { value, unit }: WorkingStep) {
  if (units.system === 'si' || !quantityOfUnit(unit)) return null;
  const shown = inUnits(units, value, unit);
  return (
    <span className="whitespace-nowrap text-ink-muted">
      {' '}
      ({fullDigits(shown.value)}
      {'\u00a0'}
      {shown.unit})
    </span>
  );
}

/** A formula with its indices set low. */
export function Formula({ text }: { readonly text: string }) {
  return formulaPieces(text).map(({ text: piece, isLow }, index) =>
    isLow ? (
      <sub key={index} className="text-[0.72em]">
        {piece}
      </sub>
    ) : (
      <Fragment key={index}>{piece}</Fragment>
    ),
  );
}

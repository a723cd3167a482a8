import { useState } from 'react';
import { useController, type Control, type FieldError, type FieldPath, type FieldValues } from 'react-hook-form';
import { Field } from '../Field';
import { useUnits } from '../units';
import type { Units } from '../../units';
import { figureText, figureValue, spanSaid, unitShown, type FigureKind } from './figure';

interface Props<Values extends FieldValues, Output> extends FigureKind {
  readonly control: Control<Values, unknown, Output>;
  readonly name: FieldPath<Values>;
  readonly label: string;
  readonly hint?: string;
  /** Ends of the range, in SI: said in a fault and, where there is no hint, below the field. */
  readonly min?: number;
  readonly max?: number;
  /** The figure that the form started from for want of a better one, in SI; marked as long as it stands. */
  readonly standard?: number | null | undefined;
  /** What the mark says. */
  readonly standardMark?: string;
  readonly disabled?: boolean;
  readonly className?: string;
}

const UNREADABLE = 'This can’t be read as a figure, such as 1 500 or 0.5.';

const isSame = (a: unknown, b: unknown): boolean => Object.is(a ?? null, b ?? null);

/** A figure in the units shown, kept in SI: a number, null where nothing is entered, NaN where the text can't be read. */
export function NumberField<Values extends FieldValues, Output>(props: Props<Values, Output>) {
  const { control, name, label, hint, min, max, standard, standardMark = 'plant-specific default' } = props;
  const units = useUnits();
  const { field, fieldState } = useController({ control, name });
  const { ref, onChange, onBlur } = field;
  const [typed, setTyped] = useState<string | null>(null);
  const value = field.value as number | null | undefined;
  const isTyped = typed !== null && isSame(figureValue(units, props, typed), value);
  const span = spanSaid(units, props, min, max);
  const change = (text: string): void => {
    setTyped(text);
    onChange(figureValue(units, props, text));
  };
  const isStandard = standard !== undefined && standard !== null && value === standard;
  return (
    <Field
      ref={ref}
      name={name}
      label={label}
      unit={unitShown(units, props)}
      mark={isStandard ? standardMark : undefined}
      inputMode="decimal"
      autoComplete="off"
      disabled={props.disabled}
      className={props.className ?? ''}
      hint={hint ?? (span === '' ? undefined : span)}
      error={Number.isNaN(value) ? UNREADABLE : faultSaid(units, fieldState.error, span)}
      value={isTyped ? typed : figureText(units, props, value)}
      onChange={(event) => change(event.target.value)}
      onBlur={() => {
        onBlur();
        if (!Number.isNaN(value)) setTyped(null);
      }}
    />
  );
}

/** A range that the field knows is said with its unit; any other sentence has its figures in the units shown. */
function faultSaid(units: Units, error: FieldError | undefined, span: string): string | undefined {
  if (!error) return undefined;
  const isOutside = error.type === 'too_small' || error.type === 'too_big';
  if (isOutside && span !== '') return `It must be ${span}.`;
  return units.sentence(error.message ?? 'This is not right.');
}

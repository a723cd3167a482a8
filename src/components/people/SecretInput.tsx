import { useController, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { Field } from '../ui/Field';

interface Props<Values extends FieldValues, Output> {
  readonly control: Control<Values, unknown, Output>;
  readonly name: FieldPath<Values>;
  readonly label: string;
  readonly hint?: string;
  readonly autoComplete: 'current-password' | 'new-password' | 'off';
  /** Typed on a keypad. */
  readonly isDigits?: boolean;
}

/** A password or PIN: never shown. */
export function SecretInput<Values extends FieldValues, Output>(props: Props<Values, Output>) {
  const { control, name, label, hint, autoComplete, isDigits = false } = props;
  const { field, fieldState } = useController({ control, name });
  const { value, ref, ...hands } = field;
  return (
    <Field
      {...hands}
      ref={ref}
      type="password"
      label={label}
      hint={hint}
      autoComplete={autoComplete}
      inputMode={isDigits ? 'numeric' : undefined}
      value={value ?? ''}
      error={fieldState.error?.message}
      className="mb-1"
    />
  );
}

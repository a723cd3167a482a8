import { useController, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { Field, SelectField, TextField } from '../Field';

interface Props<Values extends FieldValues, Output> {
  readonly control: Control<Values, unknown, Output>;
  readonly name: FieldPath<Values>;
  readonly label: string;
  readonly hint?: string;
  readonly disabled?: boolean;
  readonly className?: string;
}

interface TextProps<Values extends FieldValues, Output> extends Props<Values, Output> {
  readonly maxLength?: number;
  readonly placeholder?: string;
  /** Several lines. */
  readonly long?: boolean;
}

/** A line of text, or several. */
export function TextInput<Values extends FieldValues, Output>({ long = false, ...props }: TextProps<Values, Output>) {
  const { control, name, className = '', ...shown } = props;
  const { field, fieldState } = useController({ control, name });
  const { value, ref, ...hands } = field;
  const text = { ...shown, ...hands, className, error: fieldState.error?.message, autoComplete: 'off' };
  const words = (value as string | null | undefined) ?? '';
  return long ? <TextField {...text} ref={ref} value={words} /> : <Field {...text} ref={ref} value={words} />;
}

interface SelectProps<Values extends FieldValues, Output> extends Props<Values, Output> {
  readonly options: readonly { readonly value: string; readonly label: string }[];
  /** Offered first and kept as null: 'none', 'not said'. */
  readonly none?: string;
}

/** One of a list. */
export function SelectInput<Values extends FieldValues, Output>(props: SelectProps<Values, Output>) {
  const { control, name, options, none, className = '', ...shown } = props;
  const { field, fieldState } = useController({ control, name });
  const { value, onChange, ...hands } = field;
  return (
    <SelectField
      {...shown}
      {...hands}
      className={className}
      error={fieldState.error?.message}
      value={value ?? ''}
      onChange={(event) => onChange(none !== undefined && event.target.value === '' ? null : event.target.value)}
    >
      {none === undefined ? null : <option value="">{none}</option>}
      {options.map((option) => (
        <option key={option.value} value={option.value}>
          {option.label}
        </option>
      ))}
    </SelectField>
  );
}

/** Yes or no. */
export function CheckInput<Values extends FieldValues, Output>(props: Props<Values, Output>) {
  const { control, name, label, hint, disabled, className = '' } = props;
  const { field, fieldState } = useController({ control, name });
  const { value, onChange, ...hands } = field;
  const note = fieldState.error?.message ?? hint;
  return (
    <div className={className}>
      <label className="flex min-h-10 items-center gap-2.5 text-md">
        <input
          {...hands}
          type="checkbox"
          className="size-4.5 accent-room"
          disabled={disabled}
          aria-invalid={fieldState.error ? true : undefined}
          aria-describedby={note ? `${name}-note` : undefined}
          checked={Boolean(value)}
          onChange={(event) => onChange(event.target.checked)}
        />
        {label}
      </label>
      <p id={`${name}-note`} className={`mt-1 min-h-4.5 text-xs ${fieldState.error ? 'text-over' : 'text-ink-muted'}`}>
        {note}
      </p>
    </div>
  );
}

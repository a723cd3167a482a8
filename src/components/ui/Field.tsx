import {
  useId,
  type InputHTMLAttributes,
  type ReactNode,
  type Ref,
  type SelectHTMLAttributes,
  type TextareaHTMLAttributes,
} from 'react';

const BOX =
  'flex min-h-10 items-center rounded-md border bg-surface transition-colors ' +
  'has-[:focus-visible]:outline-2 has-[:focus-visible]:outline-offset-2 has-[:focus-visible]:outline-focus ';
const INPUT = 'min-w-0 flex-1 bg-transparent px-3 py-2 text-md outline-none disabled:opacity-60';

interface FrameProps {
  readonly label: string;
  /** Stands inside the field, after the value. */
  readonly unit?: string;
  readonly hint?: ReactNode;
  readonly error?: string | undefined;
  readonly className?: string;
  /** Stands beside the label, such as the mark of a default. */
  readonly mark?: ReactNode;
}

interface Described {
  readonly id: string;
  readonly 'aria-invalid'?: true;
  readonly 'aria-describedby'?: string;
}

/** Label above, unit inside, hint or error below; the line below is kept free so that an error moves nothing. */
function Frame({
  label,
  unit,
  hint,
  error,
  className,
  mark,
  children,
}: FrameProps & { readonly children: (described: Described) => ReactNode }) {
  const id = useId();
  const note = error ?? hint;
  const described: Described = {
    id,
    ...(error ? { 'aria-invalid': true } : {}),
    ...(note ? { 'aria-describedby': `${id}-note` } : {}),
  };
  return (
    <div className={className}>
      <div className="mb-1 flex items-baseline justify-between gap-2">
        <label htmlFor={id} className="label">
          {label}
        </label>
        {mark ? <span className="text-2xs text-ink-muted">{mark}</span> : null}
      </div>
      <div className={`${BOX} ${error ? 'border-over' : 'border-edge'}`}>
        {children(described)}
        {unit ? <span className="pr-3 text-sm text-ink-muted">{unit}</span> : null}
      </div>
      <p id={`${id}-note`} className={`mt-1 min-h-4.5 text-xs ${error ? 'text-over' : 'text-ink-muted'}`}>
        {note}
      </p>
    </div>
  );
}

export function Field({
  label,
  unit,
  hint,
  error,
  className,
  mark,
  ...input
}: FrameProps & Omit<InputHTMLAttributes<HTMLInputElement>, 'className'> & { readonly ref?: Ref<HTMLInputElement> }) {
  return (
    <Frame {...{ label, unit, hint, error, className, mark }}>
      {(described) => <input {...described} {...input} className={INPUT} />}
    </Frame>
  );
}

export function TextField({
  label,
  hint,
  error,
  className,
  ...area
}: Omit<FrameProps, 'unit'> &
  Omit<TextareaHTMLAttributes<HTMLTextAreaElement>, 'className'> & { readonly ref?: Ref<HTMLTextAreaElement> }) {
  return (
    <Frame {...{ label, hint, error, className }}>
      {(described) => <textarea rows={3} {...described} {...area} className={`${INPUT} resize-y`} />}
    </Frame>
  );
}

export function SelectField({
  label,
  hint,
  error,
  className,
  mark,
  children,
  ...select
}: Omit<FrameProps, 'unit'> &
  Omit<SelectHTMLAttributes<HTMLSelectElement>, 'className'> & { readonly ref?: Ref<HTMLSelectElement> }) {
  return (
    <Frame {...{ label, hint, error, className, mark }}>
      {(described) => (
        <select {...described} {...select} className={`${INPUT} cursor-pointer [&>option]:bg-surface`}>
          {children}
        </select>
      )}
    </Frame>
  );
}

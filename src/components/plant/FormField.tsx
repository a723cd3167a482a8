import type { Control } from 'react-hook-form';
import { NumberField } from '../ui/form/NumberField';
import { SelectInput, TextInput } from '../ui/form/TextInput';
import type { FieldSpec, FormContext } from './fields';
import { StepsEditor } from './StepsEditor';

interface Props {
  readonly spec: FieldSpec;
  readonly control: Control<Record<string, unknown>, unknown, unknown>;
  readonly context: FormContext;
}

/** One field of a thing's form. */
export function FormField({ spec, control, context }: Props) {
  if (spec.isShown && !spec.isShown(context)) return null;
  const { name, label } = spec;
  switch (spec.type) {
    case 'text':
      return <TextInput {...{ control, name, label }} {...(spec.hint ? { hint: spec.hint } : {})} />;
    case 'select': {
      const { none, hint } = spec;
      const more = { ...(none ? { none } : {}), ...(hint ? { hint } : {}) };
      return <SelectInput {...{ control, name, label }} options={spec.options(context)} {...more} />;
    }
    case 'steps': {
      const typed = (context.typed[name] ?? []) as { fromHour: unknown; value: unknown }[];
      const unit = typeof context.typed.unit === 'string' ? context.typed.unit : '';
      return <StepsEditor {...{ control, name, typed, unit }} weekStartsOn={context.library.weekStartsOn} />;
    }
    case 'number': {
      const hint = spec.hint?.(context);
      const { range, standard } = spec;
      return (
        <NumberField
          {...{ control, name, label }}
          unit={range.unit}
          min={range.min}
          max={range.max}
          {...(hint === undefined ? {} : { hint })}
          {...(context.id === null && standard !== undefined ? { standard } : {})}
        />
      );
    }
  }
}

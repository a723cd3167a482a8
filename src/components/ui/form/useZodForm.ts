import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, type DefaultValues, type FieldValues, type Resolver, type UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';

type FormSchema = z.ZodType<FieldValues, FieldValues>;

/** What a form starts from: as its schema takes it, with figures that may still be missing. */
export type Blank<Values> = Values extends number
  ? Values | null
  : Values extends readonly (infer Item)[]
    ? Blank<Item>[]
    : Values extends object
      ? { [Key in keyof Values]: Blank<Values[Key]> }
      : Values;

export type ZodForm<Schema extends FormSchema> = UseFormReturn<z.input<Schema>, unknown, z.output<Schema>>;

/** Said of a field where its schema says nothing of its own. */
function sentenceOf(issue: z.core.$ZodRawIssue): string | undefined {
  const { input } = issue;
  const isMissing = input === null || input === undefined || input === '';
  switch (issue.code) {
    case 'invalid_type':
      if (isMissing) return issue.expected === 'number' ? 'Enter a figure.' : 'Enter something here.';
      return issue.expected === 'number' || issue.expected === 'int' ? 'This figure can’t be read.' : undefined;
    case 'too_small':
      if (issue.origin === 'string')
        return isMissing ? 'Enter something here.' : `At least ${issue.minimum} characters.`;
      return issue.inclusive === false ? `More than ${issue.minimum}.` : `At least ${issue.minimum}.`;
    case 'too_big':
      if (issue.origin === 'string') return `At most ${issue.maximum} characters.`;
      return issue.inclusive === false ? `Less than ${issue.maximum}.` : `At most ${issue.maximum}.`;
    case 'invalid_value':
      return 'Choose one of the list.';
    default:
      return undefined;
  }
}

/**
 * A form that its schema checks: a field once it has been left, all of them on saving. A figure that can't be read
 * stands in the values as NaN, a missing one as null.
 */
export function useZodForm<Schema extends FormSchema>(
  schema: Schema,
  defaults: Blank<z.input<Schema>>,
): ZodForm<Schema> {
  return useForm<z.input<Schema>, unknown, z.output<Schema>>({
    resolver: zodResolver(schema, { error: sentenceOf }) as unknown as Resolver<
      z.input<Schema>,
      unknown,
      z.output<Schema>
    >,
    defaultValues: defaults as DefaultValues<z.input<Schema>>,
    mode: 'onTouched',
  });
}

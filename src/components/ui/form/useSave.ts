import { useState, type FormEvent } from 'react';
import { get, type FieldPath, type FieldValues, type UseFormReturn } from 'react-hook-form';
import { ApiProblem, messageOf } from '../../query/api';

/** How the last save of a form went. */
export type SaveState =
  | { readonly kind: 'idle' | 'saving' | 'saved' }
  /** `problem` is null where a field of the form itself was at fault. */
  | { readonly kind: 'failed'; readonly message: string; readonly problem: ApiProblem | null };

export interface Save {
  readonly state: SaveState;
  readonly submit: (event?: FormEvent) => void;
  /** Forgets how the last save went. */
  readonly clear: () => void;
}

const IDLE: SaveState = { kind: 'idle' };

/** Messages of faults that no field of the form shows. */
function unseen(errors: Readonly<Record<string, unknown>>): string[] {
  return Object.values(errors).flatMap((error) => {
    if (typeof error !== 'object' || error === null || 'ref' in error) return [];
    if ('message' in error && typeof error.message === 'string') return [error.message];
    return unseen(error as Record<string, unknown>);
  });
}

/** Puts what the server said of fields at the fields; gives what belongs to none of them. */
function showProblem<Values extends FieldValues, Output>(
  form: UseFormReturn<Values, unknown, Output>,
  error: ApiProblem,
): string[] {
  const values = form.getValues();
  const fields = error.problem.fields ?? [];
  const placed = fields.map(({ path, message }) => ({
    message,
    path: [path, path.replace(/^values\./, '')].find((name) => name !== '' && get(values, name) !== undefined),
  }));
  const known = placed.filter(({ path }) => path !== undefined);
  known.forEach(({ path, message }, index) =>
    form.setError(path as FieldPath<Values>, { type: 'server', message }, { shouldFocus: index === 0 }),
  );
  return placed.filter((field) => !known.includes(field)).map(({ message }) => message);
}

/**
 * Saves a form: its schema first, then `save`. What the server refuses stands at the field it belongs to, and the focus
 * moves to the first; nothing typed is lost.
 */
export function useSave<Values extends FieldValues, Output, Saved>(
  form: UseFormReturn<Values, unknown, Output>,
  save: (values: Output) => Promise<Saved>,
  onSaved?: (saved: Saved) => void,
): Save {
  const [state, setState] = useState<SaveState>(IDLE);
  const send = async (values: Output): Promise<void> => {
    setState({ kind: 'saving' });
    try {
      const saved = await save(values);
      setState({ kind: 'saved' });
      onSaved?.(saved);
    } catch (error) {
      const rest = error instanceof ApiProblem ? showProblem(form, error) : [];
      const message = [...new Set([messageOf(error), ...rest])].join(' ');
      setState({ kind: 'failed', message, problem: error instanceof ApiProblem ? error : null });
    }
  };
  const refuse = (errors: Readonly<Record<string, unknown>>): void => {
    const message = ['Nothing was saved: look at what is marked.', ...unseen(errors)].join(' ');
    setState({ kind: 'failed', message, problem: null });
  };
  return { state, submit: (event) => void form.handleSubmit(send, refuse)(event), clear: () => setState(IDLE) };
}

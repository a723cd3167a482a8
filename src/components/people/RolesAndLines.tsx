import { useController, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { ROLE_NAMES, ROLES, type Role } from '../../contracts/account';
import { ROLE_WORK } from './words';

interface Line {
  readonly id: string;
  readonly name: string;
}

interface Props<Values extends FieldValues, Output> {
  readonly control: Control<Values, unknown, Output>;
  readonly lines: readonly Line[];
}

const toggled = <T,>(all: readonly T[], held: readonly T[], one: T): T[] =>
  all.filter((each) => (each === one ? !held.includes(one) : held.includes(each)));

const CHECK = 'mt-0.5 size-4.5 shrink-0 accent-room';

function Fault({ id, message }: { readonly id: string; readonly message: string | undefined }) {
  return (
    <p id={id} className="mt-1 min-h-4.5 text-xs text-over">
      {message}
    </p>
  );
}

/** What a person may do, a box for each role. */
function Roles<Values extends FieldValues, Output>({ control }: Pick<Props<Values, Output>, 'control'>) {
  const { field, fieldState } = useController({ control, name: 'roles' as FieldPath<Values> });
  const { ref, onChange } = field;
  const held = field.value as readonly Role[];
  return (
    <fieldset aria-describedby="roles-note">
      <legend className="label mb-1.5">Roles</legend>
      {ROLES.map((role, i) => (
        <label key={role} className="flex gap-2.5 py-1">
          <input
            ref={i === 0 ? ref : undefined}
            type="checkbox"
            className={CHECK}
            checked={held.includes(role)}
            onChange={() => onChange(toggled(ROLES, held, role))}
          />
          <span>
            <span className="inline-block font-medium first-letter:uppercase">{ROLE_NAMES[role]}</span>
            <span className="block text-xs text-ink-muted">{ROLE_WORK[role]}</span>
          </span>
        </label>
      ))}
      <Fault id="roles-note" message={fieldState.error?.message} />
    </fieldset>
  );
}

/** The lines that a person works on: all, also those to come, or some. */
function Lines<Values extends FieldValues, Output>({ control, lines }: Props<Values, Output>) {
  const { field, fieldState } = useController({ control, name: 'lineIds' as FieldPath<Values> });
  const { ref, onChange } = field;
  const held = field.value as readonly string[] | null;
  const ids = lines.map(({ id }) => id);
  return (
    <fieldset aria-describedby="lines-note">
      <legend className="label mb-1.5">Lines</legend>
      <label className="flex gap-2.5 py-1">
        <input
          ref={ref}
          type="checkbox"
          className={CHECK}
          checked={held === null}
          onChange={(event) => onChange(event.target.checked ? null : ids)}
        />
        <span className="font-medium">All lines</span>
      </label>
      {held !== null
        ? lines.map(({ id, name }) => (
            <label key={id} className="ml-7 flex gap-2.5 py-1">
              <input
                type="checkbox"
                className={CHECK}
                checked={held.includes(id)}
                onChange={() => onChange(toggled(ids, held, id))}
              />
              {name}
            </label>
          ))
        : null}
      <Fault id="lines-note" message={fieldState.error?.message} />
    </fieldset>
  );
}

/** Roles and lines, side by side where there is room. */
export function RolesAndLines<Values extends FieldValues, Output>({ control, lines }: Props<Values, Output>) {
  return (
    <div className="grid gap-x-8 gap-y-3 sm:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
      <Roles control={control} />
      {lines.length > 0 ? <Lines control={control} lines={lines} /> : null}
    </div>
  );
}

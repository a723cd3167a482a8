import type { PersonDto } from '../../contracts/people';
import { Button } from '../ui/Button';
import { Tag } from '../ui/Tag';
import type { People } from './usePeople';
import { linesText, momentText, rolesText } from './words';

const CELL = 'py-3 pr-5 align-top max-md:block max-md:py-0.5';

function Row({ person, people, onOpen }: { person: PersonDto; people: People; onOpen: () => void }) {
  const { lines, timeZone } = people.data;
  const { name, email, roles, lineIds, isActive, isSelf, lastSeenAt, badge } = person;
  return (
    <tr className={`border-b border-rule max-md:block max-md:py-3 ${isActive ? '' : 'text-ink-muted'}`}>
      <th scope="row" className={`${CELL} text-left font-normal`}>
        <span className="font-semibold">{name}</span>
        {isSelf ? <span className="ml-2 text-xs text-ink-muted">you</span> : null}
        {isActive ? null : (
          <span className="ml-2">
            <Tag look="quiet">inactive</Tag>
          </span>
        )}
        <span className="block text-sm break-all text-ink-muted">{email}</span>
      </th>
      <td className={CELL}>{rolesText(roles)}</td>
      <td className={CELL}>{linesText(lineIds, lines)}</td>
      <td className={CELL}>
        {badge === null ? <span className="text-ink-muted max-md:hidden">none</span> : null}
        {badge === null ? null : <span>badge {badge}</span>}
      </td>
      <td className={`${CELL} whitespace-nowrap`}>
        <span className="text-ink-muted md:hidden">last seen </span>
        {momentText(lastSeenAt, timeZone)}
      </td>
      <td className="py-2.5 text-right align-top max-md:block max-md:text-left">
        <Button size="small" onClick={onOpen} aria-label={`Change ${name}`}>
          Change…
        </Button>
      </td>
    </tr>
  );
}

interface Props {
  readonly people: People;
  readonly onOpen: (personId: string) => void;
}

/** Who holds a role at the plant. */
export function PeopleList({ people, onOpen }: Props) {
  return (
    <table className="w-full border-t border-rule text-base max-md:block">
      <thead className="max-md:sr-only">
        <tr className="border-b border-rule">
          {['Name', 'Roles', 'Lines', 'Badge', 'Last seen', ''].map((head) => (
            <th key={head} scope="col" className="label py-2 pr-5 text-left font-medium">
              {head || <span className="sr-only">Change</span>}
            </th>
          ))}
        </tr>
      </thead>
      <tbody className="max-md:block">
        {people.data.people.map((person) => (
          <Row key={person.id} {...{ person, people }} onOpen={() => onOpen(person.id)} />
        ))}
      </tbody>
    </table>
  );
}

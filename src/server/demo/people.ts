import type { Role } from '../../contracts/account';

export interface DemoPerson {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly roles: readonly Role[];
}

/** Printed by the start command: the demo plant is for trying out. */
export const DEMO_PASSWORD = 'steam-before-noon';

const person = (key: string, name: string, ...roles: Role[]): DemoPerson => ({
  id: `demo-person-${key}`,
  name,
  email: `${key}@tarnhollow.example`,
  roles,
});

/** Invented people; addresses end in .example and lead nowhere. */
export const DEMO_PEOPLE: readonly DemoPerson[] = [
  person('planner', 'Petra Vale', 'planner'),
  person('planner2', 'Milo Fenn', 'planner'),
  person('utilities', 'Ulla Marsh', 'utilitiesLead'),
  person('supervisor', 'Sam Thorn', 'lineSupervisor'),
  person('quality', 'Quinn Hale', 'qualityLead'),
  person('admin', 'Ada Reed', 'administrator'),
];

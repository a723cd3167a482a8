import { z } from 'zod';

/** POST /api/session */
export const signInRequestSchema = z.object({
  email: z.email('Enter an e-mail address, such as name@plant.example.').max(200),
  password: z.string().min(1, 'Enter your password.').max(200),
});
export type SignInRequest = z.infer<typeof signInRequestSchema>;

export const ROLES = ['planner', 'utilitiesLead', 'lineSupervisor', 'qualityLead', 'administrator'] as const;
export type Role = (typeof ROLES)[number];

export const ROLE_NAMES: Readonly<Record<Role, string>> = {
  planner: 'planner',
  utilitiesLead: 'utilities lead',
  lineSupervisor: 'line supervisor',
  qualityLead: 'quality lead',
  administrator: 'administrator',
};

/** POST /api/session/plant: work at another of one's plants. */
export const plantRequestSchema = z.object({ plantId: z.string().min(1).max(80) });

/** What pages and islands know of the person signed in. */
export interface MeDto {
  readonly personId: string;
  readonly name: string;
  readonly plantId: string;
  readonly plantName: string;
  readonly isDemo: boolean;
  readonly roles: readonly Role[];
}

import { z } from 'zod';
import { ROLES, type Role } from './account';

const unique = (values: readonly string[]): boolean => new Set(values).size === values.length;

const emailSchema = z
  .string()
  .trim()
  .max(200, 'An address has 200 characters at most.')
  .pipe(z.email('Enter an e-mail address, such as name@plant.example.'));

export const personNameSchema = z
  .string()
  .trim()
  .min(2, 'Enter first and last name, as colleagues know them.')
  .max(80, 'A name has 80 characters at most.')
  .regex(/^[^\p{Cc}<>]*$/u, 'Leave out signs such as < and >.');

export const LEAST_PASSWORD_LENGTH = 12;

export const newPasswordSchema = z
  .string()
  .min(LEAST_PASSWORD_LENGTH, `At least ${LEAST_PASSWORD_LENGTH} characters: four words make a good password.`)
  .max(200, 'At most 200 characters.');

const rolesSchema = z
  .array(z.enum(ROLES))
  .min(1, 'Choose at least one role.')
  .max(ROLES.length)
  .refine(unique, 'Choose each role once.');

const lineIdsSchema = z
  .array(z.string().min(1).max(80))
  .min(1, 'Choose a line, or all lines.')
  .max(200)
  .refine(unique, 'Choose each line once.')
  .nullable();

const tokenSchema = z.string().min(20).max(100);

/** POST /api/invitations */
export const inviteRequestSchema = z.object({ email: emailSchema, roles: rolesSchema, lineIds: lineIdsSchema });
export type InviteRequest = z.infer<typeof inviteRequestSchema>;

/** POST /api/invitations/accept: `name` is left out by somebody who has an account, and gives its password. */
export const acceptRequestSchema = z.object({
  token: tokenSchema,
  name: personNameSchema.optional(),
  password: z.string().min(1, 'Enter a password.').max(200, 'At most 200 characters.'),
});
export type AcceptRequest = z.infer<typeof acceptRequestSchema>;

/** POST /api/people/[id]: refused where `was` is no longer so. */
export const editPersonRequestSchema = z.object({
  roles: rolesSchema,
  lineIds: lineIdsSchema,
  was: z.object({ roles: z.array(z.enum(ROLES)).max(ROLES.length), lineIds: z.array(z.string()).max(200).nullable() }),
});
export type EditPersonRequest = z.infer<typeof editPersonRequestSchema>;

export const pinSchema = z.string().regex(/^\d{4,6}$/, 'A PIN has 4 to 6 digits.');
export const badgeNumberSchema = z.string().regex(/^\d{1,8}$/, 'A badge number has 1 to 8 digits.');

/** POST /api/people/[id]/badge */
export const badgeRequestSchema = z.object({ number: badgeNumberSchema, pin: pinSchema });
export type BadgeRequest = z.infer<typeof badgeRequestSchema>;

/** POST /api/session/pin: one's own, with one's password. */
export const ownPinRequestSchema = z.object({
  pin: pinSchema,
  password: z.string().min(1, 'Enter your password.').max(200),
});

/** POST /api/session/password */
export const changePasswordRequestSchema = z.object({
  password: z.string().min(1, 'Enter the password that you have now.').max(200),
  newPassword: newPasswordSchema,
});
export type ChangePasswordRequest = z.infer<typeof changePasswordRequestSchema>;

/** POST /api/session/notices */
export const noticesRequestSchema = z.object({ issue: z.boolean() });

/** POST /api/reset */
export const resetRequestSchema = z.object({ email: emailSchema });

/** POST /api/reset/use */
export const setPasswordRequestSchema = z.object({ token: tokenSchema, password: newPasswordSchema });

/** POST /api/people/first-run */
export const firstRunRequestSchema = z.object({
  code: z.string().trim().min(1, 'Enter the code that the start command printed.').max(40),
  plantName: z.string().trim().min(2, 'Enter the name of the plant.').max(80, 'At most 80 characters.'),
  timeZone: z.string().min(1, 'Choose the zone that the plant’s clocks show.').max(60),
  name: personNameSchema,
  email: emailSchema,
  password: newPasswordSchema,
});
export type FirstRunRequest = z.infer<typeof firstRunRequestSchema>;

/** POST /api/tablet */
export const enrolRequestSchema = z.object({
  name: z.string().trim().min(2, 'Give it a name, such as: retort bay, left.').max(60, 'At most 60 characters.'),
  lineId: z.string().min(1).max(80).nullable(),
});
export type EnrolRequest = z.infer<typeof enrolRequestSchema>;

/** POST /api/tablet/session */
export const badgeSignInRequestSchema = z.object({
  number: badgeNumberSchema,
  pin: z.string().regex(/^\d{1,12}$/, 'A PIN has 4 to 6 digits.'),
});
export type BadgeSignInRequest = z.infer<typeof badgeSignInRequestSchema>;

export interface PersonDto {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly roles: readonly Role[];
  /** null: every line. */
  readonly lineIds: readonly string[] | null;
  readonly isActive: boolean;
  readonly isSelf: boolean;
  readonly lastSeenAt: string | null;
  /** The number of the badge; null without one. */
  readonly badge: string | null;
}

export interface InvitationDto {
  readonly id: string;
  readonly email: string;
  readonly roles: readonly Role[];
  readonly lineIds: readonly string[] | null;
  readonly invitedBy: string;
  readonly createdAt: string;
  readonly expiresAt: string;
  readonly isExpired: boolean;
  /** How the newest message stands. */
  readonly mail: { readonly state: 'waiting' | 'sent' | 'failed'; readonly error: string | null };
}

export interface TabletDto {
  readonly id: string;
  readonly name: string;
  readonly lineId: string | null;
  readonly enrolledBy: string;
  readonly enrolledAt: string;
  readonly lastSeenAt: string | null;
}

/** GET /api/people */
export interface PeopleDto {
  readonly people: readonly PersonDto[];
  readonly invitations: readonly InvitationDto[];
  readonly tablets: readonly TabletDto[];
  readonly lines: readonly { readonly id: string; readonly name: string }[];
  readonly timeZone: string;
}

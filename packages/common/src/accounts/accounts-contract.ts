import * as z from 'zod';
import { timeZoneSchema } from '../calendar/time-zone.js';
import { unitSystemSchema } from '../measure/unit-system.js';
import { subscriptionStandingSchema } from '../subscription/subscription-contract.js';
import {
  currencySchema,
  emailSchema,
  idSchema,
  instantSchema,
  lineSchema,
  roleSchema,
  tokenSchema,
} from '../wire/fields.js';
import { rowsSchema } from '../wire/list.js';

export const MIN_PASSWORD_LENGTH = 12;
export const MAX_PASSWORD_LENGTH = 128;

/** A password being chosen. Spaces count and nothing is trimmed; length is the only rule. */
export const newPasswordSchema = z
  .string()
  .min(MIN_PASSWORD_LENGTH, `Use at least ${MIN_PASSWORD_LENGTH} characters.`)
  .max(MAX_PASSWORD_LENGTH, `Use at most ${MAX_PASSWORD_LENGTH} characters.`);

/** A password being checked: only bounded, since an old one may follow older rules. */
const passwordSchema = z
  .string()
  .min(1, 'Enter your password.')
  .max(MAX_PASSWORD_LENGTH, `A password has at most ${MAX_PASSWORD_LENGTH} characters.`);

export const personNameSchema = lineSchema(120, 'The name');
export const shopNameSchema = lineSchema(120, "The shop's name");

export const signUpSchema = z.strictObject({
  name: personNameSchema,
  email: emailSchema,
  password: newPasswordSchema,
  shopName: shopNameSchema,
  timeZone: timeZoneSchema,
  unitSystem: unitSystemSchema,
});
export type SignUp = z.infer<typeof signUpSchema>;

export const signInSchema = z.strictObject({ email: emailSchema, password: passwordSchema });
export type SignIn = z.infer<typeof signInSchema>;

export const confirmEmailSchema = z.strictObject({ token: tokenSchema });
export type ConfirmEmail = z.infer<typeof confirmEmailSchema>;

/** The letter that confirms an address, once more. Known and unknown addresses get the same answer. */
export const resendConfirmationSchema = z.strictObject({ email: emailSchema });
export type ResendConfirmation = z.infer<typeof resendConfirmationSchema>;

export const requestPasswordResetSchema = z.strictObject({ email: emailSchema });
export type RequestPasswordReset = z.infer<typeof requestPasswordResetSchema>;

export const resetPasswordSchema = z.strictObject({ token: tokenSchema, password: newPasswordSchema });
export type ResetPassword = z.infer<typeof resetPasswordSchema>;

export const changePasswordSchema = z.strictObject({
  currentPassword: passwordSchema,
  newPassword: newPasswordSchema,
});
export type ChangePassword = z.infer<typeof changePasswordSchema>;

/** What the person may change about themselves, in every shop at once. */
export const updatePersonSchema = z.strictObject({ name: personNameSchema });
export type UpdatePerson = z.infer<typeof updatePersonSchema>;

export const personSchema = z.object({
  id: idSchema,
  name: z.string(),
  email: z.string(),
  emailConfirmed: z.boolean(),
});
export type Person = z.infer<typeof personSchema>;

/** One shop the person belongs to, with all the shell needs to draw it. */
export const membershipSchema = z.object({
  shopId: idSchema,
  slug: z.string(),
  shopName: z.string(),
  memberId: idSchema,
  role: roleSchema,
  unitSystem: unitSystemSchema,
  timeZone: z.string(),
  currency: currencySchema,
  subscription: subscriptionStandingSchema,
});
export type Membership = z.infer<typeof membershipSchema>;

/** Who is signed in. Nobody signed in is a 401 with `not-signed-in`, not an empty session. */
export const sessionSchema = z.object({ person: personSchema, memberships: z.array(membershipSchema) });
export type Session = z.infer<typeof sessionSchema>;

/** One place where the person is signed in. */
export const ownSessionSchema = z.object({
  id: z.string(),
  current: z.boolean(),
  userAgent: z.string(),
  /** The network address it was last seen from. */
  address: z.string(),
  createdAt: instantSchema,
  lastSeenAt: instantSchema,
});
export type OwnSession = z.infer<typeof ownSessionSchema>;
export const ownSessionsSchema = rowsSchema(ownSessionSchema);

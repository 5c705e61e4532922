import * as z from 'zod';
import { newPasswordSchema, personNameSchema } from '../accounts/accounts-contract.js';
import {
  emailSchema,
  idSchema,
  instantSchema,
  nonNegativeCentsSchema,
  roleSchema,
  tokenSchema,
  versionSchema,
} from '../wire/fields.js';
import { rowsSchema } from '../wire/list.js';

/** What an hour of a member costs the shop, wages and burden together; null while nobody has said. */
const laborCostSchema = nonNegativeCentsSchema
  .max(100_000, 'An hour cannot cost more than $1,000.')
  .nullable();

export const memberSchema = z.object({
  id: idSchema,
  version: versionSchema,
  personId: idSchema,
  name: z.string(),
  email: z.string(),
  role: roleSchema,
  joinedAt: instantSchema,
  // money
  laborCostCentsPerHour: laborCostSchema.optional(),
});
export type Member = z.infer<typeof memberSchema>;
export const membersSchema = rowsSchema(memberSchema);

export const changeRoleSchema = z.strictObject({ role: roleSchema });
export type ChangeRole = z.infer<typeof changeRoleSchema>;

/** Holds from now on: time already clocked keeps the cost it was clocked at. */
export const setLaborCostSchema = z.strictObject({ laborCostCentsPerHour: laborCostSchema });
export type SetLaborCost = z.infer<typeof setLaborCostSchema>;

export const inviteSchema = z.strictObject({ email: emailSchema, role: roleSchema });
export type Invite = z.infer<typeof inviteSchema>;

/** An invitation that was neither accepted nor withdrawn. Sending it again makes a new link and ends the old one. */
export const invitationSchema = z.object({
  id: idSchema,
  email: z.string(),
  role: roleSchema,
  invitedBy: z.string(),
  sentAt: instantSchema,
  expiresAt: instantSchema,
});
export type Invitation = z.infer<typeof invitationSchema>;
export const invitationsSchema = rowsSchema(invitationSchema);

/** The secret of the link, sent in a body so that it stays out of logs and histories. */
export const openInvitationSchema = z.strictObject({ token: tokenSchema });
export type OpenInvitation = z.infer<typeof openInvitationSchema>;

/** What the link in the invitation shows before it is accepted. */
export const invitationOfferSchema = z.object({
  shopName: z.string(),
  email: z.string(),
  role: roleSchema,
  expiresAt: instantSchema,
  /** False when the address has an account already: then nothing but signing in is asked. */
  needsAccount: z.boolean(),
});
export type InvitationOffer = z.infer<typeof invitationOfferSchema>;

/** Name and password are asked only of somebody without an account. */
export const acceptInvitationSchema = z.strictObject({
  token: tokenSchema,
  name: personNameSchema.optional(),
  password: newPasswordSchema.optional(),
});
export type AcceptInvitation = z.infer<typeof acceptInvitationSchema>;

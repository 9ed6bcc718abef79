import { z } from 'zod';
import { id, line } from './common';
import { dockIds, email, newPassword, role } from './person';

/** The secret of a link that was sent by e-mail. */
export const linkToken = z
  .string('give the token of the link')
  .min(20, 'is no token')
  .max(100, 'is no token');

export const createInvitation = z.strictObject({
  name: line(80),
  email,
  role,
  dockIds: dockIds.optional(),
});

export const acceptInvitation = z.strictObject({
  token: linkToken,
  name: line(80).optional(),
  password: newPassword,
});

export const invitation = z.object({
  id,
  name: z.string(),
  email: z.string(),
  role,
  dockIds: z.array(id),
  invitedAt: z.string(),
  expiresAt: z.string(),
});

export type CreateInvitation = z.output<typeof createInvitation>;
export type AcceptInvitation = z.output<typeof acceptInvitation>;
export type Invitation = z.output<typeof invitation>;

import { z } from 'zod';
import { country, emailAddress, instant, line, timeZone, uuid } from './common.ts';
import { defineRoute, nothing } from './route.ts';
import { LENGTH_UNITS, SHOP_ROLES } from './vocabulary.ts';

/**
 * NIST SP 800-63B-4: at least 15 characters where the password is the only factor, 8 beside a second one, no composition
 * rules, and at least 64 allowed. A new password is always held to the single-factor length, since a second factor can be taken off.
 */
export const newPassword = z
  .string()
  .min(15, 'Use at least 15 characters; a few plain words work well')
  .max(200, 'Keep this to 200 characters');

/** Six digits of an authenticator (RFC 6238) or a recovery code. */
const secondFactorCode = z.string().trim().min(6, 'Give the six digits, or a recovery code').max(24);

export const accountView = z.object({
  id: uuid,
  email: z.string(),
  displayName: z.string(),
  preferredUnit: z.enum(LENGTH_UNITS),
  timeZone: z.string(),
  secondFactor: z.boolean(),
  recoveryCodesLeft: z.int(),
  isSteward: z.boolean(),
  shops: z.array(z.object({ shopId: uuid, name: z.string(), role: z.enum(SHOP_ROLES) })),
});
export type AccountView = z.infer<typeof accountView>;

const signedIn = z.object({ next: z.enum(['done', 'second-factor']) });

export const signIn = defineRoute({
  method: 'POST',
  path: '/session',
  status: 200,
  access: 'anyone',
  summary: 'Sign in with e-mail and password',
  params: nothing,
  query: nothing,
  body: z.object({ email: emailAddress, password: z.string().min(1, 'Give your password').max(200) }),
  response: signedIn,
  problems: ['credentials-refused', 'too-many-tries', 'busy'],
});

export const giveSecondFactor = defineRoute({
  method: 'POST',
  path: '/session/second-factor',
  status: 200,
  access: 'anyone',
  summary: 'Finish a sign-in with a code of the second factor',
  params: nothing,
  query: nothing,
  body: z.object({ code: secondFactorCode }),
  response: signedIn,
  problems: ['credentials-refused', 'too-many-tries'],
});

export const signOut = defineRoute({
  method: 'DELETE',
  path: '/session',
  status: 204,
  access: 'signed-in',
  summary: 'Sign out here',
  params: nothing,
  query: nothing,
  body: nothing,
  response: nothing,
  problems: [],
});

export const signOutEverywhere = defineRoute({
  method: 'DELETE',
  path: '/sessions',
  status: 204,
  access: 'signed-in',
  summary: 'Sign out on every device, this one included',
  params: nothing,
  query: nothing,
  body: nothing,
  response: nothing,
  problems: [],
});

export const getMe = defineRoute({
  method: 'GET',
  path: '/me',
  status: 200,
  access: 'signed-in',
  summary: 'The account that is signed in',
  params: nothing,
  query: nothing,
  body: nothing,
  response: accountView,
  problems: [],
});

export const updateMe = defineRoute({
  method: 'PATCH',
  path: '/me',
  status: 200,
  access: 'signed-in',
  summary: 'Change name, unit or time zone',
  params: nothing,
  query: nothing,
  body: z.object({
    displayName: line(80).optional(),
    preferredUnit: z.enum(LENGTH_UNITS).optional(),
    timeZone: timeZone.optional(),
  }),
  response: accountView,
  problems: [],
});

export const changePassword = defineRoute({
  method: 'POST',
  path: '/me/password',
  status: 204,
  access: 'signed-in',
  summary: 'Change the password; every other session ends',
  params: nothing,
  query: nothing,
  body: z.object({ currentPassword: z.string().min(1).max(200), newPassword }),
  response: nothing,
  problems: ['credentials-refused', 'too-many-tries', 'busy'],
});

export const beginSecondFactor = defineRoute({
  method: 'POST',
  path: '/me/second-factor',
  status: 200,
  access: 'signed-in',
  summary: 'Make a new authenticator secret, not yet in force',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.object({ secret: z.string(), uri: z.string(), qrSvg: z.string() }),
  problems: ['not-in-this-state'],
});

export const confirmSecondFactor = defineRoute({
  method: 'POST',
  path: '/me/second-factor/confirmation',
  status: 200,
  access: 'signed-in',
  summary: 'Put the authenticator in force and receive recovery codes, shown once',
  params: nothing,
  query: nothing,
  body: z.object({ code: secondFactorCode }),
  response: z.object({ recoveryCodes: z.array(z.string()) }),
  problems: ['not-in-this-state', 'credentials-refused', 'too-many-tries'],
});

export const removeSecondFactor = defineRoute({
  method: 'POST',
  path: '/me/second-factor/removal',
  status: 204,
  access: 'signed-in',
  summary: 'Take the second factor off',
  params: nothing,
  query: nothing,
  body: z.object({ password: z.string().min(1).max(200), code: secondFactorCode }),
  response: nothing,
  problems: ['not-in-this-state', 'credentials-refused', 'too-many-tries', 'busy'],
});

export const askPasswordReset = defineRoute({
  method: 'POST',
  path: '/password-resets',
  status: 202,
  access: 'anyone',
  summary: 'Ask for a reset link; the answer is the same whether the account exists or not',
  params: nothing,
  query: nothing,
  body: z.object({ email: emailAddress }),
  response: nothing,
  problems: ['too-many-tries'],
});

const linkToken = z.string().min(20).max(200);

export const completePasswordReset = defineRoute({
  method: 'POST',
  path: '/password-resets/completion',
  status: 204,
  access: 'anyone',
  summary: 'Set a new password with a reset link; every session of the account ends',
  params: nothing,
  query: nothing,
  body: z.object({ token: linkToken, newPassword }),
  response: nothing,
  problems: ['link-expired', 'too-many-tries', 'busy'],
});

export const previewInvitation = defineRoute({
  method: 'POST',
  path: '/invitations/preview',
  status: 200,
  access: 'anyone',
  summary: 'What an invitation link offers',
  params: nothing,
  query: nothing,
  body: z.object({ token: linkToken }),
  response: z.object({
    kind: z.enum(['commission', 'shop']),
    invitedBy: z.string(),
    commissionTitle: z.string().optional(),
    roles: z.array(z.string()),
    shopName: z.string().optional(),
    email: z.string(),
    expiresAt: instant,
    /** True when the person signed in now is the one invited. */
    forYou: z.boolean(),
    /** Shops of the signed-in person that could take this part in the commission. */
    yourShops: z.array(z.object({ shopId: uuid, name: z.string() })),
    needsShop: z.boolean(),
  }),
  problems: ['link-expired', 'too-many-tries'],
});

export const acceptInvitation = defineRoute({
  method: 'POST',
  path: '/invitations/acceptance',
  status: 200,
  access: 'anyone',
  summary: 'Take an invitation, with the account signed in or a new one',
  params: nothing,
  query: nothing,
  body: z.object({
    token: linkToken,
    /** For a person without an account. */
    newAccount: z.object({ displayName: line(80), password: newPassword, timeZone: timeZone.optional() }).optional(),
    /** For a shop's part in a commission: one of the person's shops, or a new one. */
    shopId: uuid.optional(),
    newShop: z.object({ name: line(80), country }).optional(),
  }),
  response: z.object({ commissionId: uuid.nullable(), shopId: uuid.nullable(), signedIn: z.boolean() }),
  problems: ['link-expired', 'not-permitted', 'already-there', 'not-signed-in', 'too-many-tries', 'busy'],
});

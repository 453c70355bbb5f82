import { z } from 'zod';
import { country, emailAddress, instant, line, optionalProse, revision, timeZone, uuid } from './common.ts';
import { defineRoute, nothing } from './route.ts';
import { SHOP_ROLES, SHOP_TINTS } from './vocabulary.ts';

const inShop = z.object({ shopId: uuid });

export const shopView = z.object({
  id: uuid,
  name: z.string(),
  craft: z.string(),
  country: z.string(),
  timeZone: z.string(),
  tint: z.enum(SHOP_TINTS),
  revision: z.int(),
  yourRole: z.enum(SHOP_ROLES).nullable(),
});
export type ShopView = z.infer<typeof shopView>;

export const shopMemberView = z.object({
  accountId: uuid,
  displayName: z.string(),
  email: z.string(),
  role: z.enum(SHOP_ROLES),
  joinedAt: instant,
});
export type ShopMemberView = z.infer<typeof shopMemberView>;

export const shopInvitationView = z.object({
  id: uuid,
  email: z.string(),
  role: z.enum(SHOP_ROLES),
  invitedAt: instant,
  expiresAt: instant,
});

export const listShops = defineRoute({
  method: 'GET',
  path: '/shops',
  status: 200,
  access: 'signed-in',
  summary: 'Shops of this installation (steward)',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.array(shopView),
  problems: ['not-permitted'],
});

export const createShop = defineRoute({
  method: 'POST',
  path: '/shops',
  status: 201,
  access: 'signed-in',
  keyed: true,
  summary: 'Open a shop and invite its owner (steward)',
  params: nothing,
  query: nothing,
  body: z.object({ name: line(80), craft: line(80), country, ownerEmail: emailAddress }),
  response: shopView,
  problems: ['not-permitted', 'already-there'],
});

export const getShop = defineRoute({
  method: 'GET',
  path: '/shops/:shopId',
  status: 200,
  access: 'signed-in',
  summary: 'One shop, for its people',
  params: inShop,
  query: nothing,
  body: nothing,
  response: shopView,
  problems: ['not-found'],
});

export const updateShop = defineRoute({
  method: 'PATCH',
  path: '/shops/:shopId',
  status: 200,
  access: 'signed-in',
  summary: 'Change what a shop says of itself (owner)',
  params: inShop,
  query: nothing,
  body: z.object({
    revision,
    name: line(80).optional(),
    craft: optionalProse(80).optional(),
    country: country.optional(),
    timeZone: timeZone.optional(),
    tint: z.enum(SHOP_TINTS).optional(),
  }),
  response: shopView,
  problems: ['not-found', 'not-permitted', 'stale-revision'],
});

export const listShopMembers = defineRoute({
  method: 'GET',
  path: '/shops/:shopId/members',
  status: 200,
  access: 'signed-in',
  summary: 'People of a shop and open invitations (the latter for owners)',
  params: inShop,
  query: nothing,
  body: nothing,
  response: z.object({ members: z.array(shopMemberView), invitations: z.array(shopInvitationView) }),
  problems: ['not-found'],
});

export const inviteShopMember = defineRoute({
  method: 'POST',
  path: '/shops/:shopId/invitations',
  status: 201,
  access: 'signed-in',
  keyed: true,
  summary: 'Invite a person into a shop (owner)',
  params: inShop,
  query: nothing,
  body: z.object({ email: emailAddress, role: z.enum(SHOP_ROLES) }),
  response: shopInvitationView,
  problems: ['not-found', 'not-permitted', 'already-there', 'too-many-tries'],
});

export const withdrawShopInvitation = defineRoute({
  method: 'DELETE',
  path: '/shops/:shopId/invitations/:invitationId',
  status: 204,
  access: 'signed-in',
  summary: 'Take an invitation back (owner)',
  params: inShop.extend({ invitationId: uuid }),
  query: nothing,
  body: nothing,
  response: nothing,
  problems: ['not-found', 'not-permitted'],
});

export const changeShopMember = defineRoute({
  method: 'PATCH',
  path: '/shops/:shopId/members/:accountId',
  status: 200,
  access: 'signed-in',
  summary: 'Change what a person does in a shop (owner)',
  params: inShop.extend({ accountId: uuid }),
  query: nothing,
  body: z.object({ role: z.enum(SHOP_ROLES) }),
  response: shopMemberView,
  problems: ['not-found', 'not-permitted', 'not-in-this-state'],
});

export const removeShopMember = defineRoute({
  method: 'DELETE',
  path: '/shops/:shopId/members/:accountId',
  status: 204,
  access: 'signed-in',
  summary: 'Take a person out of a shop (owner, or the person)',
  params: inShop.extend({ accountId: uuid }),
  query: nothing,
  body: nothing,
  response: nothing,
  problems: ['not-found', 'not-permitted', 'not-in-this-state'],
});

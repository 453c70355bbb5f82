import { z } from 'zod';
import { inCommission, instant, line, uuid } from './common.ts';
import { defineRoute, nothing } from './route.ts';
import { AUDIENCES, THREAD_SUBJECTS } from './vocabulary.ts';

const inThread = inCommission.extend({ threadId: uuid });

export const threadView = z.object({
  id: uuid,
  subject: z.enum(THREAD_SUBJECTS),
  subjectId: uuid,
  title: z.string(),
  audience: z.enum(AUDIENCES),
  /** The parties named, for `named` and `own-shop`. */
  partyIds: z.array(uuid),
  /** Number of messages; the last message carries this sequence. */
  lastSequence: z.int(),
  readSequence: z.int(),
  /** Messages you have not read that name you. */
  unreadMentions: z.int(),
  lastMessageAt: instant.nullable(),
});
export type ThreadView = z.infer<typeof threadView>;

export const messageFileView = z.object({
  id: uuid,
  name: z.string(),
  mediaType: z.string(),
  byteSize: z.int(),
  width: z.int().nullable(),
  height: z.int().nullable(),
});
export type MessageFileView = z.infer<typeof messageFileView>;

export const messageView = z.object({
  /** Made by the writer's browser, so that sending again stores nothing twice. */
  id: uuid,
  sequence: z.int(),
  authorAccountId: uuid,
  authorName: z.string(),
  authorPartyId: uuid,
  body: z.string(),
  mentionedAccountIds: z.array(uuid),
  files: z.array(messageFileView),
  at: instant,
});
export type MessageView = z.infer<typeof messageView>;

export const listThreads = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/threads',
  status: 200,
  access: 'signed-in',
  summary: 'Threads you may read',
  params: inCommission,
  query: z.object({ subject: z.enum(THREAD_SUBJECTS).optional(), subjectId: uuid.optional() }),
  body: nothing,
  response: z.array(threadView),
  problems: ['not-found'],
});

export const openThread = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/threads',
  status: 201,
  access: 'signed-in',
  keyed: true,
  summary: 'Open a thread; its audience is fixed from then on',
  params: inCommission,
  query: nothing,
  body: z
    .object({
      subject: z.enum(THREAD_SUBJECTS),
      subjectId: uuid,
      title: line(120),
      audience: z.enum(AUDIENCES),
      partyIds: z.array(uuid).max(20).default([]),
    })
    .refine((thread) => thread.audience !== 'named' || thread.partyIds.length > 0, {
      error: 'Name at least one party',
      path: ['partyIds'],
    }),
  response: threadView,
  problems: ['not-found', 'not-permitted'],
});

/** Sequences are kept as 32-bit integers. */
const LAST_SEQUENCE = 2_147_483_647;

export const listMessages = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/threads/:threadId/messages',
  status: 200,
  access: 'signed-in',
  summary: 'Messages by sequence: the newest, those before one, or those after one',
  params: inThread,
  query: z.object({
    before: z.coerce.number().int().min(1).max(LAST_SEQUENCE).optional(),
    after: z.coerce.number().int().min(0).max(LAST_SEQUENCE).optional(),
    limit: z.coerce.number().int().min(1).max(200).default(50),
  }),
  body: nothing,
  response: z.object({ messages: z.array(messageView), lastSequence: z.int() }),
  problems: ['not-found'],
});

export const messageInput = z
  .object({
    id: uuid,
    body: z.string().trim().max(8000, 'Keep a message to 8000 characters'),
    mentionedAccountIds: z.array(uuid).max(20).default([]),
    fileIds: z.array(uuid).max(12, 'Attach at most 12 files').default([]),
  })
  .refine((message) => message.body.length > 0 || message.fileIds.length > 0, {
    error: 'Write something, or attach a file',
    path: ['body'],
  });

export const postMessage = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/threads/:threadId/messages',
  status: 201,
  access: 'signed-in',
  summary: 'Post a message under the id the writer made; the same id again gives the stored message',
  params: inThread,
  query: nothing,
  body: messageInput,
  response: messageView,
  problems: ['not-found', 'not-permitted', 'already-there'],
});

export const markThreadRead = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/threads/:threadId/mark',
  status: 204,
  access: 'signed-in',
  summary: 'Read up to a sequence; the mark only moves forward',
  params: inThread,
  query: nothing,
  body: z.object({ readSequence: z.int().min(0).max(LAST_SEQUENCE) }),
  response: nothing,
  problems: ['not-found'],
});

import { Account } from './account.ts';
import { Commission } from './commission.ts';
import { FitReport } from './fit-report.ts';
import { HandoffOffer } from './handoff-offer.ts';
import { Handoff } from './handoff.ts';
import { HistoryLine } from './history-line.ts';
import { IdempotencyKey } from './idempotency-key.ts';
import { Invitation } from './invitation.ts';
import { Joint } from './joint.ts';
import { LegOrder } from './leg-order.ts';
import { Leg } from './leg.ts';
import { Message } from './message.ts';
import { OutboxMessage } from './outbox-message.ts';
import { Part } from './part.ts';
import { Party } from './party.ts';
import { PasswordReset } from './password-reset.ts';
import { RateLimit } from './rate-limit.ts';
import { Reading } from './reading.ts';
import { RecoveryCode } from './recovery-code.ts';
import { ReportEvent } from './report-event.ts';
import { ReworkNote } from './rework-note.ts';
import { ShopMember } from './shop-member.ts';
import { Shop } from './shop.ts';
import { StoredFile } from './stored-file.ts';
import { ThreadMark } from './thread-mark.ts';
import { Thread } from './thread.ts';
import { WebSession } from './web-session.ts';

/** Every table; the data source takes this list, so that a forgotten entity shows as schema drift in the tests. */
export const ALL_ENTITIES = [
  Account,
  Commission,
  FitReport,
  HandoffOffer,
  Handoff,
  HistoryLine,
  IdempotencyKey,
  Invitation,
  Joint,
  LegOrder,
  Leg,
  Message,
  OutboxMessage,
  Part,
  Party,
  PasswordReset,
  RateLimit,
  Reading,
  RecoveryCode,
  ReportEvent,
  ReworkNote,
  ShopMember,
  Shop,
  StoredFile,
  ThreadMark,
  Thread,
  WebSession,
];

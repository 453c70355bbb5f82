import { randomInt, randomUUID } from 'node:crypto';
import { pathToFileURL } from 'node:url';
import type { EntityManager } from 'typeorm';
import { encodeCode } from '../../../shared/engines/codes/crockford.ts';
import { addDays, isWorkingDay, type IsoDay } from '../../../shared/units/calendar-day.ts';
import { parseLength } from '../../../shared/units/length.ts';
import { refreshCommissionNames } from '../../commands/commissions/refresh-members.ts';
import { readEnv } from '../../config/env.ts';
import { Account } from '../../entities/account.ts';
import { Commission } from '../../entities/commission.ts';
import { FitReport } from '../../entities/fit-report.ts';
import { Handoff } from '../../entities/handoff.ts';
import { HandoffOffer } from '../../entities/handoff-offer.ts';
import { HistoryLine } from '../../entities/history-line.ts';
import { Joint } from '../../entities/joint.ts';
import { Leg } from '../../entities/leg.ts';
import { LegOrder } from '../../entities/leg-order.ts';
import { Message } from '../../entities/message.ts';
import { Part } from '../../entities/part.ts';
import { Party } from '../../entities/party.ts';
import { Reading } from '../../entities/reading.ts';
import { ReportEvent } from '../../entities/report-event.ts';
import { ReworkNote } from '../../entities/rework-note.ts';
import { Shop } from '../../entities/shop.ts';
import { ShopMember } from '../../entities/shop-member.ts';
import { Thread } from '../../entities/thread.ts';
import { createStorage } from '../../integrations/storage/create-storage.ts';
import { hashPassword } from '../../security/passwords.ts';
import { createDataSource } from '../data-source.ts';
import { DEMO_PASSWORD, DEMO_PEOPLE, DEMO_SHOPS, type PersonKey, type ShopKey } from './demo-people.ts';
import { DEMO_PIECES, type DemoPiece } from './demo-pieces.ts';
import { DemoPictures } from './demo-pictures.ts';

interface Cast {
  people: Record<string, string>;
  shops: Record<string, string>;
}

/** Makes one piece with everything that happened to it, days counted from `today`. */
class PieceMaker {
  readonly #manager: EntityManager;
  readonly #cast: Cast;
  readonly #piece: DemoPiece;
  readonly #pictures: DemoPictures;
  readonly #today: IsoDay;
  readonly #commissionId = randomUUID();
  readonly #parties: Record<string, string> = {};
  readonly #parts: Record<string, string> = {};
  readonly #legs: Record<string, string> = {};
  readonly #joints: Record<string, string> = {};
  readonly #reports: Record<string, string> = {};

  constructor(manager: EntityManager, cast: Cast, piece: DemoPiece, pictures: DemoPictures, today: IsoDay) {
    this.#manager = manager;
    this.#cast = cast;
    this.#piece = piece;
    this.#pictures = pictures;
    this.#today = today;
  }

  async make(): Promise<void> {
    await this.#makeCommission();
    await this.#makeParties();
    await this.#makeParts();
    await this.#makeLegs();
    await this.#makeJoints();
    await this.#makeReports();
    await this.#makeHandoffs();
    await this.#makeThreads();
    await this.#makePictures();
    await refreshCommissionNames(this.#manager, this.#commissionId);
  }

  #day(offset: number): IsoDay {
    return addDays(this.#today, offset);
  }

  /** The same, moved on to the next working day. */
  #workday(offset: number): IsoDay {
    let day = this.#day(offset);
    while (!isWorkingDay(day)) day = addDays(day, 1);
    return day;
  }

  /** An instant in that day's working hours; later calls on a day come later. */
  #clock = new Map<number, number>();
  #at(offset: number): Date {
    const minutes = (this.#clock.get(offset) ?? 0) + 37;
    this.#clock.set(offset, minutes);
    return new Date(Date.parse(`${this.#day(offset)}T08:00:00Z`) + minutes * 60_000);
  }

  #person(key: PersonKey): string {
    return this.#cast.people[key] ?? '';
  }

  #party(key: ShopKey | 'client'): string {
    const id = this.#parties[key];
    if (!id) throw new Error(`${this.#piece.title} has no party ${key}`);
    return id;
  }

  async #makeCommission(): Promise<void> {
    const { title, brief, state, dateWantedIn, budgetMinor, currency, told, deliveredIn } = this.#piece;
    await this.#manager.insert(Commission, {
      id: this.#commissionId,
      code: encodeCode(BigInt(randomInt(2 ** 34))),
      title,
      brief,
      state,
      budgetMinor,
      currency,
      dateWanted: dateWantedIn === null ? null : this.#workday(dateWantedIn),
      toldFromDay: told ? this.#workday(told[0]) : null,
      toldToDay: told ? this.#workday(told[1]) : null,
      deliveredOn: deliveredIn === undefined ? null : this.#day(deliveredIn),
      updatedAt: this.#at(0),
    });
  }

  async #makeParties(): Promise<void> {
    const { shops, client, guest } = this.#piece;
    const joinedAt = this.#at(-42);
    for (const [key, roles] of shops) {
      this.#parties[key] = randomUUID();
      await this.#manager.insert(Party, {
        id: this.#parties[key],
        commissionId: this.#commissionId,
        shopId: this.#cast.shops[key] ?? '',
        roles: [...roles],
        joinedAt,
      });
    }
    this.#parties['client'] = randomUUID();
    await this.#manager.insert(Party, {
      id: this.#parties['client'],
      commissionId: this.#commissionId,
      accountId: this.#person(client),
      roles: ['client'],
      joinedAt,
    });
    if (guest)
      await this.#manager.insert(Party, {
        commissionId: this.#commissionId,
        accountId: this.#person(guest),
        roles: ['guest'],
        guestSees: ['standing', 'pictures'],
        seesUntil: this.#day(30),
        joinedAt,
      });
  }

  async #makeParts(): Promise<void> {
    for (const [position, part] of this.#piece.parts.entries()) {
      this.#parts[part.key] = randomUUID();
      await this.#manager.insert(Part, {
        id: this.#parts[part.key],
        commissionId: this.#commissionId,
        name: part.name,
        kind: part.kind,
        holderPartyId: this.#party(part.holder),
        holderSince: this.#day(part.since),
        position,
      });
    }
  }

  async #makeLegs(): Promise<void> {
    for (const [position, leg] of this.#piece.legs.entries()) {
      const id = (this.#legs[leg.key] = randomUUID());
      const [hopefulDays, likelyDays, badDays] = leg.days;
      await this.#manager.insert(Leg, {
        id,
        commissionId: this.#commissionId,
        partyId: this.#party(leg.shop),
        partId: this.#parts[leg.part] ?? '',
        kind: leg.kind,
        title: leg.title,
        state: leg.state,
        hopefulDays,
        likelyDays,
        badDays,
        plannedStartOn: this.#workday(leg.planned),
        position,
        privateNote: leg.privateNote ?? '',
        startedOn: leg.started === undefined ? null : this.#day(leg.started),
        finishedOn: leg.finished === undefined ? null : this.#day(leg.finished),
      });
      for (const before of leg.after)
        await this.#manager.insert(LegOrder, { legId: id, afterLegId: this.#legs[before] ?? '' });
      if (leg.started !== undefined) await this.#tell('leg', id, leg.shop, leg.started, `Started: ${leg.title}`);
      if (leg.finished !== undefined) await this.#tell('leg', id, leg.shop, leg.finished, `Finished: ${leg.title}`);
    }
  }

  /** A line of what moved, by the first person of a shop. */
  async #tell(subject: string, subjectId: string, shop: ShopKey, day: number, words: string): Promise<void> {
    const [person] = DEMO_SHOPS.find((one) => one.key === shop)?.members[0] ?? [];
    await this.#manager.insert(HistoryLine, {
      commissionId: this.#commissionId,
      accountId: person ? this.#person(person) : null,
      subject,
      subjectId,
      words,
      partyIds: null,
      clientMayRead: true,
      at: this.#at(day),
    });
  }

  async #makeJoints(): Promise<void> {
    for (const joint of this.#piece.joints) {
      const id = (this.#joints[joint.key] = randomUUID());
      await this.#manager.insert(Joint, {
        id,
        commissionId: this.#commissionId,
        name: joint.name,
        kind: joint.kind,
        holePartId: this.#parts[joint.hole[0]] ?? '',
        holePartyId: this.#party(joint.hole[1]),
        shaftPartId: this.#parts[joint.shaft[0]] ?? '',
        shaftPartyId: this.#party(joint.shaft[1]),
        nominalMm: joint.nominalMm,
        clearanceMinUm: joint.clearanceUm[0],
        clearanceMaxUm: joint.clearanceUm[1],
        holeClass: joint.holeClass ?? null,
        shaftClass: joint.shaftClass ?? null,
        handFit: joint.handFit ?? null,
        engagementMm: joint.engagementMm ?? null,
        hiddenLengthMm: joint.hiddenLengthMm ?? null,
        note: joint.note ?? '',
      });
      for (const [index, set] of joint.sets.entries()) {
        const takenAt = this.#at(set.day);
        const rows = set.values.map((text, position) => {
          const read = parseLength(text, 'mm');
          if (!read.ok) throw new Error(read.message);
          return {
            jointId: id,
            side: set.side,
            setNumber: index + 1,
            position,
            valueMm: read.valueMm,
            enteredText: text,
            enteredUnit: read.unit,
            resolutionUm: set.resolutionUm,
            stationMm: 2 + Math.floor(position / 2) * 6,
            angleDeg: (position % 2) * 90,
            temperatureC: 19.5,
            humidityPct: 48,
            gauge: set.gauge,
            partyId: this.#party(set.shop),
            accountId: this.#person(set.by),
            takenAt,
          };
        });
        await this.#manager.insert(Reading, rows);
      }
    }
  }

  async #makeReports(): Promise<void> {
    for (const report of this.#piece.reports) {
      const id = (this.#reports[report.joint] = randomUUID());
      const both = [this.#party(report.raisedShop), this.#party(report.answerShop)];
      await this.#manager.insert(FitReport, {
        id,
        commissionId: this.#commissionId,
        jointId: this.#joints[report.joint] ?? '',
        title: report.title,
        plainWords: report.plainWords,
        state: report.state,
        blocking: report.heldLeg !== null,
        heldLegId: report.heldLeg ? (this.#legs[report.heldLeg] ?? null) : null,
        raisedByPartyId: this.#party(report.raisedShop),
        raisedByAccountId: this.#person(report.raisedBy),
        answerPartyId: this.#party(report.answerShop),
        clientWords: report.clientWords,
        raisedAt: this.#at(report.day),
        revision: report.history.length,
      });
      if (report.note) {
        const { note } = report;
        await this.#manager.insert(ReworkNote, {
          reportId: id,
          partyId: this.#party(report.answerShop),
          accountId: this.#person(note.by),
          state: note.state,
          method: note.method,
          cutSide: note.cutSide,
          removeOnDiameterUm: note.removeUm,
          overLengthMm: note.overMm,
          risk: note.risk,
          shows: note.shows,
          whereItShows: note.whereItShows,
          costMinor: note.costMinor,
          currency: this.#piece.currency,
          costBorneByPartyId: this.#party(note.costBorneBy),
          effectDays: note.effectDays,
          consentState: note.consent ?? null,
          consentAskedAt: note.consent ? this.#at(note.day + 1) : null,
          createdAt: this.#at(note.day),
        });
      }
      for (const [act, fromState, toState, by, day, words] of report.history) {
        const at = this.#at(day);
        await this.#manager.insert(ReportEvent, {
          reportId: id,
          act,
          fromState,
          toState,
          accountId: this.#person(by),
          words,
          at,
        });
        if (act === 'raise' || act === 'answer')
          await this.#manager.insert(HistoryLine, {
            commissionId: this.#commissionId,
            accountId: this.#person(by),
            subject: 'report',
            subjectId: id,
            partyIds: both,
            at,
            words: `${act === 'raise' ? 'Raised a fit report' : 'Answered with a rework note'}: ${report.title}`,
          });
      }
      for (const purpose of report.pictures) await this.#addPicture('report', id, purpose, report.raisedBy, report.day);
    }
  }

  async #makeHandoffs(): Promise<void> {
    for (const handoff of this.#piece.handoffs) {
      const id = randomUUID();
      await this.#manager.insert(Handoff, {
        id,
        commissionId: this.#commissionId,
        fromPartyId: this.#party(handoff.from),
        toPartyId: this.#party(handoff.to),
        partIds: handoff.parts.map((key) => this.#parts[key] ?? ''),
        fromLegId: handoff.fromLeg ? (this.#legs[handoff.fromLeg] ?? null) : null,
        toLegId: handoff.toLeg ? (this.#legs[handoff.toLeg] ?? null) : null,
        transitDays: handoff.transitDays,
        carriage: handoff.carriage,
        revision: 1 + (handoff.offers?.length ?? 0),
        agreedOn:
          handoff.agreedIn === undefined
            ? null
            : handoff.agreedIn < 0
              ? this.#day(handoff.agreedIn)
              : this.#workday(handoff.agreedIn),
        doneOn: handoff.doneIn === undefined ? null : this.#day(handoff.doneIn),
      });
      for (const offer of handoff.offers ?? []) {
        const at = this.#at(offer.day);
        await this.#manager.insert(HandoffOffer, {
          handoffId: id,
          byPartyId: this.#party(offer.by),
          byAccountId: this.#person(offer.person),
          onDay: this.#workday(offer.onDayIn),
          words: offer.words,
          state: offer.state,
          reason: offer.reason ?? '',
          createdAt: at,
          answeredAt: offer.answeredBy ? at : null,
          answeredByAccountId: offer.answeredBy ? this.#person(offer.answeredBy) : null,
        });
      }
    }
  }

  async #makeThreads(): Promise<void> {
    for (const plan of this.#piece.threads) {
      const id = randomUUID();
      const subject = plan.subject === 'commission' ? 'commission' : plan.subject[0];
      const subjectId =
        plan.subject === 'commission'
          ? this.#commissionId
          : { joint: this.#joints, leg: this.#legs, report: this.#reports }[plan.subject[0]][plan.subject[1]];
      const last = plan.messages.at(-1);
      await this.#manager.insert(Thread, {
        id,
        commissionId: this.#commissionId,
        subject,
        subjectId: subjectId ?? '',
        title: plan.title,
        audience: plan.audience,
        partyIds: (plan.named ?? []).map((key) => this.#party(key)),
        openedByPartyId: this.#party(plan.openedBy),
        lastSequence: plan.messages.length,
        lastMessageAt: last ? this.#at(last.day) : null,
        createdAt: this.#at(plan.messages[0]?.day ?? -30),
      });
      for (const [index, message] of plan.messages.entries()) {
        const fileIds = message.picture ? await this.#addPicture('thread', id, 'message', message.by, message.day) : [];
        await this.#manager.insert(Message, {
          threadId: id,
          sequence: index + 1,
          id: randomUUID(),
          authorAccountId: this.#person(message.by),
          authorPartyId: this.#partyOf(message.by),
          body: message.body,
          mentionedAccountIds: (message.mentions ?? []).map((key) => this.#person(key)),
          fileIds,
          createdAt: this.#at(message.day),
        });
      }
    }
  }

  #partyOf(person: PersonKey): string {
    const shop = DEMO_SHOPS.find((one) => one.members.some(([key]) => key === person));
    return this.#party(shop?.key ?? 'client');
  }

  async #addPicture(
    place: 'thread' | 'report' | 'commission',
    placeId: string,
    purpose: DemoPiece['reports'][number]['pictures'][number],
    by: PersonKey,
    day: number,
  ): Promise<string[]> {
    const fileId = await this.#pictures.add(this.#manager, this.#piece.pictureKey, {
      commissionId: this.#commissionId,
      place,
      placeId,
      purpose,
      addedByAccountId: this.#person(by),
      createdAt: this.#at(day),
    });
    return fileId ? [fileId] : [];
  }

  async #makePictures(): Promise<void> {
    const [leadPerson] = DEMO_SHOPS.find((one) => one.key === this.#piece.lead)?.members[0] ?? [];
    if (!leadPerson) return;
    const [cover] = await this.#addPicture('commission', this.#commissionId, 'cover', leadPerson, -30);
    if (cover) await this.#manager.update(Commission, { id: this.#commissionId }, { coverFileId: cover });
    await this.#addPicture('commission', this.#commissionId, 'brief', leadPerson, -41);
    await this.#addPicture('commission', this.#commissionId, 'condition', leadPerson, -8);
  }
}

/** Makes the demo's people, shops and pieces, once: a database that has the demo already is left as it is. */
export async function seedDemo(manager: EntityManager, pictures: DemoPictures, today: IsoDay): Promise<boolean> {
  if ((await manager.countBy(Account, { email: DEMO_PEOPLE[0].email })) > 0) return false;
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  const cast: Cast = { people: {}, shops: {} };
  for (const { key, ...person } of DEMO_PEOPLE) {
    cast.people[key] = randomUUID();
    await manager.insert(Account, { id: cast.people[key], passwordHash, ...person });
  }
  for (const { key, members, ...shop } of DEMO_SHOPS) {
    const shopId = (cast.shops[key] = randomUUID());
    await manager.insert(Shop, { id: shopId, ...shop });
    for (const [person, role] of members)
      await manager.insert(ShopMember, { shopId, accountId: cast.people[person] ?? '', role });
  }
  for (const piece of [...DEMO_PIECES].reverse()) await new PieceMaker(manager, cast, piece, pictures, today).make();
  return true;
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  const env = readEnv(process.env);
  const db = await createDataSource(env.DATABASE_URL, 2).initialize();
  try {
    await db.transaction((manager) =>
      seedDemo(manager, new DemoPictures(createStorage(env)), new Date().toISOString().slice(0, 10)),
    );
  } finally {
    await db.destroy();
  }
}

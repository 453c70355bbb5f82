import { z } from 'zod';
import { figure, inCommission, instant, line, optionalProse, revision, uuid } from './common.ts';
import { defineRoute, nothing } from './route.ts';
import { JOINT_KINDS, JOINT_SIDES, LENGTH_UNITS } from './vocabulary.ts';

/** A nominal size this product works with, in mm. ISO 286 tables are carried up to 180 mm. */
const nominalMm = figure.gt(0.5, 'Give a size above 0.5 mm').max(180, 'Give a size up to 180 mm');
/** A clearance on diameter in um; negative is interference. */
const clearanceUm = figure
  .min(-2000, 'A clearance below −2000 µm is not one')
  .max(5000, 'Give a clearance up to 5000 µm');

const jointFields = {
  name: line(120),
  kind: z.enum(JOINT_KINDS),
  holePartId: uuid,
  shaftPartId: uuid,
  holePartyId: uuid,
  shaftPartyId: uuid,
  nominalMm,
  /** Agreed clearance range on diameter, um. */
  clearanceMinUm: clearanceUm,
  clearanceMaxUm: clearanceUm,
  /** ISO 286 classes when the fit was agreed so, for instance `H8` and `f7`. */
  holeClass: z
    .string()
    .trim()
    .regex(/^[A-Za-z]{1,2}\d{1,2}$/, 'Write a class such as H8')
    .nullable(),
  shaftClass: z
    .string()
    .trim()
    .regex(/^[A-Za-z]{1,2}\d{1,2}$/, 'Write a class such as f7')
    .nullable(),
  /** Plain words of a hand fit, for instance "hand slip". */
  handFit: z.string().trim().max(60).nullable(),
  engagementMm: figure.gt(0, 'Give a length above 0').max(400, 'Give at most 400 mm').nullable(),
  /** Length of the spigot that may be cut before the cut shows when the joint is closed. */
  hiddenLengthMm: figure.min(0, 'Give 0 or more').max(400, 'Give at most 400 mm').nullable(),
  note: optionalProse(2000),
};

export const readingView = z.object({
  id: uuid,
  side: z.enum(JOINT_SIDES),
  /** The diameter in mm, from what was typed. */
  valueMm: z.number(),
  enteredText: z.string(),
  enteredUnit: z.enum(LENGTH_UNITS),
  resolutionUm: z.number(),
  stationMm: z.number().nullable(),
  angleDeg: z.number().nullable(),
  temperatureC: z.number().nullable(),
  humidityPct: z.number().nullable(),
  gauge: z.string().nullable(),
  reportId: uuid.nullable(),
  /** Readings that verify a rework are `after`; a verdict uses the newest set of each side. */
  setNumber: z.int(),
  partyId: uuid,
  takenBy: z.string(),
  takenAt: instant,
});
export type ReadingView = z.infer<typeof readingView>;

export const jointView = z.object({
  id: uuid,
  ...{ name: z.string(), kind: z.enum(JOINT_KINDS) },
  holePartId: uuid,
  shaftPartId: uuid,
  holePartyId: uuid,
  shaftPartyId: uuid,
  nominalMm: z.number(),
  clearanceMinUm: z.number(),
  clearanceMaxUm: z.number(),
  holeClass: z.string().nullable(),
  shaftClass: z.string().nullable(),
  handFit: z.string().nullable(),
  engagementMm: z.number().nullable(),
  hiddenLengthMm: z.number().nullable(),
  note: z.string(),
  openReportId: uuid.nullable(),
  revision: z.int(),
});
export type JointView = z.infer<typeof jointView>;

export const listJoints = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/joints',
  status: 200,
  access: 'signed-in',
  summary: 'Joints you answer for; all of them for the lead',
  params: inCommission,
  query: nothing,
  body: nothing,
  response: z.array(jointView),
  problems: ['not-found'],
});

export const getJoint = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/joints/:jointId',
  status: 200,
  access: 'signed-in',
  summary: 'One joint with its readings',
  params: inCommission.extend({ jointId: uuid }),
  query: nothing,
  body: nothing,
  response: z.object({ joint: jointView, readings: z.array(readingView) }),
  problems: ['not-found'],
});

const rangeInOrder = (range: { clearanceMinUm?: number | undefined; clearanceMaxUm?: number | undefined }) =>
  range.clearanceMinUm === undefined ||
  range.clearanceMaxUm === undefined ||
  range.clearanceMinUm <= range.clearanceMaxUm;
const rangeMessage = { error: 'The least clearance cannot be above the greatest', path: ['clearanceMinUm'] };
const partsDiffer = (parts: { holePartId?: string | undefined; shaftPartId?: string | undefined }) =>
  parts.holePartId === undefined || parts.holePartId !== parts.shaftPartId;
const partsMessage = { error: 'A joint is between two parts', path: ['shaftPartId'] };

export const createJoint = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/joints',
  status: 201,
  access: 'signed-in',
  keyed: true,
  summary: 'Add a joint (lead)',
  params: inCommission,
  query: nothing,
  body: z.object(jointFields).refine(rangeInOrder, rangeMessage).refine(partsDiffer, partsMessage),
  response: jointView,
  problems: ['not-found', 'not-permitted'],
});

export const updateJoint = defineRoute({
  method: 'PATCH',
  path: '/commissions/:commissionId/joints/:jointId',
  status: 200,
  access: 'signed-in',
  summary: 'Change a joint (lead)',
  params: inCommission.extend({ jointId: uuid }),
  query: nothing,
  body: z
    .object(jointFields)
    .partial()
    .extend({ revision })
    .refine(rangeInOrder, rangeMessage)
    .refine(partsDiffer, partsMessage),
  response: jointView,
  problems: ['not-found', 'not-permitted', 'stale-revision'],
});

/** One typed reading: the text is kept as it was entered, the server turns it into mm by the shared parser. */
export const readingInput = z.object({
  text: z.string().trim().min(1, 'Type a reading').max(30),
  unit: z.enum(LENGTH_UNITS),
  stationMm: figure.min(0, 'Give 0 or more').max(1000, 'Give at most 1000 mm').nullable().default(null),
  angleDeg: figure.min(0, 'Give 0 to 360').max(360, 'Give 0 to 360').nullable().default(null),
});

export const readingsInput = z.object({
  side: z.enum(JOINT_SIDES),
  /** Smallest step of the gauge, um: 10 for a digital caliper, 1 for a micrometer. */
  resolutionUm: figure.gt(0, "Give the gauge's smallest step").max(1000, 'Give at most 1000 µm'),
  gauge: z.string().trim().max(60).nullable().default(null),
  temperatureC: figure.min(-30, 'Give −30 to 60 °C').max(60, 'Give −30 to 60 °C').nullable().default(null),
  humidityPct: figure.min(0, 'Give 0 to 100 %').max(100, 'Give 0 to 100 %').nullable().default(null),
  readings: z.array(readingInput).min(1, 'Type at least one reading').max(200),
});

export const addReadings = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/joints/:jointId/readings',
  status: 201,
  access: 'signed-in',
  keyed: true,
  summary: 'Add a set of readings of one side of a joint',
  params: inCommission.extend({ jointId: uuid }),
  query: nothing,
  body: readingsInput.extend({ reportId: uuid.nullable().default(null) }),
  response: z.array(readingView),
  problems: ['not-found', 'not-permitted'],
});

import type { JointView, ReadingView } from '../../shared/contracts/joints.ts';
import type { JointRecord, ReadingRecord } from '../queries/joints/load-joints.ts';

export const presentJoint = (row: JointRecord): JointView => ({
  id: row.id,
  name: row.name,
  kind: row.kind,
  holePartId: row.holePartId,
  shaftPartId: row.shaftPartId,
  holePartyId: row.holePartyId,
  shaftPartyId: row.shaftPartyId,
  nominalMm: row.nominalMm,
  clearanceMinUm: row.clearanceMinUm,
  clearanceMaxUm: row.clearanceMaxUm,
  holeClass: row.holeClass,
  shaftClass: row.shaftClass,
  handFit: row.handFit,
  engagementMm: row.engagementMm,
  hiddenLengthMm: row.hiddenLengthMm,
  note: row.note,
  openReportId: row.openReportId,
  revision: row.revision,
});

export const presentReading = (row: ReadingRecord): ReadingView => ({
  id: row.id,
  side: row.side,
  valueMm: row.valueMm,
  enteredText: row.enteredText,
  enteredUnit: row.enteredUnit,
  resolutionUm: row.resolutionUm,
  stationMm: row.stationMm,
  angleDeg: row.angleDeg,
  temperatureC: row.temperatureC,
  humidityPct: row.humidityPct,
  gauge: row.gauge,
  reportId: row.reportId,
  setNumber: row.setNumber,
  partyId: row.partyId,
  takenBy: row.takenBy,
  takenAt: row.takenAt.toISOString(),
});

import { queryOptions } from '@tanstack/react-query';
import * as reports from '../../../shared/contracts/fit-reports.ts';
import * as joints from '../../../shared/contracts/joints.ts';
import { api } from '../api.ts';
import { keys } from '../query-keys.ts';

export const jointQueries = {
  list: (commissionId: string) =>
    queryOptions({
      queryKey: keys.joints.lists(commissionId),
      queryFn: ({ signal }) => api(joints.listJoints, { params: { commissionId } }, { signal }),
    }),
  detail: (commissionId: string, jointId: string) =>
    queryOptions({
      queryKey: keys.joints.detail(commissionId, jointId),
      queryFn: ({ signal }) => api(joints.getJoint, { params: { commissionId, jointId } }, { signal }),
    }),
};

export const reportQueries = {
  list: (commissionId: string) =>
    queryOptions({
      queryKey: keys.fitReports.lists(commissionId),
      queryFn: ({ signal }) => api(reports.listFitReports, { params: { commissionId } }, { signal }),
    }),
  detail: (commissionId: string, reportId: string) =>
    queryOptions({
      queryKey: keys.fitReports.detail(commissionId, reportId),
      queryFn: ({ signal }) => api(reports.getFitReport, { params: { commissionId, reportId } }, { signal }),
    }),
  consents: (commissionId: string) =>
    queryOptions({
      queryKey: keys.consents.list(commissionId),
      queryFn: ({ signal }) => api(reports.listConsents, { params: { commissionId } }, { signal }),
    }),
};

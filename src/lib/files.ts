import { readFileContent, type IMAGE_SIZES } from '../../shared/contracts/files.ts';
import { addressOf } from './api.ts';

/** Where a file's bytes are; photographs in a size. */
export const fileAddress = (commissionId: string, fileId: string, size?: (typeof IMAGE_SIZES)[number]): string =>
  addressOf(readFileContent, { params: { commissionId, fileId }, ...(size ? { query: { size } } : {}) });

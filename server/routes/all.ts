import type { Api } from '../http/api.ts';

/** Mounts every resource. A contract that no file here mounts fails the start-up test. */
export function mountAll(_api: Api): void {}

import * as contracts from '../../shared/contracts/threads.ts';
import { markThreadRead } from '../commands/threads/mark-thread-read.ts';
import { openThread } from '../commands/threads/open-thread.ts';
import { postMessage } from '../commands/threads/post-message.ts';
import { NotFound } from '../errors.ts';
import type { Api } from '../http/api.ts';
import { listMessages } from '../queries/threads/list-messages.ts';
import { listThreads, loadThreadViews } from '../queries/threads/list-threads.ts';

export function mountThreads(api: Api): void {
  api.signedIn(contracts.listThreads, listThreads);
  api.signedIn(contracts.openThread, async (ctx, input) => {
    const [view] = await loadThreadViews(ctx, input.params.commissionId, { threadId: await openThread(ctx, input) });
    if (!view) throw new NotFound();
    return view;
  });
  api.signedIn(contracts.listMessages, listMessages);
  api.signedIn(contracts.postMessage, postMessage);
  api.signedIn(contracts.markThreadRead, async (ctx, input) => {
    await markThreadRead(ctx, input);
    return {};
  });
}

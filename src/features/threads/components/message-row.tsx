import type { MessageView } from '../../../../shared/contracts/threads.ts';
import { fileAddress } from '../../../lib/files.ts';
import { shortInstant } from '../../../lib/today.ts';

/** One message: who, for which party, when, and its pictures and files. */
export function MessageRow({
  message,
  commissionId,
  partyName,
  namesYou,
}: {
  message: MessageView;
  commissionId: string;
  partyName: string;
  namesYou: boolean;
}) {
  return (
    <li
      className={`grid gap-1 border-b border-hairline py-3 sm:grid-cols-[10rem_1fr] sm:gap-4 ${namesYou ? 'border-l-2 border-l-brass pl-3' : ''}`}
      data-sequence={message.sequence}
    >
      <p>
        <span className="font-semibold">{message.authorName}</span>
        {partyName !== message.authorName && <span className="text-note text-lead-grey">, {partyName}</span>}
        <br />
        <time dateTime={message.at} className="text-note text-lead-grey">
          {shortInstant(message.at)}
        </time>
      </p>
      <div className="min-w-0">
        {message.body && <p className="max-w-words break-words whitespace-pre-line">{message.body}</p>}
        {message.files.length > 0 && (
          <ul className="mt-2 flex flex-wrap gap-2">
            {message.files.map((file) => (
              <li key={file.id}>
                {file.width !== null && file.height !== null ? (
                  <a href={fileAddress(commissionId, file.id, 'full')} target="_blank" rel="noreferrer">
                    <img
                      src={fileAddress(commissionId, file.id, 'thumb')}
                      width={Math.min(320, file.width)}
                      height={Math.round((Math.min(320, file.width) / file.width) * file.height)}
                      alt={file.name}
                      loading="lazy"
                      className="h-auto max-w-full rounded border border-hairline"
                    />
                  </a>
                ) : file.mediaType.startsWith('video/') ? (
                  <video
                    controls
                    preload="metadata"
                    className="max-h-80 max-w-full"
                    src={fileAddress(commissionId, file.id)}
                  >
                    <track kind="captions" />
                  </video>
                ) : (
                  <a href={fileAddress(commissionId, file.id)} download className="underline">
                    {file.name}
                  </a>
                )}
              </li>
            ))}
          </ul>
        )}
      </div>
    </li>
  );
}

import autocannon from 'autocannon';

export interface Load {
  readonly url: string;
  readonly headers?: Readonly<Record<string, string>>;
  /** Requests in turn for each connection, where more than the address changes. */
  readonly requests?: autocannon.Request[];
  readonly connections: number;
  readonly seconds: number;
  /** Every answer must be this, to the byte. */
  readonly body?: string;
}

/** A run with an answer other than 2xx, a broken connection, or a body that differs measured something else. */
export class RunVoid extends Error {}

/**
 * One slice of closed-loop load.
 * @returns answers per second
 */
export async function slice({ url, headers, requests, connections, seconds, body }: Load): Promise<number> {
  const result = await autocannon({
    url,
    connections,
    duration: seconds,
    ...(headers ? { headers: { ...headers } } : {}),
    ...(requests ? { requests } : {}),
    ...(body === undefined ? {} : { expectBody: body }),
  });
  if (result.non2xx > 0 || result.errors > 0 || result.timeouts > 0 || result.mismatches > 0)
    throw new RunVoid(
      `${url}: ${result.non2xx} answers not 2xx, ${result.errors} errors, ${result.timeouts} timeouts, ${result.mismatches} other bodies`,
    );
  if (result['2xx'] === 0) throw new RunVoid(`${url}: no answer at all`);
  return result['2xx'] / result.duration;
}

/** One answer's body; anything but 200 is an error. */
export async function bodyOf(url: string, headers: Readonly<Record<string, string>> = {}): Promise<string> {
  const response = await fetch(url, { headers: { ...headers, 'accept-encoding': 'identity' } });
  const body = await response.text();
  if (response.status !== 200) throw new RunVoid(`${url} answered ${response.status}: ${body.slice(0, 200)}`);
  return body;
}

import { Agent, get } from 'node:http';

export interface LoadResult {
  /** Milliseconds from the moment a request was due to be sent to the last byte, in rising order. */
  readonly times: readonly number[];
  /** Answers other than 200, and requests without an answer. */
  readonly failures: number;
  /** Bytes of one answer. */
  readonly bytes: number;
}

/**
 * Asks for one address at a steady rate, whether or not earlier answers have come, as people do. Times
 * count from when a request was due, so that a server that falls behind cannot hide the wait.
 */
export async function steadyLoad(
  url: string,
  { cookie, perSecond, seconds }: { cookie: string; perSecond: number; seconds: number },
): Promise<LoadResult> {
  const agent = new Agent({ keepAlive: true, maxSockets: 64 });
  const begun = performance.now();
  const answers = await Promise.all(
    Array.from({ length: perSecond * seconds }, async (_, index) => {
      const due = begun + (index * 1000) / perSecond;
      await new Promise((done) => setTimeout(done, due - performance.now()));
      const { status, bytes } = await ask(url, cookie, agent);
      return { status, bytes, time: performance.now() - due };
    }),
  );
  agent.destroy();
  return {
    times: answers.map(({ time }) => time).sort((a, b) => a - b),
    failures: answers.filter(({ status }) => status !== 200).length,
    bytes: answers.at(-1)?.bytes ?? 0,
  };
}

/** The time that a share of the requests did not exceed, in milliseconds. */
export function percentile(times: readonly number[], share: number): number {
  return times[Math.max(0, Math.ceil(times.length * share) - 1)] ?? NaN;
}

function ask(
  url: string,
  cookie: string,
  agent: Agent,
): Promise<{ status: number; bytes: number }> {
  return new Promise((done) => {
    const request = get(url, { agent, headers: { cookie } }, (reply) => {
      let bytes = 0;
      reply.on('data', (chunk: Buffer) => (bytes += chunk.length));
      reply.on('end', () => done({ status: reply.statusCode ?? 0, bytes }));
      reply.on('error', () => done({ status: 0, bytes }));
    });
    request.setTimeout(10_000, () => request.destroy(new Error('No answer')));
    request.on('error', () => done({ status: 0, bytes: 0 }));
  });
}

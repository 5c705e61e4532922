import autocannon from 'autocannon';
import { cpuMicroseconds, type Server } from './processes.js';

export type Load = { path: string; cookie?: string };
export type Measured = {
  requestsPerSecond: number;
  medianMs: number;
  p99Ms: number;
  cpuMicrosecondsPerRequest: number;
};

/** Sends a number of requests over so many connections and measures the answers and the server's own CPU time. */
export async function measure(
  server: Server,
  { path, cookie }: Load,
  connections: number,
  amount: number,
): Promise<Measured> {
  const pid = server.child.pid ?? 0;
  const before = cpuMicroseconds(pid);
  const result = await autocannon({
    url: server.address + path,
    connections,
    amount,
    headers: cookie ? { cookie } : {},
  });
  if (result.non2xx > 0 || result.errors > 0)
    throw new Error(`${path}: ${result.non2xx} refused, ${result.errors} failed.`);
  return {
    requestsPerSecond: result.requests.average,
    medianMs: result.latency.p50,
    p99Ms: result.latency.p99,
    cpuMicrosecondsPerRequest: (cpuMicroseconds(pid) - before) / amount,
  };
}

export function median(values: readonly number[]): number {
  const sorted = values.toSorted((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? Number.NaN;
}

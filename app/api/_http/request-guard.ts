import { env } from '@/src/env';
import { forbidden, invalid } from '@/src/data/errors';

const MAX_BODY_BYTES = 2_000_000;

/** An unsafe method must come from a page of this site: by Sec-Fetch-Site or Origin, and by both where both are sent. */
export function requireSameOrigin(request: Request): void {
  const { headers } = request;
  const site = headers.get('sec-fetch-site');
  const origin = headers.get('origin');
  const forwarded = env().trustsProxy ? headers.get('x-forwarded-host') : null;
  const host = forwarded ?? headers.get('host');
  const isSameSite = site === null || site === 'same-origin';
  const isSameOrigin = origin === null || hostOf(origin) === host;
  if (isSameSite && isSameOrigin && (site !== null || origin !== null)) return;
  throw forbidden('This request did not come from a page of this site, so it was not taken.');
}

/** The JSON body, cut off by nothing: a body that is too long or shorter than announced is refused whole. */
export async function readJson(request: Request): Promise<unknown> {
  const tooLong = `A request may hold at most ${MAX_BODY_BYTES / 1_000_000} MB. Send the change in smaller parts.`;
  const announced = Number(request.headers.get('content-length') ?? Number.NaN);
  if (announced > MAX_BODY_BYTES) throw invalid(tooLong);
  const chunks: Uint8Array[] = [];
  let received = 0;
  const reader = request.body?.getReader();
  for (let part = await reader?.read(); part && !part.done; part = await reader?.read()) {
    received += part.value.byteLength;
    if (received > MAX_BODY_BYTES) throw invalid(tooLong);
    chunks.push(part.value);
  }
  if (Number.isFinite(announced) && received !== announced) {
    throw invalid('The request was cut off on its way. Send it again.');
  }
  try {
    return JSON.parse(Buffer.concat(chunks).toString('utf8'));
  } catch (error) {
    if (error instanceof SyntaxError) throw invalid('The request is not JSON.');
    throw error;
  }
}

function hostOf(origin: string): string | null {
  return URL.canParse(origin) ? new URL(origin).host : null;
}

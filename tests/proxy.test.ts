import { NextRequest } from 'next/server';
import { describe, expect, it } from 'vitest';
import { config, proxy } from '../proxy';

const visit = () => proxy(new NextRequest('http://localhost:3000/sessions'));
const policyOf = (response: Response) => response.headers.get('content-security-policy') ?? '';
const directive = (policy: string, name: string) =>
  policy.split('; ').find((part) => part.startsWith(`${name} `)) ?? '';

describe('the headers of a page', () => {
  it('let scripts in by a nonce that is new each time', () => {
    const nonces = [visit(), visit()].map(
      (response) => /'nonce-([0-9a-f]{32})'/.exec(policyOf(response))?.[1],
    );
    expect(nonces[0]).toBeDefined();
    expect(nonces[0]).not.toBe(nonces[1]);
  });

  it('allow neither eval nor inline scripts', () => {
    const scripts = directive(policyOf(visit()), 'script-src');
    expect(scripts).toContain("'strict-dynamic'");
    expect(scripts).not.toMatch(/unsafe|wasm|\*|https?:/);
  });

  it('hand the policy to the framework on the request', () => {
    const response = visit();
    expect(response.headers.get('x-middleware-request-content-security-policy')).toBe(policyOf(response));
  });

  it('forbid framing, sniffing and devices', () => {
    const { headers } = visit();
    expect(directive(policyOf(visit()), 'frame-ancestors')).toBe("frame-ancestors 'none'");
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('referrer-policy')).toBe('same-origin');
    expect(headers.get('permissions-policy')).toContain('camera=()');
    expect(headers.get('cross-origin-opener-policy')).toBe('same-origin');
  });

  it('do not insist on https where cookies are not secure', () => {
    expect(visit().headers.get('strict-transport-security')).toBeNull();
  });
});

describe('the matcher', () => {
  const pattern = new RegExp(`^${config.matcher[0]}$`);

  it.each(['/', '/sign-in', '/sessions/abc/timeline', '/api/sessions/abc/commands'])('covers %s', (path) => {
    expect(path).toMatch(pattern);
  });

  it.each(['/_next/static/chunks/a.js', '/icon.svg', '/robots.txt', '/api/uploads/clock-log'])(
    'leaves out %s',
    (path) => {
      expect(path).not.toMatch(pattern);
    },
  );
});

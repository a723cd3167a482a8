import { describe, expect, it } from 'vitest';
import { themeOf } from '@/server/http/cookies';
import { needsSignIn, safeNext, signInAddress } from '@/server/http/gate';
import { originAllowed } from '@/server/http/origin';
import { tabletCookie } from '@/server/http/tabletCookie';
import { setSecurityHeaders } from '@/server/http/securityHeaders';

const APP = 'https://plan.example';

function request(method: string, headers: Record<string, string>): Request {
  return new Request('http://localhost/', { method, headers });
}

describe('a request’s origin', () => {
  it.each<[string, string, Record<string, string>, boolean]>([
    ['reading from anywhere', 'GET', { host: 'a.example', origin: 'https://b.example', cookie: 'x=1' }, true],
    ['the same host', 'POST', { host: 'a.example', origin: 'http://a.example', cookie: 'x=1' }, true],
    ['the same host in capitals', 'POST', { host: 'A.example', origin: 'http://a.example' }, true],
    ['the application’s address behind a proxy', 'POST', { host: 'inner:4321', origin: APP, cookie: 'x=1' }, true],
    ['another host', 'POST', { host: 'a.example', origin: 'http://b.example', cookie: 'x=1' }, false],
    ['another host without a cookie', 'POST', { host: 'a.example', origin: 'http://b.example' }, false],
    ['another port', 'DELETE', { host: 'a.example:1', origin: 'http://a.example:2' }, false],
    ['a host that only begins alike', 'POST', { host: 'a.example', origin: 'http://a.example.b.example' }, false],
    ['the opaque origin', 'POST', { host: 'a.example', origin: 'null', cookie: 'x=1' }, false],
    ['no origin but a cookie', 'PUT', { host: 'a.example', cookie: 'x=1' }, false],
    ['no origin and no cookie', 'POST', { host: 'a.example' }, true],
  ])('%s', (_, method, headers, allowed) => {
    expect(originAllowed(request(method, headers), APP)).toBe(allowed);
  });
});

describe('where to go after signing in', () => {
  it.each([
    ['/week/2026-11-30?at=600#b', '/week/2026-11-30?at=600#b'],
    ['/', '/'],
    ['', '/'],
    [null, '/'],
    ['week', '/'],
    ['https://elsewhere.example/', '/'],
    ['//elsewhere.example/', '/'],
    ['/\\elsewhere.example/', '/'],
    ['/\t/elsewhere.example/', '/'],
    ['/.//elsewhere.example', '/'],
    ['javascript:alert(1)', '/'],
  ])('%j leads to %s', (next, expected) => expect(safeNext(next)).toBe(expected));

  it('is what was asked for', () => {
    const address = signInAddress(new URL('http://a.example/capacity/2026-11-30?x=1&y=2'));
    const next = new URL(address, 'http://a.example').searchParams.get('next');
    expect(safeNext(next)).toBe('/capacity/2026-11-30?x=1&y=2');
  });
});

it.each([
  ['/week', '/week', true],
  ['/', '/', true],
  ['/sign-in', '/sign-in', false],
  ['/sign-in/', '/sign-in', false],
  ['/no-such-page', '/404', false],
  ['/api/session', '/api/session', false],
  ['/apiary', '/apiary', true],
  ['/invitation/some-token', '/invitation/[token]', false],
  ['/invitation', '/invitation', true],
  ['/reset', '/reset', false],
  ['/reset/some-token', '/reset/[token]', false],
  ['/first-run', '/first-run', false],
  ['/tablet', '/tablet', false],
  ['/people', '/people', true],
  ['/people/me', '/people/me', true],
  ['/mail', '/mail', true],
  ['/_image', '/_image', false],
])('a page wants somebody signed in: %s', (path, pattern, needed) => expect(needsSignIn(path, pattern)).toBe(needed));

describe('headers', () => {
  it('add leave for drawn lengths to the page’s policy, and no more', () => {
    const headers = new Headers({ 'content-type': 'text/html', 'content-security-policy': "default-src 'self';" });
    setSecurityHeaders(headers, APP);
    expect(headers.get('content-security-policy')).toBe("default-src 'self'; style-src-attr 'unsafe-inline'");
    // Once more, as where a page gives way to another.
    setSecurityHeaders(headers);
    expect(headers.get('content-security-policy')).toBe("default-src 'self'; style-src-attr 'unsafe-inline'");
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('strict-transport-security')).toBe('max-age=31536000');
  });

  it('do not ask for https where there is none', () => {
    const headers = new Headers();
    setSecurityHeaders(headers, 'http://localhost:4321');
    expect(headers.has('strict-transport-security')).toBe(false);
  });
});

it.each([
  [null, null],
  ['a=1; theme=dark', 'dark'],
  ['theme=light;x=2', 'light'],
  ['theme=neon', null],
  ['othertheme=dark', null],
])('the theme of %j is %s', (cookie, theme) => expect(themeOf(cookie)).toBe(theme));

describe('a tablet’s cookie', () => {
  it('is kept from scripts and other sites, and from plain http where the application is on https', () => {
    expect(tabletCookie('token', 'https://plan.example')).toMatch(
      /^steadmain_tablet=token; .*HttpOnly; SameSite=Lax; Secure$/,
    );
    expect(tabletCookie('token', 'http://10.0.0.5:4321')).not.toContain('Secure');
  });
});

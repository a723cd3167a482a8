import type { APIRoute } from 'astro';
import { beforeAll, describe, expect, it } from 'vitest';
import { ROLES, type Role } from '@/contracts/account';
import { ROLE_NAMES } from '@/server/auth/permissions';
import { callApi } from '../support/api';
import { openWorld, sessionOf } from '../support/world';

const METHODS = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE', 'HEAD', 'OPTIONS', 'ALL'];

const EVERYBODY: readonly Role[] = ROLES;
const PLANNER: readonly Role[] = ['planner'];
const UTILITIES: readonly Role[] = ['utilitiesLead'];
const PLANT_EDITORS: readonly Role[] = ['utilitiesLead', 'administrator'];

const LIBRARY: readonly Role[] = ['planner', 'utilitiesLead', 'administrator'];

/** Who may call what, written out a second time on purpose; `anybody` needs no session. */
const WHO_MAY: Readonly<Record<string, readonly Role[] | 'anybody'>> = {
  'POST session/index': 'anybody',
  'DELETE session/index': 'anybody',
  'POST session/plant': EVERYBODY,
  'DELETE session/everywhere': EVERYBODY,
  'POST session/password': EVERYBODY,
  'POST session/pin': EVERYBODY,
  'POST session/notices': EVERYBODY,
  'GET people/index': ['administrator'],
  'POST people/first-run': 'anybody',
  'POST people/[id]/index': ['administrator'],
  'POST people/[id]/activate': ['administrator'],
  'POST people/[id]/deactivate': ['administrator'],
  'POST people/[id]/sign-out': ['administrator'],
  'POST people/[id]/badge': ['administrator'],
  'DELETE people/[id]/badge': ['administrator'],
  'POST invitations/index': ['administrator'],
  'POST invitations/accept': 'anybody',
  'POST invitations/[id]/resend': ['administrator'],
  'POST invitations/[id]/withdraw': ['administrator'],
  'POST reset/index': 'anybody',
  'POST reset/use': 'anybody',
  'POST tablet/index': ['administrator'],
  'POST tablet/[id]/revoke': ['administrator'],
  'POST tablet/session': 'anybody',
  'POST tablet/touch': EVERYBODY,
  'GET events': EVERYBODY,
  'GET duties/index': EVERYBODY,
  'POST duties/index': LIBRARY,
  'POST duties/[id]/index': LIBRARY,
  'POST duties/[id]/retire': LIBRARY,
  'GET products/index': EVERYBODY,
  'POST products/index': LIBRARY,
  'POST products/[id]/index': LIBRARY,
  'POST products/[id]/retire': LIBRARY,
  'POST products/[id]/route': LIBRARY,
  'POST families/index': LIBRARY,
  'POST families/[id]': LIBRARY,
  'DELETE families/[id]': LIBRARY,
  'POST families/cleaning': LIBRARY,
  'POST settings/own': EVERYBODY,
  'POST settings/plant': ['administrator'],
  'GET orders/index': EVERYBODY,
  'POST orders/index': PLANNER,
  'POST orders/[id]/index': PLANNER,
  'DELETE orders/[id]/index': PLANNER,
  'POST orders/[id]/plan': PLANNER,
  'DELETE orders/[id]/plan': PLANNER,
  'GET process-data/index': EVERYBODY,
  'POST process-data/[id]/release': ['qualityLead'],
  'GET units/spread': EVERYBODY,
  'POST units/[unit]/spread': ['planner', 'utilitiesLead', 'administrator'],
  'GET plant/index': EVERYBODY,
  'POST plant/[kind]/index': PLANT_EDITORS,
  'POST plant/[kind]/order': PLANT_EDITORS,
  'POST plant/[kind]/[id]/index': PLANT_EDITORS,
  'POST plant/[kind]/[id]/retire': PLANT_EDITORS,
  'GET practice/index': EVERYBODY,
  'POST practice/index': ['planner', 'utilitiesLead', 'administrator'],
  'POST practice/[id]/release': ['qualityLead'],
  'POST practice/[id]/withdraw': ['qualityLead'],
  'GET weeks/[week]/capacity': EVERYBODY,
  'POST weeks/[week]/firings': UTILITIES,
  'POST weeks/[week]/limits': UTILITIES,
  'GET weeks/[week]/index': EVERYBODY,
  'POST weeks/[week]/edits': PLANNER,
  'POST weeks/[week]/cleanings/index': PLANNER,
  'DELETE weeks/[week]/cleanings/[activity]': PLANNER,
  'GET weeks/[week]/rework': EVERYBODY,
  'POST weeks/[week]/rework': PLANNER,
  'POST weeks/[week]/issues': PLANNER,
  'POST weeks/[week]/agreements': UTILITIES,
  'GET weeks/[week]/shift-sheet': EVERYBODY,
  'POST weeks/[week]/floor-events': ['lineSupervisor'],
  'POST weeks/[week]/levelling': PLANNER,
  'GET levelling/[run]/index': EVERYBODY,
  'POST levelling/[run]/cancel': PLANNER,
  'POST levelling/[run]/accept': PLANNER,
  'POST levelling/[run]/discard': PLANNER,
};

const files = import.meta.glob<Record<string, unknown>>('../../src/pages/api/**/*.ts', { eager: true });
const endpoints = new Map<string, APIRoute>(
  Object.entries(files).flatMap(([file, exported]) => {
    const path = file.replace('../../src/pages/api/', '').replace(/\.ts$/, '');
    return Object.entries(exported).map(([method, route]) => [`${method} ${path}`, route as APIRoute] as const);
  }),
);

beforeAll(openWorld);

/** The answer to a call without input: what is refused for its input has passed the role. */
async function call(name: string, session?: string): Promise<{ status: number; text: string }> {
  const method = name.split(' ')[0] ?? 'GET';
  const controller = new AbortController();
  const params = { week: 'none', run: 'none', id: 'none', unit: 'none' };
  const route = endpoints.get(name);
  if (!route) throw new Error(`no endpoint ${name}`);
  const response = await callApi(route, { method, params, signal: controller.signal, ...(session ? { session } : {}) });
  controller.abort();
  return { status: response.status, text: response.status === 204 ? '' : await response.text() };
}

describe('endpoints', () => {
  it('are all in the table of who may call them, and the table names no others', () => {
    expect([...endpoints.keys()].sort()).toEqual(Object.keys(WHO_MAY).sort());
  });

  it('export methods and nothing else', () => {
    expect([...endpoints.keys()].map((name) => name.split(' ')[0]).filter((m) => !METHODS.includes(m ?? ''))).toEqual(
      [],
    );
  });
});

describe.each(Object.entries(WHO_MAY))('%s', (name, who) => {
  it(who === 'anybody' ? 'asks for no session' : 'asks for a session', async () => {
    const { status, text } = await call(name);
    if (who === 'anybody') expect(status).not.toBe(401);
    else expect([status, JSON.parse(text)]).toMatchObject([401, { code: 'SIGN-IN' }]);
  });

  it.each(who === 'anybody' ? [] : ROLES)('answers a %s as the table says', async (role) => {
    const { status, text } = await call(name, await sessionOf(`north-${role}`));
    if (who.includes(role)) return expect([401, 403, 500]).not.toContain(status);
    expect([status, JSON.parse(text)]).toMatchObject([403, { code: 'ROLE' }]);
    for (const one of who as readonly Role[]) expect(text).toContain(ROLE_NAMES[one]);
  });
});

import type { APIContext, MiddlewareHandler } from 'astro';
import { lucia } from './server/auth/lucia';
import { signedIn, type SignedIn } from './server/auth/session';
import { readCookie, TABLET_COOKIE, themeOf } from './server/http/cookies';
import { faultProblem } from './server/http/fault';
import { needsSignIn, safeNext, signInAddress } from './server/http/gate';
import { originAllowed } from './server/http/origin';
import { notFound, problemResponse, type HttpProblem } from './server/http/problem';
import { setSecurityHeaders } from './server/http/securityHeaders';

const foreignOrigin: HttpProblem = {
  status: 403,
  code: 'ORIGIN',
  message: 'This request came from another site and was refused. Open Steadmain itself and try again.',
};

const unknown = notFound('There is no such endpoint, or it does not take this method.');

const isEndpoint = ({ url }: APIContext): boolean => url.pathname.startsWith('/api/');
const isJson = ({ headers }: Response): boolean => headers.get('content-type')?.startsWith('application/json') ?? false;

/** Session to actor; gives the cookie to set where it was renewed or has ended. */
async function identify(context: APIContext): Promise<string | null> {
  const cookies = context.request.headers.get('cookie') ?? '';
  const sessionId = lucia.readSessionCookie(cookies);
  const kept = themeOf(cookies);
  context.locals.theme = kept ?? 'system';
  context.locals.units = 'si';
  context.locals.plants = [];
  context.locals.actor = null;
  context.locals.sessionId = null;
  if (!sessionId) return null;
  const isTouch = !isEndpoint(context) || context.request.method !== 'GET';
  const found: SignedIn | null = await signedIn(sessionId, {
    tabletToken: readCookie(cookies, TABLET_COOKIE),
    isTouch,
  });
  if (!found) return lucia.createBlankSessionCookie().serialize();
  context.locals.actor = found.actor;
  context.locals.sessionId = sessionId;
  context.locals.theme = kept ?? found.choices.theme ?? 'system';
  context.locals.units = found.choices.units;
  context.locals.plants = found.plants.map(({ plantId, plantName }) => ({ plantId, plantName }));
  return found.session.fresh ? lucia.createSessionCookie(sessionId).serialize() : null;
}

const redirect = (location: string): Response => new Response(null, { status: 302, headers: { location } });

function redirected({ locals, url, routePattern, request }: APIContext): Response | null {
  if (!locals.actor) {
    if (!needsSignIn(url.pathname, routePattern)) return null;
    return redirect(readCookie(request.headers.get('cookie'), TABLET_COOKIE) ? '/tablet' : signInAddress(url));
  }
  return routePattern === '/sign-in' ? redirect(safeNext(url.searchParams.get('next'))) : null;
}

async function respond(context: APIContext, next: () => Promise<Response>): Promise<Response> {
  if (!originAllowed(context.request)) return problemResponse(foreignOrigin);
  let cookie: string | null;
  try {
    cookie = await identify(context);
  } catch (error) {
    if (!isEndpoint(context)) throw error;
    console.error('the session could not be read:', error);
    return problemResponse(faultProblem(error));
  }
  const answer = redirected(context) ?? (await next());
  const response = answer.status === 404 && isEndpoint(context) && !isJson(answer) ? problemResponse(unknown) : answer;
  if (cookie && !response.headers.has('set-cookie')) response.headers.append('set-cookie', cookie);
  return response;
}

/** Who is asking, whether they may change anything from where they come, and what every answer carries. */
export const onRequest: MiddlewareHandler = async (context, next) => {
  if (context.isPrerendered) return next();
  const response = await respond(context, next);
  setSecurityHeaders(response.headers);
  return response;
};

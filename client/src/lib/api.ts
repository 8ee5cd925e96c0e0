import {
  endpoints,
  type BodyOf,
  type EndpointName,
  type ParamsOf,
  type ResponseOf,
} from '#shared/contract/endpoints.ts';
import type { Session } from '#shared/contract/records.ts';
import { ApiError, apiErrorOf } from './api-error.ts';
import { apiUrl } from './paths.ts';
import { signInGate } from './sign-in-gate.ts';

type Input<N extends EndpointName> = { readonly signal?: AbortSignal } & (Record<
  never,
  never
> extends ParamsOf<N>
  ? { readonly params?: ParamsOf<N> }
  : { readonly params: ParamsOf<N> }) &
  (BodyOf<N> extends undefined ? { readonly body?: undefined } : { readonly body: BodyOf<N> });

/** Every write carries it; the service hands it out with the session. */
let csrfToken: string | null = null;

/** Calls one endpoint of the contract. An expired session is signed in again over the page and the call repeated. */
export async function call<N extends EndpointName>(name: N, input: Input<N>): Promise<ResponseOf<N>> {
  const response = await send(name, input);
  if (response.ok) return rememberToken(name, (await response.json()) as ResponseOf<N>);

  const error = await apiErrorOf(response);
  if (error.code === 'csrf') {
    await refreshToken();
    return answerOf(name, await send(name, input));
  }
  if (error.code === 'unauthenticated' && !endpoints[name].isPublic && (await signInGate.wait()))
    return answerOf(name, await send(name, input));
  throw error;
}

async function answerOf<N extends EndpointName>(name: N, response: Response): Promise<ResponseOf<N>> {
  if (!response.ok) throw await apiErrorOf(response);
  return rememberToken(name, (await response.json()) as ResponseOf<N>);
}

async function send<N extends EndpointName>(name: N, input: Input<N>): Promise<Response> {
  const { method, path } = endpoints[name];
  const isWrite = method !== 'get';
  if (isWrite && csrfToken === null) await refreshToken();
  try {
    return await fetch(apiUrl(path, input.params), {
      method: method.toUpperCase(),
      credentials: 'same-origin',
      signal: input.signal ?? null,
      headers: {
        accept: 'application/json',
        ...(isWrite ? { 'content-type': 'application/json', 'x-csrf-token': csrfToken ?? '' } : {}),
      },
      body: isWrite ? JSON.stringify(input.body ?? {}) : null,
    });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new ApiError({
      code: 'offline',
      message: 'The service cannot be reached. Nothing was lost.',
      status: 0,
    });
  }
}

async function refreshToken(): Promise<void> {
  csrfToken = '';
  await call('getSession', {});
}

function rememberToken<N extends EndpointName>(name: N, answer: ResponseOf<N>): ResponseOf<N> {
  if (name === 'getSession' || name === 'signIn' || name === 'signOut')
    csrfToken = (answer as Session).csrfToken;
  return answer;
}

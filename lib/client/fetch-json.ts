/** What one of our own handlers answers; a failure is thrown as the sentence a person reads. */
export function fetchJson<Value>(address: string, signal: AbortSignal): Promise<Value> {
  return answered<Value>(address, { signal });
}

/** The same for text that is sent along to be looked at. */
export function postForJson<Value>(address: string, body: string): Promise<Value> {
  return answered<Value>(address, { method: 'POST', body });
}

async function answered<Value>(address: string, request: RequestInit): Promise<Value> {
  const response = await fetch(address, request);
  if (!response.ok) throw new Error(await sentenceOf(response));
  // The handler and its caller share the DTO type; nothing else answers at this address.
  return (await response.json()) as Value;
}

async function sentenceOf(response: Response): Promise<string> {
  if (response.status === 401) return 'You are signed out. Sign in again, then come back.';
  if (response.status === 404) return 'It is not there any more. Go back to the list.';
  const body: unknown = await response.json().catch(() => null);
  const detail = body !== null && typeof body === 'object' && 'detail' in body ? body.detail : null;
  return typeof detail === 'string' ? detail : 'The server did not answer. Try again.';
}

/**
 * Does work once the page has nothing more urgent to do, at the latest after `timeoutMs`; answers the way to call it off.
 * Safari has no idle callback; the next turn of the event loop does instead.
 */
export function whenIdle(work: () => void, timeoutMs: number): () => void {
  if (typeof requestIdleCallback === 'function') {
    const handle = requestIdleCallback(work, { timeout: timeoutMs });
    return () => cancelIdleCallback(handle);
  }
  const handle = setTimeout(work);
  return () => clearTimeout(handle);
}

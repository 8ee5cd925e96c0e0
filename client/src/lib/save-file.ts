import { ApiError, apiErrorOf } from './api-error.ts';

/** Hands a file to the browser to keep. */
export function saveFile(content: Blob | string, name: string, type = 'application/octet-stream'): void {
  const url = URL.createObjectURL(typeof content === 'string' ? new Blob([content], { type }) : content);
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  document.body.append(link);
  link.click();
  link.remove();
  // The browser has taken it by the next turn.
  setTimeout(() => URL.revokeObjectURL(url), 0);
}

const nameIn = (header: string | null): string | undefined => /filename="?([^";]+)"?/.exec(header ?? '')?.[1];

/**
 * Fetches a file that the service writes, and keeps it. A link alone would show the service's refusal, raw, in place of the
 * page.
 */
export async function fetchAndSave(url: string, fallbackName: string): Promise<void> {
  let response: Response;
  try {
    response = await fetch(url, { credentials: 'same-origin' });
  } catch {
    throw new ApiError({ code: 'offline', message: 'The service cannot be reached.', status: 0 });
  }
  if (!response.ok) throw await apiErrorOf(response);
  saveFile(await response.blob(), nameIn(response.headers.get('content-disposition')) ?? fallbackName);
}

import { ProblemError, UnreachableError, type Problem } from '../../../lib/http.ts';

function problemIn(request: XMLHttpRequest): Problem {
  try {
    return JSON.parse(request.responseText) as Problem;
  } catch {
    return { type: 'about:blank', title: 'The server could not do that', status: request.status };
  }
}

/**
 * Sends one part as a form, its digest first. `fetch` cannot tell how much of a body has gone; this can.
 * @throws ProblemError the server refused
 * @throws UnreachableError the connection was lost, or the signal was given
 */
export function sendPart(
  url: string,
  part: { readonly sha256: string; readonly bytes: Blob },
  signal: AbortSignal,
  onMoved: (sentBytes: number) => void,
): Promise<void> {
  return new Promise((resolve, reject) => {
    const form = new FormData();
    form.append('sha256', part.sha256);
    form.append('part', part.bytes, 'part');
    const request = new XMLHttpRequest();
    const lost = () => reject(new UnreachableError('The connection was lost.'));
    request.open('PUT', url);
    request.upload.onprogress = ({ loaded }) => onMoved(loaded);
    request.onerror = lost;
    request.ontimeout = lost;
    request.onabort = lost;
    request.onload = () => {
      if (request.status >= 200 && request.status < 300) resolve();
      else reject(new ProblemError(problemIn(request)));
    };
    if (signal.aborted) {
      lost();
      return;
    }
    signal.addEventListener('abort', () => request.abort(), { once: true });
    request.send(form);
  });
}

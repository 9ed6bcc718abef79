import { LOST, toAnswer, type Answer } from './api';

/**
 * Sends a file as it is to a path of the API, telling how much has gone, from 0 to 1. As `send`, it never throws: a
 * connection that is lost on the way is answered as `connection_lost`.
 */
export function sendFile<T>(path: string, file: Blob, gone: (share: number) => void): Promise<Answer<T>> {
  return new Promise((resolve) => {
    const request = new XMLHttpRequest();
    request.open('POST', path);
    request.setRequestHeader('accept', 'application/json');
    request.setRequestHeader('content-type', 'application/octet-stream');
    request.upload.addEventListener('progress', ({ loaded, total }) => gone(total > 0 ? loaded / total : 0));
    request.addEventListener('load', () =>
      resolve(toAnswer<T>(request.status >= 200 && request.status < 300, request.responseText)),
    );
    for (const event of ['error', 'abort', 'timeout']) request.addEventListener(event, () => resolve(LOST));
    request.send(file);
  });
}

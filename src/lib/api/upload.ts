import type { z } from 'zod';
import type { Endpoint } from '#shared/contracts/endpoint.ts';
import { readAnswer } from './answer.ts';
import type { AnswerOf } from './call.ts';
import { OfflineError } from './error.ts';
import { csrfHeader } from './session-token.ts';
import { urlOf } from './url.ts';

export interface UploadInput<E extends Endpoint> {
  readonly params: Readonly<Record<string, unknown>>;
  readonly file: File;
  readonly body: z.input<Exclude<E['body'], undefined>>;
  /** Called with the share sent so far, 0 to 1. */
  readonly onProgress?: (share: number) => void;
  readonly signal?: AbortSignal;
}

/**
 * Sends one file with its fields. XMLHttpRequest, because only it tells how much has gone.
 * @throws ApiError, OfflineError
 */
export function upload<E extends Endpoint>(endpoint: E, input: UploadInput<E>): Promise<AnswerOf<E>> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open(endpoint.method, urlOf(endpoint, { params: input.params }));
    for (const [name, value] of Object.entries(csrfHeader())) request.setRequestHeader(name, value);
    request.upload.onprogress = (event) => {
      if (event.lengthComputable) input.onProgress?.(event.loaded / event.total);
    };
    request.onerror = () => reject(new OfflineError());
    request.onabort = () => reject(new DOMException('The upload was stopped.', 'AbortError'));
    request.onload = () => {
      try {
        resolve(readAnswer(endpoint, { status: request.status, text: request.responseText }) as AnswerOf<E>);
      } catch (error) {
        reject(error);
      }
    };
    input.signal?.addEventListener('abort', () => request.abort());
    request.send(formOf(input));
  });
}

function formOf<E extends Endpoint>(input: UploadInput<E>): FormData {
  const form = new FormData();
  // Fields first: the server reads them before it decides about the file.
  for (const [name, value] of Object.entries(input.body as Record<string, string | undefined>)) {
    if (value) form.set(name, value);
  }
  form.set('file', input.file, input.file.name);
  return form;
}

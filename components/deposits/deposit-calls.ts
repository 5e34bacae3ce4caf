/** The calls on deposits that pages make, by name. Each throws CallFailed. */
import type { Assessment } from '@/lib/engine/assessment';
import type { DepositAnswer, DepositHeadAnswer, PublicationDay, SavedDepositAnswer } from '@/schemas/deposit';
import type { FileAnswer } from '@/schemas/file';
import { CallFailed, callApi, complaintOf, NO_ANSWER } from './call-api';

const JSON_TYPE = { 'Content-Type': 'application/json' };

const pathOf = (id: string) => `/api/v1/deposits/${encodeURIComponent(id)}`;

/** Makes a draft of that text for a laboratory. */
export function createDraft(text: string, lab: string, key: string): Promise<SavedDepositAnswer> {
  return callApi(`/api/v1/deposits?lab=${encodeURIComponent(lab)}`, {
    method: 'POST',
    headers: { ...JSON_TYPE, 'Idempotency-Key': key },
    body: text,
  });
}

export function loadDraft(id: string): Promise<DepositAnswer> {
  return callApi(pathOf(id));
}

/** Saves a text in the place of that version. */
export function saveDraft(id: string, version: number, text: string): Promise<SavedDepositAnswer> {
  return callApi(pathOf(id), { method: 'PUT', headers: { ...JSON_TYPE, ...ifMatch(version) }, body: text });
}

export function deleteDraft(id: string, version: number): Promise<void> {
  return callApi(pathOf(id), { method: 'DELETE', headers: ifMatch(version) });
}

export function submitDraft(id: string, version: number, key: string): Promise<DepositHeadAnswer> {
  const headers = { ...ifMatch(version), 'Idempotency-Key': key };
  return callApi(`${pathOf(id)}/submission`, { method: 'POST', headers });
}

export function recallSubmission(id: string): Promise<DepositHeadAnswer> {
  return callApi(`${pathOf(id)}/submission`, { method: 'DELETE' });
}

export function loadAssessment(id: string, signal?: AbortSignal): Promise<Assessment> {
  return callApi(`${pathOf(id)}/assessment`, { signal });
}

export interface Decision {
  kind: 'accepted' | 'changes-requested' | 'declined';
  letter: string;
  /** the revision that the curator has before them */
  revision: number;
  /** with an acceptance: the day on which it is published, where not at once */
  publication?: PublicationDay;
}

export function decideOn(id: string, decision: Decision, key: string): Promise<DepositHeadAnswer> {
  return callApi(`${pathOf(id)}/decision`, {
    method: 'POST',
    headers: { ...JSON_TYPE, 'Idempotency-Key': key },
    body: JSON.stringify(decision),
  });
}

export async function listFiles(id: string): Promise<FileAnswer[]> {
  const { files } = await callApi<{ files: FileAnswer[] }>(`${pathOf(id)}/files`);
  return files;
}

export function removeFile(id: string, file: string): Promise<void> {
  return callApi(`${pathOf(id)}/files/${encodeURIComponent(file)}`, { method: 'DELETE' });
}

/**
 * Sends a file as it is. By XMLHttpRequest, since fetch does not tell how much of a body has left.
 *
 * @param onProgress told the share that has left, 0 to 1
 */
export function uploadFile(
  id: string,
  file: File,
  key: string,
  onProgress: (share: number) => void,
): Promise<FileAnswer> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open('POST', `${pathOf(id)}/files?name=${encodeURIComponent(file.name)}`);
    request.setRequestHeader('Content-Type', 'application/octet-stream');
    request.setRequestHeader('Idempotency-Key', key);
    request.upload.onprogress = ({ loaded, total }) => onProgress(total === 0 ? 1 : loaded / total);
    request.onload = () => {
      if (request.status === 201) resolve(JSON.parse(request.responseText) as FileAnswer);
      else reject(new CallFailed(complaintOf(request.status, request.responseText)));
    };
    request.onerror = () => reject(new CallFailed(NO_ANSWER));
    request.send(file);
  });
}

function ifMatch(version: number) {
  return { 'If-Match': `"${version}"` };
}

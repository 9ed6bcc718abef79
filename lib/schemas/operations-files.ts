import { addAttachment, attachment, attachmentsQuery } from './attachment';
import { idParams, listOf } from './common';
import type { Operation } from './operation';

/** Pictures and documents. */
export const FILES_OPERATIONS: readonly Operation[] = [
  {
    id: 'listAttachments',
    method: 'GET',
    path: '/attachments',
    tag: 'Files',
    summary: 'The pictures and documents of a unit, a task or a defect',
    query: attachmentsQuery,
    status: 200,
    answer: listOf(attachment),
  },
  {
    id: 'addAttachment',
    method: 'POST',
    path: '/attachments',
    tag: 'Files',
    summary: 'Keep a picture (JPEG, PNG, WebP) or document (PDF): the file is the body',
    query: addAttachment,
    takesFile: true,
    status: 201,
    answer: attachment,
  },
  {
    id: 'readAttachment',
    method: 'GET',
    path: '/attachments/{id}',
    tag: 'Files',
    summary: 'A picture, or a document to be downloaded',
    params: idParams,
    status: 200,
    answer: 'file',
  },
  {
    id: 'readAttachmentThumb',
    method: 'GET',
    path: '/attachments/{id}/thumb',
    tag: 'Files',
    summary: 'A small picture of a picture',
    params: idParams,
    status: 200,
    answer: 'file',
  },
  {
    id: 'removeAttachment',
    method: 'DELETE',
    path: '/attachments/{id}',
    tag: 'Files',
    summary: 'Remove a picture or document; it can be brought back for a week',
    params: idParams,
    status: 200,
    answer: attachment,
  },
  {
    id: 'restoreAttachment',
    method: 'POST',
    path: '/attachments/{id}/restoration',
    tag: 'Files',
    summary: 'Bring a removed picture or document back',
    params: idParams,
    status: 200,
    answer: attachment,
  },
];

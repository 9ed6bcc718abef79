import { idParams, listOf } from './common';
import type { Operation } from './operation';
import { changeProcedure, createProcedure, procedure, procedureLine } from './procedure';

/** Procedures: what is done at the bench, step by step. */
export const WORKSHOP_OPERATIONS: readonly Operation[] = [
  {
    id: 'listProcedures',
    method: 'GET',
    path: '/procedures',
    tag: 'Workshop',
    summary: 'The procedures in use',
    status: 200,
    answer: listOf(procedureLine),
  },
  {
    id: 'createProcedure',
    method: 'POST',
    path: '/procedures',
    tag: 'Workshop',
    summary: 'Write a procedure',
    body: createProcedure,
    status: 201,
    answer: procedure,
  },
  {
    id: 'getProcedure',
    method: 'GET',
    path: '/procedures/{id}',
    tag: 'Workshop',
    summary: 'A procedure with the steps of its latest version',
    params: idParams,
    status: 200,
    answer: procedure,
  },
  {
    id: 'changeProcedure',
    method: 'PUT',
    path: '/procedures/{id}',
    tag: 'Workshop',
    summary: 'Write the next version of a procedure',
    params: idParams,
    body: changeProcedure,
    status: 200,
    answer: procedure,
  },
  {
    id: 'retireProcedure',
    method: 'POST',
    path: '/procedures/{id}/retirement',
    tag: 'Workshop',
    summary: 'Take a procedure out of use',
    params: idParams,
    status: 200,
    answer: procedure,
  },
];

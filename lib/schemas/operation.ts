import { z } from 'zod';

/** One operation of the API: what its route takes and answers. `open` ones want no signing in. */
export type Operation = {
  id: string;
  method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  /** Below `/api/v1`, parameters in braces: `/units/{id}`. */
  path: string;
  tag: string;
  summary: string;
  open?: true;
  params?: z.ZodType;
  query?: z.ZodType;
  body?: z.ZodType;
  status: number;
  /** Null for an answer without a body, `html` for a page, `pdf` for a paper, `file` for what was kept. */
  answer: z.ZodType | 'html' | 'pdf' | 'file' | null;
  /** It takes a file as its body, as it is. */
  takesFile?: true;
};

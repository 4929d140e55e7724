'use client';

import { useState, type BaseSyntheticEvent } from 'react';
import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form';
import type { FieldProblem } from '@/lib/errors';
import { ApiProblem } from './api-problem';

interface SubmitProblem { title: string; status: number; detail: string; errors: FieldProblem[] }

export interface Submit { onSubmit: (event?: BaseSyntheticEvent) => Promise<void>; problem: SubmitProblem | null; clear: () => void }

/** No answer at all: the reader is offline, or the server is not there. */
const unanswered = (): SubmitProblem => ({
  title: 'Not sent', status: 0, errors: [],
  detail: navigator.onLine ? 'The server did not answer. What you typed is still here; try again in a moment.' : 'You are offline. What you typed is still here; send it again once the connection is back.',
});

function hasField(values: unknown, path: string): boolean {
  const [head = '', ...rest] = path.split('.');
  if (typeof values !== 'object' || values === null || !(head in values)) return false;
  return rest.length === 0 || hasField((values as Record<string, unknown>)[head], rest.join('.'));
}

interface SubmitOptions<Input extends FieldValues, Typed, Answer> {
  form: UseFormReturn<Input, unknown, Typed>;
  send: (typed: Typed) => Promise<Answer>;
  onDone: (answer: Answer) => void;
  /** The field of a path of the API, where they are not the same. */
  fieldOf?: (path: string) => string;
}

/** Sends a form; what the server refuses stands at its field, or above all fields where it has none. */
export function useSubmit<Input extends FieldValues, Typed, Answer>({ form, send, onDone, fieldOf = (path) => path }: SubmitOptions<Input, Typed, Answer>): Submit {
  const [problem, setProblem] = useState<SubmitProblem | null>(null);
  const isAtField = ({ path }: FieldProblem) => hasField(form.getValues(), fieldOf(path));

  const showProblem = (refused: SubmitProblem) => {
    const atFields = refused.errors.filter(isAtField);
    for (const { path, message } of atFields) form.setError(fieldOf(path) as FieldPath<Input>, { type: 'server', message });
    const first = atFields[0];
    if (first) form.setFocus(fieldOf(first.path) as FieldPath<Input>);
    const isToldAtFields = atFields.length > 0 && atFields.length === refused.errors.length;
    setProblem(isToldAtFields ? null : { ...refused, errors: refused.errors.filter((fault) => !isAtField(fault)) });
  };

  const onSubmit = form.handleSubmit(async (typed) => {
    setProblem(null);
    try {
      onDone(await send(typed));
    } catch (error) {
      if (error instanceof ApiProblem) showProblem(error.problem);
      else if (error instanceof TypeError) setProblem(unanswered());
      else throw error;
    }
  });
  return { onSubmit, problem, clear: () => setProblem(null) };
}

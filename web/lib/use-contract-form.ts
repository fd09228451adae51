import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { type DefaultValues, type FieldPath, type FieldValues, useForm } from 'react-hook-form';
import type * as z from 'zod';
import { ProblemError, UnreachableError } from './http.ts';

interface Options<In extends FieldValues, Out, Answer> {
  /** The contract of the request: the form refuses what the server would refuse. */
  schema: z.ZodType<Out, In>;
  defaultValues: DefaultValues<In>;
  /** Sends what was typed. */
  submit: (values: Out) => Promise<Answer>;
  onDone?: (answer: Answer, values: Out) => void;
}

/** What to say about a failure that belongs to no field. */
export function wordsOf(error: unknown): string {
  if (error instanceof UnreachableError) return 'The server does not answer. What you typed is still here; try again.';
  if (error instanceof ProblemError) return error.problem.detail ?? `${error.problem.title}.`;
  return 'Something went wrong on our side. What you typed is still here; try again.';
}

/**
 * A form that speaks the contract of its request: typed values are checked by the same schema here and there, and what
 * the server says about a field (the pointers of its problem document) stands at that field. What is about no field is
 * in `failure`.
 */
export function useContractForm<In extends FieldValues, Out, Answer>(options: Options<In, Out, Answer>) {
  const [failure, setFailure] = useState<string>();
  const form = useForm<In, unknown, Out>({
    resolver: zodResolver(options.schema),
    defaultValues: options.defaultValues,
    mode: 'onTouched',
  });

  function tell(error: unknown) {
    const errors = error instanceof ProblemError ? (error.problem.errors ?? []) : [];
    const fields = Object.keys(form.getValues());
    const atFields = errors.filter(({ pointer }) => fields.includes(pointer.split('/')[1] ?? ''));
    atFields.forEach(({ pointer, detail }, i) => {
      const name = pointer.slice(2).replaceAll('/', '.') as FieldPath<In>;
      form.setError(name, { type: 'server', message: detail }, { shouldFocus: i === 0 });
    });
    if (atFields.length === 0) setFailure(errors[0]?.detail ?? wordsOf(error));
  }

  const onSubmit = form.handleSubmit(async (values) => {
    setFailure(undefined);
    try {
      const answer = await options.submit(values);
      options.onDone?.(answer, values);
    } catch (error) {
      tell(error);
    }
  });

  const errorAt = (name: FieldPath<In>): string | undefined => form.getFieldState(name, form.formState).error?.message;
  return { ...form, onSubmit, errorAt, failure, isSending: form.formState.isSubmitting };
}

import { useEffect } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { Link } from 'react-router';
import type { Draft, Post } from '../../../shared/api/drafts.ts';
import type { ShotWithTakes } from '../../../shared/api/shots.ts';
import { Button } from '../../components/Button.tsx';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { Select } from '../../components/Select.tsx';
import { TextArea } from '../../components/TextArea.tsx';
import { TextField } from '../../components/TextField.tsx';
import { ApiProblem, sentenceOf } from '../../lib/ApiProblem.ts';
import { FRAME_RATES } from '../../lib/frameRates.ts';
import { paths } from '../../lib/paths.ts';
import { schemaResolver } from '../../lib/schemaResolver.ts';
import { FilmingCaution } from './FilmingCaution.tsx';
import { keepValues, keptValues } from './keptValues.ts';
import {
  EMPTY_POST,
  FIND_HOLD,
  OTHER_RATE,
  postFormSchema,
  postOf,
  type PostValues,
  rateValue,
  shotOf,
} from './postValues.ts';
import { ShotField } from './ShotField.tsx';

export interface PostFormProps {
  slug: string;
  shots: ShotWithTakes[];
  draft: Draft | undefined;
  /** The shot one came from, filled in already. */
  shotNumber: string | null;
  /** Why the strip cannot be posted yet; null when it can. */
  notYet: string | null;
  posting: boolean;
  problem: Error | null;
  onPost: (post: Post) => void;
}

/** What the pictures cannot say: which shot, at what rate, what changed and what is meant. */
export function PostForm({ slug, shots, draft, shotNumber, notYet, posting, problem, onPost }: PostFormProps) {
  const kept = keptValues(slug);
  const form = useForm<PostValues>({
    resolver: schemaResolver(postFormSchema(shots)),
    defaultValues: { ...kept, shotNumber: shotNumber ?? kept.shotNumber },
  });
  const { register, control, setValue, getFieldState, setError, handleSubmit, formState } = form;
  const values = useWatch({ control }) as PostValues;
  const shot = shotOf(shots, values.shotNumber);
  const found = draft?.firstFrame;
  const errors = formState.errors;
  // The answer of an earlier try was lost on its way, but the take is there.
  const posted = problem instanceof ApiProblem && problem.code === 'draft_closed' ? shot?.takes.at(-1) : undefined;
  const newest = posted && paths.take(slug, posted.shotNumber, posted.number);

  useEffect(() => keepValues(slug, values), [slug, values]);

  useEffect(() => {
    // The names of the files know better than an untouched field.
    if (found != null && !getFieldState('firstFrame').isDirty) setValue('firstFrame', String(found));
    else if (found === null && draft && values.firstFrame === '') setValue('firstFrame', '1');
  }, [found, draft, values.firstFrame, getFieldState, setValue]);

  useEffect(() => {
    if (!(problem instanceof ApiProblem)) return;
    for (const { path, message } of problem.fields) {
      const field = path.split('.')[0] === 'fps' ? 'rate' : path.split('.')[0];
      if (field && field in EMPTY_POST) setError(field as keyof PostValues, { message });
    }
  }, [problem, setError]);

  return (
    <form
      noValidate
      onSubmit={(event) => void handleSubmit((written) => onPost(postOf(written, shots)))(event)}
      className="space-y-4 rounded-card border border-rule bg-sheet px-5 py-4"
    >
      <h2 className="text-lg">The shot</h2>
      <ShotField
        shots={shots}
        shot={shot}
        takeNumber={shot?.nextTakeNumber ?? 1}
        error={errors.shotNumber?.message}
        field={register('shotNumber')}
      />
      {!shot && (
        <TextField
          label="Title of the new shot"
          error={errors.shotTitle?.message}
          autoComplete="off"
          {...register('shotTitle')}
        />
      )}
      <div className="grid grid-cols-2 gap-3">
        <Select label="Frames a second" error={errors.rate?.message} {...register('rate')}>
          {FRAME_RATES.map((rate) => (
            <option key={rate.label} value={rateValue(rate)}>
              {rate.label}
            </option>
          ))}
          <option value={OTHER_RATE}>another rate</option>
        </Select>
        <Select label="Drawings" {...register('hold')}>
          <option value={FIND_HOLD}>find it</option>
          <option value="1">on ones</option>
          <option value="2">on twos</option>
          <option value="3">on threes</option>
          <option value="mixed">mixed</option>
        </Select>
        {values.rate === OTHER_RATE && (
          <TextField
            label="The rate"
            hint="12, 12.5 or 24000/1001"
            error={errors.otherRate?.message}
            fieldClassName="font-mono"
            {...register('otherRate')}
          />
        )}
        <TextField
          label="First frame"
          inputMode="numeric"
          hint={found != null ? 'from the file names' : 'what the production calls it'}
          error={errors.firstFrame?.message}
          fieldClassName="font-mono"
          {...register('firstFrame')}
        />
      </div>
      <TextArea
        label="What changed"
        rows={2}
        hint="Since the last take, for those who look again."
        error={errors.changed?.message}
        {...register('changed')}
      />
      <TextArea
        label="What is intended"
        rows={2}
        hint="A balloon, a wire, a joke of gravity: say what is meant, so nobody mends it away."
        error={errors.intended?.message}
        {...register('intended')}
      />
      {problem && <ErrorNote action={newest && <Link to={newest}>See it</Link>}>{sentenceOf(problem)}</ErrorNote>}
      <FilmingCaution />
      <Button
        type="submit"
        kind="primary"
        className="w-full"
        disabled={notYet !== null}
        aria-describedby={notYet ? 'not-yet' : undefined}
        busy={posting && 'Posting…'}
      >
        {shot ? `Post take ${shot.nextTakeNumber} of ${shot.number}` : 'Post the strip'}
      </Button>
      {notYet && !posting && (
        <p id="not-yet" className="text-center text-sm text-graphite">
          {notYet}
        </p>
      )}
    </form>
  );
}

import { useId } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { z } from 'zod';
import { shotNumberSchema, shotTitleSchema } from '../../../shared/api/names.ts';
import { Button } from '../../components/Button.tsx';
import { Dialog } from '../../components/Dialog.tsx';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { TextField } from '../../components/TextField.tsx';
import { sentenceOf } from '../../lib/ApiProblem.ts';
import { schemaResolver } from '../../lib/schemaResolver.ts';

const moveSchema = z.object({
  shotNumber: shotNumberSchema,
  shotTitle: z.union([z.literal(''), shotTitleSchema]),
});
type MoveForm = z.input<typeof moveSchema>;

interface MoveDialogProps {
  open: boolean;
  takeNumber: number;
  from: string;
  shots: readonly { number: string; title: string }[];
  busy: boolean;
  error: unknown;
  onClose: () => void;
  onMove: (to: { shotNumber: string; shotTitle?: string }) => void;
}

/** Moves a take that was posted to the wrong shot. */
export function MoveDialog({ open, takeNumber, from, shots, busy, error, onClose, onMove }: MoveDialogProps) {
  const { register, handleSubmit, control, formState } = useForm<MoveForm>({
    resolver: schemaResolver(moveSchema),
    defaultValues: { shotNumber: '', shotTitle: '' },
  });
  const written = useWatch({ control, name: 'shotNumber' }).trim();
  const formId = useId();
  const known = shots.find((shot) => shot.number === written);
  const submit = handleSubmit(({ shotNumber, shotTitle }) =>
    onMove({ shotNumber, ...(known || !shotTitle ? {} : { shotTitle }) }),
  );
  return (
    <Dialog
      open={open}
      onClose={onClose}
      title={`Move take ${takeNumber} to another shot`}
      actions={
        <>
          <Button kind="quiet" onClick={onClose}>
            Leave it in {from}
          </Button>
          <Button kind="primary" type="submit" form={formId} busy={busy && 'Moving…'}>
            Move it
          </Button>
        </>
      }
    >
      <form id={formId} onSubmit={(event) => void submit(event)} className="space-y-3">
        <p className="text-graphite">It becomes the next take there, with its reading, its notes and its stamps.</p>
        <TextField
          {...register('shotNumber')}
          label="Shot number"
          list="shots-to-move-to"
          autoComplete="off"
          hint={known ? known.title : undefined}
          error={
            written === from ? `It is in ${from} already; write another shot.` : formState.errors.shotNumber?.message
          }
        />
        <datalist id="shots-to-move-to">
          {shots
            .filter((shot) => shot.number !== from)
            .map((shot) => (
              <option key={shot.number} value={shot.number}>
                {shot.title}
              </option>
            ))}
        </datalist>
        {written !== '' && !known && (
          <TextField
            {...register('shotTitle')}
            label="Title of the new shot"
            hint="Nobody has posted to this shot yet, so it needs a title."
            error={formState.errors.shotTitle?.message}
          />
        )}
        {error != null && <ErrorNote>{sentenceOf(error)}</ErrorNote>}
      </form>
    </Dialog>
  );
}

import { useId } from 'react';
import type { UseFormRegisterReturn } from 'react-hook-form';
import type { ShotWithTakes } from '../../../shared/api/shots.ts';
import { TextField } from '../../components/TextField.tsx';

export interface ShotFieldProps {
  shots: ShotWithTakes[];
  /** The shot the written number belongs to, when it is there already. */
  shot: ShotWithTakes | undefined;
  takeNumber: number;
  error: string | undefined;
  field: UseFormRegisterReturn;
}

/** The shot's number, with the shots of the production as suggestions, and what will become of the strip. */
export function ShotField({ shots, shot, takeNumber, error, field }: ShotFieldProps) {
  const listId = useId();
  return (
    <>
      <TextField
        label="Shot number"
        list={listId}
        autoComplete="off"
        placeholder="020-0140"
        error={error}
        fieldClassName="font-mono"
        hint={
          shot ? (
            <>
              <b className="font-semibold text-ink">{shot.title}</b>. This becomes take {takeNumber}.
            </>
          ) : (
            'A number that is not on the sheet starts a new shot.'
          )
        }
        {...field}
      />
      <datalist id={listId}>
        {shots.map((one) => (
          <option key={one.id} value={one.number}>
            {one.title}
          </option>
        ))}
      </datalist>
    </>
  );
}

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { takeContracts } from '../../../shared/api/takes.ts';
import { Button, type ButtonProps } from '../../components/Button.tsx';
import { sentenceOf } from '../../lib/ApiProblem.ts';
import { call } from '../../lib/call.ts';
import { applyTake } from '../../lib/queries/take.ts';

/** Has a take read once more, by the engine as it is now. */
export function ReadAgain({
  slug,
  takeId,
  ...button
}: { slug: string; takeId: string } & Pick<ButtonProps, 'size' | 'kind'>) {
  const client = useQueryClient();
  const { mutate, isPending, error } = useMutation({
    mutationFn: () => call(takeContracts.readAgain, { params: { takeId } }),
    onSuccess: (take) => applyTake(client, slug, take),
  });
  return (
    <>
      <Button {...button} busy={isPending && 'Reading…'} onClick={() => mutate()}>
        Read again
      </Button>
      {error && (
        <span role="alert" className="text-sm font-semibold">
          {sentenceOf(error)}
        </span>
      )}
    </>
  );
}

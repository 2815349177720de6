import { useForm } from 'react-hook-form';
import { type Session, type SignIn, signInSchema } from '../../../shared/api/session.ts';
import { Button } from '../../components/Button.tsx';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { TextField } from '../../components/TextField.tsx';
import { sentenceOf } from '../../lib/ApiProblem.ts';
import { schemaResolver } from '../../lib/schemaResolver.ts';
import { useSignIn } from './useSignIn.ts';

/** Address and password. `onSignedIn` decides where to go. */
export function SignInForm({ onSignedIn }: { onSignedIn: (session: Session) => void }) {
  const signIn = useSignIn();
  const { register, handleSubmit, formState } = useForm<SignIn>({
    resolver: schemaResolver(signInSchema),
    defaultValues: { email: '', password: '' },
  });

  return (
    <form
      noValidate
      onSubmit={(event) => void handleSubmit((values) => signIn.mutate(values, { onSuccess: onSignedIn }))(event)}
      className="space-y-4"
    >
      {signIn.isError && <ErrorNote>{sentenceOf(signIn.error)}</ErrorNote>}
      <TextField
        label="Email"
        type="email"
        autoComplete="username"
        error={formState.errors.email?.message}
        {...register('email')}
      />
      <TextField
        label="Password"
        type="password"
        autoComplete="current-password"
        error={formState.errors.password?.message}
        {...register('password')}
      />
      <Button type="submit" kind="primary" busy={signIn.isPending && 'Signing in…'} className="w-full">
        Sign in
      </Button>
    </form>
  );
}

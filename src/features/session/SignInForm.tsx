import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';

import { signIn, type SessionReply } from '#shared/contracts/session.ts';
import { TextField } from '#src/components/ui/TextField.tsx';
import { sentenceOf } from '#src/lib/api.ts';
import { beginSession } from './api.ts';

interface SignInFormProps {
  /** Fills in the address, as when a session has ended. */
  email?: string;
  onSignedIn: (session: SessionReply) => void;
}

/** E-mail address and password; failures are told without saying which of the two was wrong. */
export function SignInForm({ email = '', onSignedIn }: SignInFormProps) {
  const [problem, setProblem] = useState<string | null>(null);
  const { register, handleSubmit, formState, setValue, setFocus } = useForm({
    resolver: zodResolver(signIn.body),
    defaultValues: { email, password: '' },
  });
  const submit = handleSubmit(async (credentials) => {
    setProblem(null);
    try {
      onSignedIn(await beginSession(credentials));
    } catch (error) {
      setProblem(sentenceOf(error));
      setValue('password', '');
      setFocus('password');
    }
  });
  return (
    <form className="grid gap-4" onSubmit={(event) => void submit(event)} noValidate>
      <TextField
        label="E-mail address"
        type="email"
        autoComplete="username"
        problem={formState.errors.email?.message}
        {...register('email')}
      />
      <TextField
        label="Password"
        type="password"
        autoComplete="current-password"
        problem={formState.errors.password?.message}
        {...register('password')}
      />
      {problem !== null && (
        <p role="alert" className="text-lead">
          {problem}
        </p>
      )}
      <button
        type="submit"
        className="button button-primary justify-self-start"
        disabled={formState.isSubmitting}
      >
        {formState.isSubmitting ? 'Signing in…' : 'Sign in'}
      </button>
    </form>
  );
}
